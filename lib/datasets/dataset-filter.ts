/** From the filters of an address to what is selected, and back to an address. */
import type { Selection } from '@/db/queries/dataset-selection';
import type { EnergyWindowAnswer, PointCounts } from '@/schemas/dataset-answers';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { ENERGY_CELL_KT } from '@/schemas/density-grid';
import { type CellWindow, cellWindow } from './density-grid';

/** What the filters select. */
export function selectionOf({ from, to, ...filters }: DatasetFilters): Selection {
  return { filters, window: cellWindow(from, to) };
}

/** The window as it is counted: its edges moved out to whole cells; open sides stay open. */
export function countedWindow(
  { from, to }: Pick<DatasetFilters, 'from' | 'to'>,
  window: CellWindow | null,
): EnergyWindowAnswer | null {
  if (window === null) return null;
  const edge = (cell: number) => Number((cell * ENERGY_CELL_KT).toFixed(1));
  return {
    from: from === null ? null : edge(window.firstCell),
    to: to === null ? null : edge(window.endCell),
  };
}

/** The parameters of an address that select the same, in one order, so that equal selections have equal addresses. */
export function filterParameters({ from, to, q, ...lists }: DatasetFilters): URLSearchParams {
  const parameters = new URLSearchParams();
  for (const name of ['system', 'lab', 'ligand', 'variant', 'flag'] as const)
    for (const value of lists[name]) parameters.append(name, value);
  if (from !== null) parameters.set('from', String(from));
  if (to !== null) parameters.set('to', String(to));
  if (q.length > 0) parameters.set('q', q.join(' '));
  return parameters;
}

/** Counts by flag as an answer states them. */
export function countsOf(
  rows: { flag: 'on-curve' | 'warning' | 'off-curve'; points: number }[],
): PointCounts {
  const counts = { 'on-curve': 0, warning: 0, 'off-curve': 0 };
  for (const { flag, points } of rows) counts[flag] += points;
  return {
    points: counts['on-curve'] + counts.warning + counts['off-curve'],
    onCurve: counts['on-curve'],
    warning: counts.warning,
    offCurve: counts['off-curve'],
  };
}
