/**
 * The measured activity of each point of a series and its standard uncertainty. Replicates share one
 * spread: s is pooled over all replicates of the series, u_a = s/√count, with ν = Σ(count − 1) degrees of
 * freedom. A point that states neither `u` nor replicates is given an assumed uncertainty and marked so.
 *
 * Source: JCGM 100:2008 (GUM), 4.2 and H.3.6 (pooled estimate).
 */
import type { ActivityUncertainty } from './assessment';
import { POLICY } from './flags';
import type { PointInput } from './inputs';

export interface MeasuredActivity {
  /** m numbers */
  activity: Float64Array;
  /** standard uncertainty of each, m numbers */
  activityU: Float64Array;
  uncertainty: ActivityUncertainty[];
  /** ν of the pooled s; 0 where the series has no replicates */
  degreesOfFreedom: number;
}

/**
 * Measured activities of the points of one series, m of them, in their order.
 *
 * @param points each with `activity` (and `u`), or with two or more `replicates`
 */
export function measureActivity(points: readonly PointInput[]): MeasuredActivity {
  const activity = new Float64Array(points.length);
  const activityU = new Float64Array(points.length);
  const uncertainty: ActivityUncertainty[] = [];
  let squares = 0;
  let degreesOfFreedom = 0;
  points.forEach((point, i) => {
    if (point.replicates) {
      activity[i] = mean(point.replicates);
      for (const value of point.replicates) squares += (value - activity[i]) ** 2;
      degreesOfFreedom += point.replicates.length - 1;
      uncertainty.push('replicates');
    } else {
      activity[i] = point.activity ?? 0;
      activityU[i] = point.u ?? POLICY.assumedActivityU;
      uncertainty.push(point.u === undefined ? 'assumed' : 'stated');
    }
  });
  const pooled = degreesOfFreedom > 0 ? Math.sqrt(squares / degreesOfFreedom) : 0;
  points.forEach((point, i) => {
    if (point.replicates) activityU[i] = pooled / Math.sqrt(point.replicates.length);
  });
  return { activity, activityU, uncertainty, degreesOfFreedom };
}

function mean(values: readonly number[]): number {
  let sum = 0;
  for (const value of values) sum += value;
  return sum / values.length;
}
