/** How the overlay of many datasets is being looked at, and the points that are drawn one by one in it. */
import type { Flag } from '@/lib/engine/assessment';
import type { Overlay, OverlayPoints } from '@/schemas/overlay';
import type { CollapseHeights } from './collapse-view';
import type { EnergyWindow } from './energy-window';
import type { PlotColours } from './plot-colours';

/** A point that is drawn by itself. Energies in kT. */
export interface OverlayPoint {
  energy: number;
  activity: number;
  expected: number;
  z: number;
  flag: Flag;
  /** places: of the dataset in the overlay's list, of the series in it, of the point in that */
  dataset: number;
  series: number;
  point: number;
}

export interface OverlayView {
  overlay: Overlay;
  window: EnergyWindow;
  colours: PlotColours;
  heights: CollapseHeights;
}

/** A list of columns as points. */
export function pointsFrom(columns: OverlayPoints): OverlayPoint[] {
  return columns.energy.map((energy, i) => ({
    energy,
    activity: columns.activity[i],
    expected: columns.expected[i],
    z: columns.z[i],
    flag: columns.flag[i],
    dataset: columns.dataset[i],
    series: columns.series[i],
    point: columns.point[i],
  }));
}

/** Every point that can be drawn by itself: all where they are few, else those off the curve. */
export function singlePoints({ points, offCurve }: Overlay): OverlayPoint[] {
  return pointsFrom(points ?? offCurve.points);
}

/** Bounds of the activity axis: the curve with air, wider where points lie outside. */
export function overlayActivityBounds({ overlay }: Pick<OverlayView, 'overlay'>): {
  low: number;
  high: number;
} {
  let low = -0.17;
  let high = 1.18;
  for (const { activity } of singlePoints(overlay)) {
    low = Math.min(low, activity - 0.04);
    high = Math.max(high, activity + 0.04);
  }
  return { low, high };
}

/** Half the height of the residual panel in standard uncertainties; what is beyond stands at its edge. */
export const OVERLAY_RESIDUAL_BOUND = 9;

/** Whether some points are beyond the residual panel and stand at its edge. */
export function exceedsOverlayResiduals(overlay: Overlay): boolean {
  return singlePoints(overlay).some(({ z }) => Math.abs(z) > OVERLAY_RESIDUAL_BOUND);
}

/** All energies of the overlay with how many points lie there: single ones, or the middles of cells. */
export function energiesOfOverlay(overlay: Overlay): { energy: number; flag: Flag; points: number }[] {
  if (overlay.points)
    return pointsFrom(overlay.points).map(({ energy, flag }) => ({ energy, flag, points: 1 }));
  const { energyCell, flag, points } = overlay.cells;
  return energyCell.map((cell, i) => ({
    energy: (cell + 0.5) * overlay.grid.energy,
    flag: flag[i],
    points: points[i],
  }));
}
