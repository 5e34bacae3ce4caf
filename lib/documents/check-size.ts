import { tooManyPoints } from './check-schema';
import { eachSeries, type MeaningCheck } from './document-report';
import { MOST_POINTS } from './size-limits';

/** A dataset holds 1 to 20,000 points over all of its series, and each series at least one. */
export const checkSize: MeaningCheck = (document, report) => {
  const points = document.series.reduce((sum, series) => sum + series.points.length, 0);
  eachSeries(document, (series, base) => {
    if (series.points.length === 0) report(`${base}/points`, 'a series needs at least one point');
  });
  if (points > MOST_POINTS) report('/series', tooManyPoints(points));
};
