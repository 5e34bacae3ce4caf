import { MathSymbol as S } from '@/components/ui/math-symbol';
import { MethodsSection } from './methods-section';

/** The check on linear propagation. */
export function MonteCarloSection() {
  return (
    <MethodsSection id="monte-carlo">
      <p>
        Uncertainties are propagated by derivatives, which is exact only where the curve is straight over the
        width of the uncertainty. The Monte Carlo method of JCGM 101 checks it: parameters, stocks and
        concentrations are drawn from their stated distributions (lognormal for constants, concentrations,
        stocks and ratios, normal for the rest), and the expected activity is computed for every draw. The
        draws are seeded, so that the same document always gets the same answer.
      </p>
      <p>
        At most 100 points of a dataset are checked, those at which the curvature is largest. Where the two
        disagree by more than 5 % of <S sub="p">u</S>, a note says so: there the linear figure, and the{' '}
        <S>z</S> that rests on it, should not be trusted to the last digit. Nothing is said where{' '}
        <S sub="p">u</S> is below 0.001 either way, which matters nowhere beside the model floor of 0.01.
      </p>
    </MethodsSection>
  );
}
