import { MathSymbol as S } from '@/components/ui/math-symbol';
import { Equation, InlineEquation } from './equation';
import { MethodsSection } from './methods-section';

/** The refit, and when the data do not determine a value. */
export function RefitMethodsSection() {
  return (
    <MethodsSection id="refit">
      <p>
        A refit asks what the points themselves would give for parameters that somebody frees, one value per
        series or one shared by the dataset, at most 40 values; everything else stays as stated. It starts at
        the stated values and makes the weighted squares smallest by the method of Levenberg and Marquardt:
      </p>
      <Equation tex="\chi^2 = \sum_i \frac{(a_i - p(f_i))^2}{u_{a,i}^2 + u_0^2}" />
      <p>
        Constants and numbers of sites are fitted by their logarithms, so that they stay positive; gaps and
        slopes in kT. Standard errors come from the inverse of the normal matrix and are not rescaled by the
        reduced <InlineEquation tex="\chi^2" />; the correlations are those of the fitted variables.
      </p>
      <p>
        A value is <em>not determined by these data</em> where it belongs to a direction in which the scaled
        normal matrix is worse conditioned than <InlineEquation tex="10^8" />, where its standard error is
        above 1 in <InlineEquation tex="\ln K" /> or <InlineEquation tex="\ln n" />, or where it ended at a
        bound of what a document may state. Points of one ligand above or below the bend of the curve, for
        instance, tell nothing of <S label="A">K</S>.
      </p>
      <p>A refit is a suggestion. Published parameters are those that a laboratory states.</p>
    </MethodsSection>
  );
}
