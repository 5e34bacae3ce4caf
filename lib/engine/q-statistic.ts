/**
 * Whether residuals are as large as their uncertainties say, for one series and for a whole dataset.
 *
 *     Q = rᵀC⁻¹r,   C = diag(u_a² + u_0² + dispensing) + J V Jᵀ
 *
 * (the diagonal alone where the parameters were fitted to these points). Q is referred to χ² with as many
 * degrees of freedom m as points, less the number fitted. Where replicates enter, their pooled spread is
 * itself uncertain, and Q/m is referred to F(m, ν_Q) with
 *
 *     1/ν_Q = Σ_series t²/ν,   t = Σ (C⁻¹)_ii u_a,i²/(number of points), over the replicate points of the series.
 */
import type { QStatistic } from './assessment';
import { LowRankNoise } from './low-rank-noise';
import type { PointTable } from './point-table';
import type { SeriesModel } from './series-model';
import { independentVariance, whitenedGradient } from './series-noise';
import { chiSquaredUpper, fisherUpper } from './tails';

/** A series with what the statistics need of it. */
export interface ScoredSeries {
  model: SeriesModel;
  table: PointTable;
  fittedHere: boolean;
  /** parameters fitted to these points; 0 unless `fittedHere` */
  fittedCount: number;
}

/** Q of one series. */
export function seriesQ(series: ScoredSeries): QStatistic {
  const { model, table, fittedHere } = series;
  const diagonal = independentVariance(table);
  const noise = fittedHere
    ? new LowRankNoise(diagonal, new Float64Array(0), 0)
    : new LowRankNoise(diagonal, whitenedGradient(model, table), model.sharedKeys.length);
  const chiSquared = noise.quadraticForm(table.residual);
  const degreesOfFreedom = degreesOfFreedomOf(series);
  const softness =
    table.degreesOfFreedom > 0 ? replicateSoftness(table, noise.inverseDiagonal(), table.count) : 0;
  return {
    chiSquared,
    degreesOfFreedom,
    pValue: pValueOf(chiSquared, degreesOfFreedom, softness, [series]),
    rmsZ: rootMeanSquare([table]),
  };
}

/** m: points, less the parameters fitted to them; at least 0. */
export function degreesOfFreedomOf(series: ScoredSeries): number {
  return Math.max(0, series.table.count - series.fittedCount);
}

/** t²/ν of a series: its part of 1/ν_Q. `points` counts all points that Q is taken over. */
export function replicateSoftness(table: PointTable, inverseDiagonal: Float64Array, points: number): number {
  let t = 0;
  for (let i = 0; i < table.count; i++) {
    if (table.uncertainty[i] === 'replicates') t += inverseDiagonal[i] * table.activityU[i] ** 2;
  }
  return (t / points) ** 2 / table.degreesOfFreedom;
}

/** Upper tail of Q; null where no degrees of freedom are left or an uncertainty was assumed. */
export function pValueOf(
  chiSquared: number,
  degreesOfFreedom: number,
  softness: number,
  series: readonly ScoredSeries[],
): number | null {
  if (degreesOfFreedom === 0) return null;
  if (series.some(({ table }) => table.uncertainty.includes('assumed'))) return null;
  if (softness === 0) return chiSquaredUpper(chiSquared, degreesOfFreedom);
  return fisherUpper(chiSquared / degreesOfFreedom, degreesOfFreedom, 1 / softness);
}

/** √(mean of z²) over all points of the tables. */
export function rootMeanSquare(tables: readonly PointTable[]): number {
  let sum = 0;
  let count = 0;
  for (const table of tables) {
    count += table.count;
    for (const z of table.z) sum += z * z;
  }
  return Math.sqrt(sum / count);
}
