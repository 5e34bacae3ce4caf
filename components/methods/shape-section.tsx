import { MathSymbol as S } from '@/components/ui/math-symbol';
import { Equation, InlineEquation } from './equation';
import { MethodsSection } from './methods-section';
import { PlainTable } from './plain-table';

/** The one-step alternatives to the stated parameters. */
export function ShapeSection() {
  return (
    <MethodsSection id="shape">
      <p>
        Where the points of a series lie beside the curve, one simple change often brings them back. Five
        changes and two pairs of them are tried on every series that has at least two points more than the
        change has numbers:
      </p>
      <PlainTable
        caption="Alternatives to the stated parameters"
        heads={['alternative', 'expected activity', 'what it may stand for']}
        tightFirst
        rows={[
          {
            key: 'offset',
            cells: ['offset', <InlineEquation key="e" tex="p(f + \delta)" />, 'a gap that is off, in kT'],
          },
          {
            key: 'slope',
            cells: ['slope', <InlineEquation key="e" tex="p(s f)" />, 'another number of cooperating sites'],
          },
          {
            key: 'ceiling',
            cells: [
              'ceiling',
              <InlineEquation key="e" tex="A\,p(f)" />,
              'a share of the protein that never responds',
            ],
          },
          {
            key: 'floor',
            cells: [
              'floor',
              <InlineEquation key="e" tex="B + (1 - B)\,p(f)" />,
              'a background that was not taken off',
            ],
          },
          {
            key: 'stock',
            cells: [
              'stock',
              <InlineEquation key="e" tex="p(f(\alpha c))" />,
              'a stock of another concentration; where one ligand acts alone',
            ],
          },
          {
            key: 'offset+slope',
            cells: ['offset and slope', <InlineEquation key="e" tex="p(s f + \delta)" />, 'both at once'],
          },
          {
            key: 'floor+ceiling',
            cells: ['floor and ceiling', <InlineEquation key="e" tex="B + (A - B)\,p(f)" />, 'both at once'],
          },
        ]}
      />
      <p>
        Each is fitted by generalised least squares with the full covariance <S>C</S> of the series, which is
        taken anew at the fit: uncertainties that points have in common would otherwise pass for an offset.
        They are compared with the statements by Akaike’s criterion, where <S>k</S> is how many numbers an
        alternative has:
      </p>
      <Equation tex="\mathrm{AIC} = r^{\mathrm{T}} C^{-1} r + \ln \det C + 2 k" />
      <p>
        An alternative is named only where its AIC is at least 8 below that of the statements, and then the
        one with the lowest, with its estimate and standard uncertainty. Beside an offset stands what the
        stated uncertainties alone would allow: the mean over the points of{' '}
        <InlineEquation tex="(g^{\mathrm{T}} V g)^{1/2}" />, with <S>g</S> the gradient of <S>f</S> by the
        parameters. An offset well beyond that is no matter of chance.
      </p>
      <p>
        Trying an alternative re-reads the series so that the energies, the concentrations or the activities
        carry the change, and assesses it again. Nothing is saved.
      </p>
    </MethodsSection>
  );
}
