import { MathSymbol as S } from '@/components/ui/math-symbol';
import { AVOGADRO_PER_MOLE, BOLTZMANN_JOULE_PER_KELVIN, ELEMENTARY_CHARGE_COULOMB } from '@/lib/engine/units';
import { InlineEquation } from './equation';
import { MethodsSection } from './methods-section';
import { PlainTable } from './plain-table';
import { PowerOfTen } from './power-of-ten';

const ROWS = [
  { key: 'kT', cells: ['energy in kT', 'as it stands'] },
  {
    key: 'molar',
    cells: [
      'energy in kJ/mol or kcal/mol',
      <span key="c">
        divided by <InlineEquation tex="RT" />; 1 kcal = 4.184 kJ
      </span>,
    ],
  },
  {
    key: 'meV',
    cells: [
      'energy in meV',
      <span key="c">
        divided by <InlineEquation tex="k_\mathrm{B} T" />
      </span>,
    ],
  },
  {
    key: 'L',
    cells: ['ratio, inactive over active (the constant L of 1965)', <InlineEquation key="c" tex="-\ln L" />],
  },
  { key: 'invL', cells: ['ratio, active over inactive', <InlineEquation key="c" tex="+\ln L" />] },
  { key: 'flip', cells: ['energy, active minus inactive', 'the opposite sign'] },
  { key: 'temperature', cells: ['temperature in °C', '273.15 K is added'] },
  {
    key: 'molarity',
    cells: [
      'M, mM, µM, nM, pM',
      'converted to one another; a constant must be of the same kind as its ligand',
    ],
  },
  {
    key: 'pressure',
    cells: ['Pa, kPa, mmHg, Torr', '1 mmHg = 133.322387415 Pa, 1 Torr = 101325/760 Pa'],
  },
];

/** How statements become energies in kT. */
export function StatementsSection() {
  return (
    <MethodsSection id="statements">
      <p>
        Laboratories state the same physics in different ways. So every statement names its unit and its
        orientation, and is converted before anything is computed from it.
      </p>
      <PlainTable
        caption="Statements and how they are converted"
        heads={['Stated as', 'Becomes']}
        rows={ROWS}
      />
      <p>
        The constants are exact by the definition of the SI (2019): <S label="B">k</S> ={' '}
        <PowerOfTen value={BOLTZMANN_JOULE_PER_KELVIN} unit="J/K" />, <S label="A">N</S> ={' '}
        <PowerOfTen value={AVOGADRO_PER_MOLE} unit="/mol" />, <S>e</S> ={' '}
        <PowerOfTen value={ELEMENTARY_CHARGE_COULOMB} unit="C" />, and <S>R</S> = <S label="B">k</S>
        <S label="A">N</S>.
      </p>
      <p>
        A concentration is declared free or total. Where it is total and the protein concentration is stated,
        a point whose sites could bind more than a tenth of the ligand carries the note <em>depletion</em>:
        its coordinate is computed from a concentration that the protein itself has lowered.
      </p>
    </MethodsSection>
  );
}
