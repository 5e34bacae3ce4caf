import type { Point } from '@/schemas/dataset-1.generated';
import { quote } from './describe-value';
import type { CsvColumn } from './read-csv-headings';

/** @param column number of the column, from 1 */
export type TellCell = (column: number, detail: string) => void;

/**
 * Reads one row of a table of points.
 *
 * @param decimalComma whether 0,41 means 0.41
 * @returns the series' name and the point; null where something is wrong, which is told
 */
export function readCsvRow(
  cells: string[],
  columns: CsvColumn[],
  decimalComma: boolean,
  tell: TellCell,
): { series: string; point: Point } | null {
  let clean = true;
  const complain: TellCell = (column, detail) => {
    clean = false;
    tell(column, detail);
  };
  const row = sortCells(cells, columns, decimalComma, complain);
  if (row.series === '') complain(columnOf(columns, 'series'), 'the name of the series must stand here');
  const measured = row.isReadable ? takeMeasured(row, columns, complain) : null;
  if (!clean || measured === null) return null;
  const modulators = Object.keys(row.modulators).length === 0 ? {} : { modulators: row.modulators };
  return { series: row.series, point: { ligands: row.ligands, ...modulators, ...measured } };
}

interface SortedRow {
  series: string;
  ligands: Record<string, number>;
  modulators: Record<string, number>;
  activity: number | null;
  u: number | null;
  replicates: number[];
  /** whether every cell of what was measured holds a number, or nothing */
  isReadable: boolean;
}

function sortCells(
  cells: string[],
  columns: CsvColumn[],
  decimalComma: boolean,
  complain: TellCell,
): SortedRow {
  const row: SortedRow = {
    series: '',
    ligands: {},
    modulators: {},
    activity: null,
    u: null,
    replicates: [],
    isReadable: true,
  };
  cells.forEach((cell, index) => {
    const text = cell.trim();
    const column = columns[index];
    if (text === '') {
      if (column?.holds === 'ligand')
        complain(
          index + 1,
          `the concentration of ${column.ligand.name} must stand here; 0 where none was added`,
        );
      return;
    }
    if (column === undefined) complain(index + 1, sayNoHeading(text, decimalComma));
    else if (column.holds === 'series') row.series = text;
    else if (column.holds !== 'nothing') {
      const number = readNumber(text, decimalComma);
      if (number !== null) place(number, column, row);
      else {
        complain(index + 1, sayNotANumber(text));
        if (column.holds !== 'ligand' && column.holds !== 'modulator') row.isReadable = false;
      }
    }
  });
  return row;
}

function place(number: number, column: CsvColumn, row: SortedRow): void {
  if (column.holds === 'ligand') row.ligands[column.ligand.id] = number;
  else if (column.holds === 'modulator') row.modulators[column.modulator.id] = number;
  else if (column.holds === 'replicate') row.replicates.push(number);
  else if (column.holds === 'activity' || column.holds === 'u') row[column.holds] = number;
}

function takeMeasured(
  { activity, u, replicates }: SortedRow,
  columns: CsvColumn[],
  complain: TellCell,
): Pick<Point, 'activity' | 'u' | 'replicates'> | null {
  if (activity !== null && replicates.length > 0)
    complain(columnOf(columns, 'activity'), 'a row takes an activity or replicates, not both');
  else if (activity !== null) return u === null ? { activity } : { activity, u };
  else if (u !== null)
    complain(columnOf(columns, 'u'), 'u belongs to an activity; leave it empty beside replicates');
  else if (replicates.length === 1)
    complain(
      columnOf(columns, 'replicate'),
      'two or more replicates must stand here; a single one is an activity',
    );
  else if (replicates.length > 1) return { replicates };
  else complain(measuredColumn(columns), 'a measured activity must stand here');
  return null;
}

function measuredColumn(columns: CsvColumn[]): number {
  return columnOf(columns, 'activity') || columnOf(columns, 'replicate');
}

function columnOf(columns: CsvColumn[], holds: CsvColumn['holds']): number {
  return columns.findIndex((column) => column.holds === holds) + 1;
}

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;

/** A number as people type it; null where the text is none. */
function readNumber(text: string, decimalComma: boolean): number | null {
  const ascii = text.replace(/^\u2212/, '-');
  const pointed = decimalComma && !ascii.includes('.') ? ascii.replace(',', '.') : ascii;
  const number = NUMBER.test(pointed) ? Number(pointed) : Number.NaN;
  return Number.isFinite(number) ? number : null;
}

/** In a table with commas between its cells a decimal comma makes a cell too many. */
function sayNoHeading(text: string, decimalComma: boolean): string {
  const hint = decimalComma
    ? ''
    : '; numbers with a decimal comma need another delimiter, such as a semicolon';
  return `there is no heading above ${quote(text)}${hint}`;
}

function sayNotANumber(text: string): string {
  const hint = /^[+-]?\d+,\d+$/.test(text) ? `; did you mean ${text.replace(',', '.')}?` : '';
  return `${quote(text)} is not a number${hint}`;
}
