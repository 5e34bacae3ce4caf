import { MathSymbol as S } from '@/components/ui/math-symbol';
import { POLICY } from '@/lib/engine/flags';
import { InlineEquation } from './equation';
import { MethodsSection } from './methods-section';

/** Where u_a comes from. */
export function MeasuredSection() {
  return (
    <MethodsSection id="measured">
      <p>
        The uncertainty of a measured activity comes from one of three places, and each point says from which.
      </p>
      <ul>
        <li>
          <em>Stated</em>: the point gives <S>u</S>.
        </li>
        <li>
          <em>Replicates</em>: the activity is their mean and{' '}
          <InlineEquation tex="u_\mathrm{a}^2 = s^2 / \mathrm{count}" />, where <S>s</S> is pooled over all
          replicates of the series and has <InlineEquation tex="\nu = \sum (\mathrm{count} - 1)" /> degrees of
          freedom.
        </li>
        <li>
          <em>Assumed</em>: with neither,{' '}
          <InlineEquation tex={`u_\\mathrm{a} = ${POLICY.assumedActivityU}`} /> is taken and the point is
          marked. A series or dataset that holds such a point shows no <S>p</S>: nobody passes a test by
          leaving out an uncertainty.
        </li>
      </ul>
    </MethodsSection>
  );
}
