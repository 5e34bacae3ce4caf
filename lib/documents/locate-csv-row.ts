import { membersOf } from './json-pointer';
import type { CsvPoints } from './read-csv-points';

/**
 * The line of the table that a place of the document made from it comes from.
 *
 * @param pointer JSON Pointer into the assembled document
 * @returns the line from 1, that of its first point for a series, null for what is not from the table
 */
export function locateCsvRow(table: CsvPoints, pointer: string): number | null {
  const [list, series, member, point] = membersOf(pointer);
  if (list !== 'series' || series === undefined) return null;
  const lines = table.series[Number(series)]?.lines;
  if (member === undefined) return lines?.[0] ?? null;
  return (member === 'points' && lines?.[Number(point)]) || null;
}
