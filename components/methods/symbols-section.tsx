import { MathSymbol as S } from '@/components/ui/math-symbol';
import { MethodsSection } from './methods-section';
import { PlainTable } from './plain-table';

const PER_KT = 'kT';

const ROWS = [
  {
    key: 'g0',
    cells: [
      <S key="s" label="0">
        g
      </S>,
      'energy gap of the whole complex without ligand, inactive less active: positive favours active',
      PER_KT,
    ],
  },
  {
    key: 'gs',
    cells: [
      <S key="s" sub="s">
        g
      </S>,
      'energy gap per site of a class; 0 where only the gap of the complex is stated',
      PER_KT,
    ],
  },
  {
    key: 'ns',
    cells: [
      <S key="s" sub="s">
        n
      </S>,
      'number of sites in a class: any positive number, since fitted values are not integers',
      '1',
    ],
  },
  {
    key: 'c',
    cells: [
      <S key="s" sub="l">
        c
      </S>,
      'free concentration, or partial pressure, of a ligand',
      'M or Pa',
    ],
  },
  {
    key: 'K',
    cells: [
      <span key="s">
        <S label="I">K</S>, <S label="A">K</S>
      </span>,
      'dissociation constants in the inactive and in the active state; a ligand that does not bind a state has 1/K = 0 there',
      'as the ligand',
    ],
  },
  {
    key: 'b',
    cells: [
      <S key="s" sub="m">
        b
      </S>,
      'change of the coordinate per unit of a modulator (membrane potential, modification level, pH and the like)',
      'kT per unit',
    ],
  },
  {
    key: 'x',
    cells: [
      <span key="s">
        <S sub="m">x</S>, <S label="ref">x</S>
      </span>,
      'value of the modulator, and the value at which the gap was stated',
      'its own',
    ],
  },
  {
    key: 'a',
    cells: [
      <S key="s">a</S>,
      'measured activity, normalised so that fully inactive is 0 and fully active is 1',
      '1',
    ],
  },
];

/** Table of symbols with units. */
export function SymbolsSection() {
  return (
    <MethodsSection id="symbols">
      <PlainTable
        caption="Symbols, their meaning and their unit"
        heads={['Symbol', 'Meaning', 'Unit']}
        rows={ROWS}
        tightFirst
      />
    </MethodsSection>
  );
}
