import { InlineEquation } from './equation';
import { MethodsSection } from './methods-section';
import { PlainTable } from './plain-table';

const power = (exponent: number) => <sup>{String(exponent).replace('-', '\u2212')}</sup>;

const ROWS = [
  { key: 'sites', cells: ['number of sites in a class', 'above 0, at most 1000'] },
  { key: 'gap', cells: ['energy gap, after conversion', 'at most 200 kT either way'] },
  {
    key: 'molar',
    cells: [
      'concentrations and constants, where not 0',
      <span key="c">
        10{power(-15)} to 10{power(3)} M
      </span>,
    ],
  },
  {
    key: 'pressure',
    cells: [
      'partial pressures and their constants, where not 0',
      <span key="c">
        10{power(-9)} to 10{power(9)} Pa
      </span>,
    ],
  },
  { key: 'temperature', cells: ['temperature', '200 to 450 K'] },
  {
    key: 'modulation',
    cells: [<InlineEquation key="c" tex="|b_m\,(x_m - x_{m,\mathrm{ref}})|" />, 'at most 200 kT'],
  },
  {
    key: 'activity',
    cells: ['measured activity', '\u22120.5 to 1.5, since noise may carry it beyond 0 and 1'],
  },
  { key: 'size', cells: ['size of a dataset', '1 to 200 series, 1 to 20,000 points, 8 MiB'] },
];

/** What a document may hold. */
export function RangesSection() {
  return (
    <MethodsSection id="ranges">
      <p>
        The ranges are wide enough for every protein and narrow enough that no step of the computation
        overflows. A document that leaves them is refused with the place and the range that was expected.
      </p>
      <PlainTable caption="Ranges of what is stated" heads={['Quantity', 'Range']} rows={ROWS} />
    </MethodsSection>
  );
}
