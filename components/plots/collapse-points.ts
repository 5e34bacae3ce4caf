/** The points of the collapse as rows of numbers, one row a point, grouped by how they are drawn. */
import type { Flag } from '@/lib/engine/assessment';
import { type CollapseView, LARGE } from './collapse-view';
import { placeOf } from './concentration-axis';
import { isInside } from './energy-window';
import { concentrationAt } from './plot-data';

/** x, y of the plot and x, y of the residual panel, then what is needed to draw and to find the point again. */
export interface PointRow {
  x: number;
  energy: number;
  activity: number;
  activityU: number;
  energyU: number;
  expected: number;
  z: number;
  series: number;
  point: number;
}

export type RowsByFlag = Record<Flag, PointRow[]>;

/**
 * The points as rows. Of a crowd only those within the window, so that zooming in resolves points; a few are all
 * given, since each must be found again by its place in the list when points travel.
 */
export function rowsByFlag(view: CollapseView): RowsByFlag {
  const crowd = view.data.assessment.summary.points > LARGE && view.by === 'energy';
  const rows: RowsByFlag = { 'on-curve': [], warning: [], 'off-curve': [] };
  view.data.series.forEach((series, s) => {
    for (const point of series.assessed.points) {
      if (crowd && !isInside(point.energy, view.window)) continue;
      rows[point.flag].push({
        x: xOf(view, s, point.index, point.energy),
        energy: point.energy,
        activity: point.activity,
        activityU: point.activityU,
        energyU: point.energyU,
        expected: point.expected,
        z: point.z,
        series: s,
        point: point.index,
      });
    }
  });
  return rows;
}

function xOf(view: CollapseView, series: number, point: number, energy: number): number {
  if (view.by === 'energy' || view.axis === null) return energy;
  return placeOf(view.axis, concentrationAt(view.data.series[series], point, view.axis.ligand));
}
