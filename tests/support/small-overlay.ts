/** Overlays as the API gives them, made from a few points. */
import type { Flag } from '@/lib/engine/assessment';
import { logistic } from '@/lib/engine/logistic';
import type { Overlay, OverlayPoints } from '@/schemas/overlay';

export interface SmallPoint {
  energy: number;
  activity: number;
  flag: Flag;
  dataset: number;
}

const ENERGY = 0.1;
const ACTIVITY = 0.01;

/** @param single whether points are sent one by one, as where they are few */
export function smallOverlay(points: readonly SmallPoint[], single = true): Overlay {
  const offCurve = points.filter(({ flag }) => flag === 'off-curve');
  const count = (flag: Flag) => points.filter((point) => point.flag === flag).length;
  const datasets = Math.max(0, ...points.map(({ dataset }) => dataset + 1));
  return {
    counts: {
      datasets,
      points: points.length,
      onCurve: count('on-curve'),
      warning: count('warning'),
      offCurve: offCurve.length,
    },
    window: null,
    grid: { energy: ENERGY, activity: ACTIVITY },
    cells: {
      energyCell: points.map(({ energy }) => Math.floor(energy / ENERGY)),
      activityCell: points.map(({ activity }) => Math.floor(activity / ACTIVITY)),
      flag: points.map(({ flag }) => flag),
      points: points.map(() => 1),
    },
    points: single ? columns(points) : null,
    offCurve: { total: offCurve.length, shown: offCurve.length, points: columns(offCurve) },
    datasets: Array.from({ length: datasets }, (_, i) => ({
      accession: `CK-${String(i + 1).padStart(6, '0')}`,
      title: `Dataset ${i + 1}`,
      lab: { slug: 'a-lab', name: 'A Lab' },
      system: { slug: 'a-system', name: 'A System' },
      series: ['first series'],
    })),
  };
}

function columns(points: readonly SmallPoint[]): OverlayPoints {
  return {
    dataset: points.map(({ dataset }) => dataset),
    series: points.map(() => 0),
    point: points.map((_, i) => i),
    energy: points.map(({ energy }) => energy),
    activity: points.map(({ activity }) => activity),
    expected: points.map(({ energy }) => logistic(energy)),
    z: points.map(({ energy, activity }) => (activity - logistic(energy)) / 0.02),
    flag: points.map(({ flag }) => flag),
  };
}

/** Two datasets: one on the curve, one with a warning and a miss. */
export const TWO_DATASETS: readonly SmallPoint[] = [
  { energy: -12.25, activity: 0.001, flag: 'on-curve', dataset: 0 },
  { energy: -1.05, activity: 0.26, flag: 'on-curve', dataset: 0 },
  { energy: 0.05, activity: 0.51, flag: 'on-curve', dataset: 0 },
  { energy: 1.05, activity: 0.79, flag: 'warning', dataset: 1 },
  { energy: 2.05, activity: 0.31, flag: 'off-curve', dataset: 1 },
];
