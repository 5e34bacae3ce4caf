import { MathSymbol as S } from '@/components/ui/math-symbol';
import { Equation, InlineEquation } from './equation';
import { MethodsSection } from './methods-section';

/** u_f, u_p, and which errors points have in common. */
export function UncertaintySection() {
  return (
    <MethodsSection id="uncertainty">
      <p>
        Every <S>u</S> is a standard uncertainty (coverage factor 1) in the unit of its value, as in JCGM 100.
        Uncertainties are carried to the coordinate by its derivatives, and from there to the expected
        activity by the slope of the master curve:
      </p>
      <Equation
        says="Uncertainty of the coordinate"
        tex="u_f^2 = (\nabla f)^{\mathrm{T}} V\,(\nabla f) + \sum_l (w_l\; \partial f / \partial \ln c_l)^2"
      />
      <Equation says="Uncertainty of the expected activity" tex="u_p = p\,(1 - p)\,u_f" />
      <p>
        <S>V</S> is the covariance of the parameters, of the stocks and of the temperature; <S sub="l">w</S>{' '}
        is the relative uncertainty of dispensing ligand <S>l</S>. Constants and concentrations enter by their
        logarithms: <InlineEquation tex="u(\ln K) = u(K)/K" />, and a ratio likewise.
      </p>
      <Equation
        says="Derivatives by what is stated of a class of sites"
        tex="\partial f / \partial g_0 = 1 \qquad \partial f / \partial g_s = n_s \qquad \partial f / \partial n_s = g_s - \ln B_s"
      />
      <Equation
        says="By the constants; D is the numerator (I) or the denominator (A) of B"
        tex="\frac{\partial f}{\partial \ln K_{\mathrm{I},s,l}} = n_s\,\frac{c_l / K_{\mathrm{I},s,l}}{D_{\mathrm{I},s}} \qquad \frac{\partial f}{\partial \ln K_{\mathrm{A},s,l}} = -n_s\,\frac{c_l / K_{\mathrm{A},s,l}}{D_{\mathrm{A},s}}"
      />
      <Equation
        says="By a concentration: once for dispensing, once more for the stock"
        tex="\partial f / \partial \ln c_l = -\sum_s n_s\,\bigl(c_l / (K_{\mathrm{I},s,l} D_{\mathrm{I},s}) - c_l / (K_{\mathrm{A},s,l} D_{\mathrm{A},s})\bigr)"
      />
      <p>
        By a modulator’s slope the derivative is <InlineEquation tex="x_m - x_{m,\mathrm{ref}}" />. The
        temperature counts only for energies that were stated in kJ/mol, kcal/mol or meV: their part of{' '}
        <S>f</S>, divided by <S>T</S>, with a minus sign.
      </p>
      <h3>What is shared</h3>
      <ul>
        <li>
          Parameters are common to all points of a series; so is the error of a ligand’s stock, which is
          common to the whole dataset, and so is the dataset’s temperature. Dispensing errors are independent
          from point to point.
        </li>
        <li>
          Statements of different series that are one and the same quantity carry the same{' '}
          <code>sharedAs</code> label and count once in the covariance of the dataset.
        </li>
        <li>
          Correlations are stated between parameters <em>as stated</em>: a reversed orientation reverses their
          sign. Those not stated are 0. A series whose parameters come from a fit and state none carries the
          note <em>correlations not stated</em>, since leaving them out can inflate <S sub="p">u</S>{' '}
          several-fold.
        </li>
      </ul>
    </MethodsSection>
  );
}
