/** Points as rows of a table: filtered by series, flag and window. */
import { type EnergyWindow, isInside } from '@/components/plots/energy-window';
import type { PlotData, PlotSeries } from '@/components/plots/plot-data';
import type { AssessedPoint, Flag } from '@/lib/engine/assessment';

export interface PointTableRow {
  key: string;
  series: PlotSeries;
  point: AssessedPoint;
}

export interface PointFilter {
  series: number | null;
  flag: Flag | null;
  window: EnergyWindow;
}

export function pointRows(data: PlotData, { series, flag, window }: PointFilter): PointTableRow[] {
  return data.series.flatMap((one, s) => {
    if (series !== null && series !== s) return [];
    return one.assessed.points
      .filter((point) => (flag === null || point.flag === flag) && isInside(point.energy, window))
      .map((point) => ({ key: `${s}/${point.index}`, series: one, point }));
  });
}
