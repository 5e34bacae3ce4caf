import { MethodsSection } from './methods-section';

/** Where equations, limits and constants come from. */
export function SourcesSection() {
  return (
    <MethodsSection id="sources">
      <ul>
        <li>
          J. Monod, J. Wyman, J.-P. Changeux, On the nature of allosteric transitions: a plausible model.{' '}
          <cite>J. Mol. Biol.</cite> 12, 88 (1965). The two-state model.
        </li>
        <li>
          JCGM 100:2008, <cite>Guide to the expression of uncertainty in measurement</cite>. Standard
          uncertainties, their propagation, effective degrees of freedom.
        </li>
        <li>
          ISO 13528,{' '}
          <cite>Statistical methods for use in proficiency testing by interlaboratory comparison</cite>.
          Warning and action limits of scores.
        </li>
        <li>
          Y. Benjamini, Y. Hochberg, Controlling the false discovery rate. <cite>J. R. Stat. Soc. B</cite> 57,
          289 (1995). The adjustment q.
        </li>
        <li>
          JCGM 101:2008,{' '}
          <cite>
            Supplement 1 to the Guide to the expression of uncertainty in measurement: propagation of
            distributions using a Monte Carlo method
          </cite>
          .
        </li>
        <li>
          H. Akaike, A new look at the statistical model identification.{' '}
          <cite>IEEE Trans. Autom. Control</cite> 19, 716 (1974). The comparison of shapes.
        </li>
        <li>
          K. Levenberg, A method for the solution of certain non-linear problems in least squares.{' '}
          <cite>Q. Appl. Math.</cite> 2, 164 (1944); D. W. Marquardt, An algorithm for least-squares
          estimation of nonlinear parameters. <cite>J. Soc. Ind. Appl. Math.</cite> 11, 431 (1963). The refit.
        </li>
        <li>
          BIPM, <cite>The International System of Units</cite>, 9th edition (2019). Constants and conversions.
        </li>
      </ul>
    </MethodsSection>
  );
}
