import { MathSymbol as S } from '@/components/ui/math-symbol';
import { Equation } from './equation';
import { MethodsSection } from './methods-section';

/** f, B_s and p. */
export function ModelSection() {
  return (
    <MethodsSection id="model">
      <p>
        A complex is either active or inactive, and ligands, modulators and the protein itself each contribute
        to the energy between the two states. Their sum is the free-energy coordinate <S>f</S>, in units of{' '}
        <S>k</S>
        <S>T</S>:
      </p>
      <Equation
        says="Free-energy coordinate"
        tex="f = g_0 + \sum_s n_s\,(g_s - \ln B_s) + \sum_m b_m\,(x_m - x_{m,\mathrm{ref}})"
      />
      <p>
        Each class <S>s</S> of identical, independent sites binds its ligands according to the binding
        polynomials of the two states. Ligands that bind the same class compete for the same sites; several
        classes make a mixed complex.
      </p>
      <Equation
        says="Binding to one class of sites, inactive over active"
        tex="B_s = \frac{1 + \sum_l c_l / K_{\mathrm{I},s,l}}{1 + \sum_l c_l / K_{\mathrm{A},s,l}}"
      />
      <p>
        Whatever the variant, the ligand or the condition, the expected activity depends on <S>f</S> alone.
        This is the master curve, and the test of a set of parameters is whether the measured points lie on
        it.
      </p>
      <Equation says="Master curve: expected activity" tex="p(f) = \frac{1}{1 + e^{-f}}" />
      <p>
        One class, one ligand and no modulator is the textbook case (Monod, Wyman &amp; Changeux 1965). The
        product over classes is the general form of a mixed cluster.
      </p>
    </MethodsSection>
  );
}
