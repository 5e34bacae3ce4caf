/** Points as rows of a table: filtered by series, flag and window. */
import { type EnergyWindow, isInside } from '@/components/plots/energy-window';
import type { PlotData, PlotSeries } from '@/components/plots/plot-data';
import type { AssessedPoint, Flag } from '@/lib/engine/assessment';

export interface PointTableRow {
  key: string;
  series: PlotSeries;
  point: AssessedPoint;
}

/** One flag, or warnings and off-curve points together. */
export type FlagChoice = Flag | 'flagged';

/** As they were measured, the furthest misses first, or by energy. */
export type PointOrder = 'measured' | 'miss' | 'energy';

export interface PointFilter {
  series: number | null;
  flag: FlagChoice | null;
  window: EnergyWindow;
  /** as measured where left out */
  order?: PointOrder;
}

export function pointRows(
  data: PlotData,
  { series, flag, window, order = 'measured' }: PointFilter,
): PointTableRow[] {
  const rows = data.series.flatMap((one, s) => {
    if (series !== null && series !== s) return [];
    return one.assessed.points
      .filter((point) => isChosen(point, flag) && isInside(point.energy, window))
      .map((point) => ({ key: `${s}/${point.index}`, series: one, point }));
  });
  return sorted(rows, order);
}

function isChosen({ flag }: AssessedPoint, choice: FlagChoice | null): boolean {
  if (choice === null) return true;
  return choice === 'flagged' ? flag !== 'on-curve' : flag === choice;
}

function sorted(rows: PointTableRow[], order: PointOrder): PointTableRow[] {
  if (order === 'miss') return rows.sort((a, b) => Math.abs(b.point.z) - Math.abs(a.point.z));
  if (order === 'energy') return rows.sort((a, b) => a.point.energy - b.point.energy);
  return rows;
}
