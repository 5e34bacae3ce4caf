import { CONCENTRATION_UNITS, type ConcentrationUnit } from '@/lib/engine/units';
import { quote } from './describe-value';
import { makeId } from './make-id';

export interface CsvLigand {
  id: string;
  name: string;
  unit: ConcentrationUnit;
}

export interface CsvModulator {
  id: string;
  name: string;
  unit: string;
}

/** What one column of a table of points holds. */
export type CsvColumn =
  | { holds: 'series' | 'activity' | 'u' | 'replicate' | 'nothing' }
  | { holds: 'ligand'; ligand: CsvLigand }
  | { holds: 'modulator'; modulator: CsvModulator };

/** @param column number of the column, from 1; 0 where it concerns the whole line */
export type TellHeading = (column: number, detail: string) => void;

const BRACKETED = /^(.*\S)\s*[([]\s*([^()[\]]+?)\s*[)\]]$/;
const WITH_UNIT = /^(.*\S)\s+(\S+)$/;

/** Reads the heading line of a table of points; what is wrong with it is told. */
export function readCsvHeadings(cells: string[], tell: TellHeading): CsvColumn[] {
  const ids = new Set<string>();
  const seen = new Set<string>();
  const columns = cells.map((cell, index) => {
    const heading = cell.trim();
    const key = heading.toLowerCase();
    if (heading !== '' && seen.has(key)) tell(index + 1, `the column ${quote(heading)} must stand once`);
    seen.add(key);
    return readHeading(heading, ids, (detail) => tell(index + 1, detail));
  });
  tellMissing(columns, tell);
  return columns;
}

function readHeading(heading: string, ids: Set<string>, tell: (detail: string) => void): CsvColumn {
  const plain = heading.toLowerCase();
  if (heading === '') return { holds: 'nothing' };
  if (plain === 'series' || plain === 'activity' || plain === 'u') return { holds: plain };
  if (/^replicate\s*\d+$/.test(plain)) return { holds: 'replicate' };
  const bracketed = BRACKETED.exec(heading);
  const [, name = '', unitText = ''] = bracketed ?? WITH_UNIT.exec(heading) ?? [];
  const unit = readUnit(unitText);
  if (unit !== null) return { holds: 'ligand', ligand: { id: makeId(name, ids), name, unit } };
  const meant = CONCENTRATION_UNITS.find(
    (known) => known.toLowerCase() === plainUnit(unitText).toLowerCase(),
  );
  if (meant !== undefined) tell(`${quote(unitText)} is no unit that is known; did you mean ${meant}?`);
  else if (bracketed !== null)
    return { holds: 'modulator', modulator: { id: makeId(name, ids), name, unit: unitText } };
  else tell(`${quote(heading)} is no column that is known; ${COLUMNS}`);
  return { holds: 'nothing' };
}

const COLUMNS =
  'columns are series, activity, u, replicate 1, replicate 2, and so on, and for a ligand or modulator its name with its unit, such as velline (uM) or V (mV)';

function readUnit(text: string): ConcentrationUnit | null {
  return CONCENTRATION_UNITS.find((unit) => unit === plainUnit(text)) ?? null;
}

/** The micro sign and the Greek letter both stand for u. */
function plainUnit(text: string): string {
  return text.replace(/[µμ]/g, 'u');
}

function tellMissing(columns: CsvColumn[], tell: TellHeading): void {
  const holds = new Set(columns.map((column) => column.holds));
  if (!holds.has('series')) tell(0, 'a column series must name the series of each row');
  if (!holds.has('ligand'))
    tell(0, 'a column for each ligand must have its name and unit as heading, such as velline (uM)');
  if (!holds.has('activity') && !holds.has('replicate'))
    tell(0, 'a column activity, or columns replicate 1, replicate 2, and so on, must hold what was measured');
}
