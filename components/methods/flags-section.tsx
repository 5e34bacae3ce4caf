import { MathSymbol as S } from '@/components/ui/math-symbol';
import { expectedByChance, POLICY } from '@/lib/engine/flags';
import { Equation, InlineEquation } from './equation';
import { MethodsSection } from './methods-section';
import { PlainTable } from './plain-table';

const WARNING = POLICY.warningBelow.toFixed(5);
const OFF_CURVE = POLICY.offCurveBelow.toFixed(5);

const ROWS = [
  {
    key: 'on',
    cells: [
      'on curve',
      <InlineEquation key="p" tex={`p \\ge ${WARNING}`} />,
      <InlineEquation key="z" tex="|z| \le 2" />,
    ],
  },
  {
    key: 'warning',
    cells: [
      'warning',
      <InlineEquation key="p" tex={`${OFF_CURVE} \\le p < ${WARNING}`} />,
      <InlineEquation key="z" tex="2 < |z| \le 3" />,
    ],
  },
  {
    key: 'off',
    cells: [
      'off curve',
      <InlineEquation key="p" tex={`p < ${OFF_CURVE}`} />,
      <InlineEquation key="z" tex="|z| > 3" />,
    ],
  },
];

/** r, z, p, q and the flags of the policy. */
export function FlagsSection() {
  const chance = expectedByChance(1000);
  return (
    <MethodsSection id="flags">
      <p>
        The residual of a point is its measured activity less the expected one, and its score <S>z</S> is the
        residual in its own standard uncertainty:
      </p>
      <Equation tex="r = a - p(f) \qquad u_r^2 = u_\mathrm{a}^2 + u_p^2 + u_0^2 \qquad z = r / u_r" />
      <p>
        <InlineEquation tex={`u_0 = ${POLICY.modelFloor}`} /> is the model floor: no two-state description is
        trusted beyond it. In a series whose parameters were fitted to the points shown, <S sub="p">u</S> is
        left out, since the parameters were bent to these very points.
      </p>
      <p>
        The two-sided <S>p</S> of a point is the tail of the normal distribution. Where <S label="a">u</S>{' '}
        comes from replicates it is that of Student’s <S>t</S> with the effective degrees of freedom{' '}
        <InlineEquation tex="u_r^4 / (u_\mathrm{a}^4 / \nu)" /> of Welch and Satterthwaite (JCGM 100, G.4).
        Policy {POLICY.number} sets the flag from it:
      </p>
      <PlainTable
        caption={`Flags of policy ${POLICY.number}`}
        heads={['Flag', 'Rule', 'For the normal distribution']}
        rows={ROWS}
      />
      <p>
        These are the warning and action limits that ISO 13528 uses for scores. To full precision they are{' '}
        <span className="figures">{POLICY.warningBelow}</span> and{' '}
        <span className="figures">{POLICY.offCurveBelow}</span>, the normal tails beyond two and three
        standard uncertainties.
      </p>
      <p>
        Chance alone gives {chance.warning.toFixed(1)} warnings and {chance.offCurve.toFixed(1)} off-curve
        points in a thousand correct ones, and every summary says what that means for its own number of
        points. Beside each <S>p</S> stands <S>q</S>, its Benjamini–Hochberg adjustment within the dataset.
      </p>
      <p>
        An assessment records the engine’s version and the policy’s number. A new policy never changes what an
        older one said.
      </p>
    </MethodsSection>
  );
}
