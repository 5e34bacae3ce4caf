import { MathSymbol as S } from '@/components/ui/math-symbol';
import { Equation } from './equation';
import { MethodsSection } from './methods-section';

/** What scaling a series to its own range does to it. */
export function NormalisationSection() {
  return (
    <MethodsSection id="normalisation">
      <p>
        A series that is scaled to its own smallest and largest activity runs from 0 to 1 whatever the protein
        does. Where its parameters predict, over its own points, a smallest activity above 0.05 or a largest
        below 0.95, the scaling itself pulls points off the curve. The assessment then says so and names the
        range that the unscaled activities would have. Trying it puts them back:
      </p>
      <Equation tex="a \to p_\mathrm{min} + a\,(p_\mathrm{max} - p_\mathrm{min})" />
      <p>
        with <S label="min">p</S> and <S label="max">p</S> the smallest and the largest expected activity at
        the points of the series.
      </p>
    </MethodsSection>
  );
}
