/** A note on series that were scaled to their own smallest and largest activity, but do not reach 0 and 1. */
import type { Note } from './assessment';
import type { DatasetInput } from './inputs';
import type { PointTable } from './point-table';

/** A smallest expected activity above this, … */
const HIGHEST_FLOOR = 0.05;
/** … or a largest below this, and the scaling stretches the series noticeably. */
const LOWEST_CEILING = 0.95;

/** Says where the scaling itself pulls points off the curve, and what the unscaled range would be. */
export function noteNormalisation(dataset: DatasetInput, { expected }: PointTable): Note[] {
  if (dataset.normalisation.method !== 'series-min-max') return [];
  let lowest = Number.POSITIVE_INFINITY;
  let highest = Number.NEGATIVE_INFINITY;
  for (const p of expected) {
    lowest = Math.min(lowest, p);
    highest = Math.max(highest, p);
  }
  if (lowest <= HIGHEST_FLOOR && highest >= LOWEST_CEILING) return [];
  const range = `from ${lowest.toFixed(2)} to ${highest.toFixed(2)}`;
  return [
    {
      code: 'normalisation',
      detail: `The series is scaled to its own smallest and largest activity, so it runs from 0 to 1, while its parameters predict activities ${range} at its points: the scaling itself pulls points off the curve. Unscaled, it would run ${range}.`,
    },
  ];
}
