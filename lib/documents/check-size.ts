import { tooManyPoints } from './check-schema';
import type { MeaningCheck } from './document-report';
import { MOST_POINTS } from './size-limits';

/** A dataset holds 1 to 20,000 points, over all of its series. */
export const checkSize: MeaningCheck = (document, report) => {
  const points = document.series.reduce((sum, series) => sum + series.points.length, 0);
  if (points === 0) report('/series', 'a dataset needs at least one point');
  if (points > MOST_POINTS) report('/series', tooManyPoints(points));
};
