import { MathSymbol as S } from '@/components/ui/math-symbol';
import { Equation, InlineEquation } from './equation';
import { MethodsSection } from './methods-section';

/** Leakiness, saturation, EC50 and the effective Hill coefficient. */
export function DerivedSection() {
  return (
    <MethodsSection id="derived">
      <p>
        For each ligand alone, with the others absent and modulators at their reference, the statements
        predict what a response curve looks like, each figure with its propagated uncertainty:
      </p>
      <ul>
        <li>
          <em>leakiness</em>, the activity without ligand; <em>saturation</em>, the activity at unlimited
          ligand; <em>dynamic range</em>, their difference;
        </li>
        <li>
          <em>half-activity concentration</em>, where <InlineEquation tex="p = 1/2" />, if the response gets
          there;
        </li>
        <li>
          <em>EC50</em>, halfway between leakiness and saturation;
        </li>
        <li>
          the <em>effective Hill coefficient</em> at EC50:
        </li>
      </ul>
      <Equation tex="h = \frac{4\,p\,(1 - p)\;|\partial f / \partial \ln c|}{|p(\infty) - p(0)|}" />
      <p>
        For one class of sites the concentration that has a given coordinate <InlineEquation tex="f^{*}" /> is
        closed, with <InlineEquation tex="f^{*} = 0" /> for half activity and the logit of the halfway
        activity for EC50; <S label="total">g</S> is the coordinate without ligand:
      </p>
      <Equation tex="c(f^{*}) = \frac{B - 1}{1/K_\mathrm{I} - B/K_\mathrm{A}} \qquad \ln B = (g_\mathrm{total} - f^{*}) / n" />
      <p>
        For several classes it is found by bracketing where <S>f</S> is monotonic in{' '}
        <InlineEquation tex="\ln c" />. A quantity that does not exist is left empty, and a note says why.
      </p>
    </MethodsSection>
  );
}
