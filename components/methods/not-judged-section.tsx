import { MathSymbol as S } from '@/components/ui/math-symbol';
import { MethodsSection } from './methods-section';

/** What a reader must not expect of an assessment today. */
export function NotJudgedSection() {
  return (
    <MethodsSection id="not-judged">
      <p>An assessment says which points miss the curve and by how much. It does not yet say:</p>
      <ul>
        <li>
          why a series misses: whether one energy offset, a slope, a ceiling or one exchanged convention
          explains it;
        </li>
        <li>whether scaling a series to its own minimum and maximum has pulled its points off the curve;</li>
        <li>what parameters the data themselves would give (a refit);</li>
        <li>how laboratories that studied the same system compare;</li>
        <li>
          where the linear propagation of uncertainty is too coarse: it is not checked against a Monte Carlo
          computation (JCGM 101), and where relative uncertainties of constants are large, <S sub="p">u</S>{' '}
          should be read with care.
        </li>
      </ul>
    </MethodsSection>
  );
}
