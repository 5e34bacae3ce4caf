/** A block of cells from a spreadsheet, put into the table of points from a cell on. Pure. */

import { pointerTo } from '@/lib/documents/json-pointer';
import { type JsonObject, objectOf, readEntry, withValueAt } from './draft-value';
import { withMeasured } from './measured-entry';

/** A column that can be typed in: the members that lead to its number in a point. */
export type PointColumn = readonly string[];

export interface PastedPoints {
  points: unknown[];
  /** rows that were filled */
  rows: number;
  /** columns of the block beyond the table's last one */
  left: number;
}

/** Whether a pasted text is a block of cells, and not the text of one cell. */
export function isBlock(text: string): boolean {
  return /[\t\n]/.test(text.replace(/\r?\n$/, ''));
}

/**
 * @param points the list as it stands; rows below its end are added
 * @param row index of the point of the cell that is pasted into
 * @param column index of its column among those that can be typed in
 */
export function pastePoints(
  points: readonly unknown[],
  columns: readonly PointColumn[],
  { row, column }: { row: number; column: number },
  text: string,
): PastedPoints {
  const cells = withoutHead(
    text
      .replace(/\r?\n$/, '')
      .split(/\r?\n/)
      .map((line) => line.split('\t')),
  );
  const next = [...points];
  cells.forEach((line, i) => {
    const at = Math.min(row + i, next.length);
    const filled = line.reduce(
      (point, cell, k) => withCell(point, columns[column + k], cell),
      next[at] === undefined ? { ligands: {} } : objectOf(next[at]),
    );
    next[at] = filled;
  });
  const widest = Math.max(...cells.map((line) => line.length));
  return { points: next, rows: cells.length, left: Math.max(0, column + widest - columns.length) };
}

function withCell(point: JsonObject, column: PointColumn | undefined, cell: string): JsonObject {
  if (column === undefined) return point;
  if (column[0] === 'activity') return withMeasured(point, cell);
  return withValueAt(point, pointerTo('', ...column), readEntry(cell));
}

/** Heads of columns are no points: a first line without any number is left out. */
function withoutHead(lines: string[][]): string[][] {
  const isHead = lines.length > 1 && lines[0].every((cell) => !/\d/.test(cell)) && lines[0].some(hasLetters);
  return isHead ? lines.slice(1) : lines;
}

const hasLetters = (cell: string) => /\p{L}/u.test(cell);
