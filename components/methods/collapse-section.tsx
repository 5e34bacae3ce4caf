import { MathSymbol as S } from '@/components/ui/math-symbol';
import { POLICY } from '@/lib/engine/flags';
import { Equation, InlineEquation } from './equation';
import { MethodsSection } from './methods-section';

/** Q of a series and of a dataset. */
export function CollapseSection() {
  return (
    <MethodsSection id="collapse">
      <p>
        Points of one series share their parameters, so they miss together. The test of a series therefore
        uses the full covariance <S>C</S> of its residuals:
      </p>
      <Equation tex="Q = r^{\mathrm{T}} C^{-1} r \qquad C = \operatorname{diag}(d_1, d_2, \dots) + J V J^{\mathrm{T}} \qquad J = p\,(1 - p)\,\partial f / \partial \theta" />
      <Equation
        says="What is independent from point to point"
        tex={
          'd = u_\\mathrm{a}^2 + u_0^2 + \\sum_l \\bigl(p\\,(1 - p)\\, w_l\\; \\partial f / \\partial \\ln c_l\\bigr)^2'
        }
      />
      <p>
        <S>Q</S> is referred to the upper tail of <InlineEquation tex="\chi^2" /> with as many degrees of
        freedom <S>m</S> as there are points. Where the parameters were fitted to these points, <S>C</S> is
        the diagonal alone and the number of fitted parameters is taken off <S>m</S>; where none are left,
        there is no <S>p</S>.
      </p>
      <p>
        Where replicates enter, their pooled <S>s</S> is itself uncertain, and <InlineEquation tex="Q / m" />{' '}
        is referred to <InlineEquation tex="F(m, \nu_Q)" /> instead:
      </p>
      <Equation tex="\frac{1}{\nu_Q} = \sum_{\mathrm{series}} \frac{t^2}{\nu} \qquad t = \frac{1}{m} \sum_i (C^{-1})_{ii}\, u_{\mathrm{a},i}^2" />
      <p>
        where <S>i</S> runs over the replicate points of a series. With <InlineEquation tex="\chi^2" />,
        correct series of three replicates would be rejected at 1 % three to five times too often.
      </p>
      <p>
        The dataset’s <S>Q</S> is the same over all its points, with shared parameters counted once. RMS{' '}
        <S>z</S> beside it is the root mean square of the scores.
      </p>
      <p>
        A dataset whose parameters were fitted to the very points that it shows is no test of collapse, and is
        marked so wherever it appears. A point’s flag and the <S>Q</S> of its series can disagree: the flag
        looks at one point (policy {POLICY.number}), <S>Q</S> at all of them together.
      </p>
    </MethodsSection>
  );
}
