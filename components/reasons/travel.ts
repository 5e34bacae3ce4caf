/** Two views of one dataset and what lies between them: where points stand while they travel. Pure. */
import type { EnergyWindow } from '@/components/plots/energy-window';
import type { PlotData, PlotSeries } from '@/components/plots/plot-data';
import type { AssessedPoint } from '@/lib/engine/assessment';

export interface Scene {
  data: PlotData;
  window: EnergyWindow;
}

/** Beyond so many points a frame takes too long to draw. */
const MOST_TRAVELLING = 1500;

/** Whether every point of one view can be found again in the other, and they are few enough to be seen moving. */
export function canTravel(from: Scene, to: Scene): boolean {
  const counts = ({ data }: Scene) => data.series.map(({ assessed }) => assessed.points.length);
  const [one, other] = [counts(from), counts(to)];
  return (
    one.length === other.length &&
    one.every((count, i) => count === other[i]) &&
    one.reduce((sum, count) => sum + count, 0) <= MOST_TRAVELLING
  );
}

/**
 * The view a share of the way from one to another. Points keep the marks of where they come from until they
 * arrive, so that a miss is seen to close.
 *
 * @param share 0 to 1
 */
export function sceneBetween(from: Scene, to: Scene, share: number): Scene {
  const eased = share * share * (3 - 2 * share);
  const series = to.data.series.map((one, i) => seriesBetween(from.data.series[i], one, eased));
  return {
    data: { ...to.data, series },
    window: {
      from: between(from.window.from, to.window.from, eased),
      to: between(from.window.to, to.window.to, eased),
    },
  };
}

function seriesBetween(from: PlotSeries, to: PlotSeries, share: number): PlotSeries {
  const points = to.assessed.points.map((point, i) => pointBetween(from.assessed.points[i], point, share));
  const { rmsZ, pValue } = from.assessed;
  return { ...to, assessed: { ...to.assessed, points, rmsZ, pValue } };
}

function pointBetween(from: AssessedPoint, to: AssessedPoint, share: number): AssessedPoint {
  return {
    ...to,
    energy: between(from.energy, to.energy, share),
    energyU: between(from.energyU, to.energyU, share),
    activity: between(from.activity, to.activity, share),
    activityU: between(from.activityU, to.activityU, share),
    expected: between(from.expected, to.expected, share),
    z: between(from.z, to.z, share),
    flag: from.flag,
  };
}

function between(from: number, to: number, share: number): number {
  return from + (to - from) * share;
}

/** The window that holds what two windows hold. */
export function unionOf(a: EnergyWindow, b: EnergyWindow): EnergyWindow {
  return { from: Math.min(a.from, b.from), to: Math.max(a.to, b.to) };
}
