/**
 * The points at which the linear propagation of uncertainty is most in doubt: where the master curve bends
 * over the width of u_f, or where the energy bends over the width of the uncertain quantities.
 *
 * For a normal f the next term of the variance of p(f) is p′² u_f⁴ (p‴/p′ + ½(p″/p′)²), with
 * p″/p′ = w = 1 − 2p and p‴/p′ = (3w² − 1)/2; so relative to u_p² the bend of the curve counts
 * κ(w² + ¼), κ being u_f² (without correlations where that is more: what cancels in the linear form need not
 * cancel beyond it). A lognormal quantity of spread σ bends by σ²/2, in proportion to its part of u_f². Points
 * are ranked by this curvature times u_p: by how far off, in activity, the linear u_p may be.
 */
import { isLognormal } from './draw-model';
import { logistic, logisticSlope } from './logistic';
import type { PointTable } from './point-table';
import type { ScoredSeries } from './q-statistic';
import type { SeriesModel } from './series-model';

/** Most points of a dataset that the Monte Carlo method is tried on. */
const MOST_POINTS = 100;
/** Below this the two ways differ by less than about 2 %: nothing is to be found. */
const LEAST_CURVATURE = 0.02;
/** An uncertainty of the expected activity below this matters nowhere beside u_0. */
export const LEAST_EXPECTED_U = 0.001;
/** Most elementary steps of one trial over all points; published models need a few thousand. */
const MOST_STEPS = 20_000;

/** Chosen points by series: their indices, ascending. */
export function chooseCurvedPoints(scored: readonly ScoredSeries[]): number[][] {
  const candidates = scored.flatMap(({ model, table }, series) =>
    excessAtPoints(model, table).map((point) => ({ series, ...point })),
  );
  candidates.sort((a, b) => b.excess - a.excess || a.series - b.series || a.index - b.index);
  const chosen: number[][] = scored.map(() => []);
  let count = 0;
  let steps = 0;
  for (const { series, index } of candidates) {
    if (count === MOST_POINTS) break;
    const cost = stepsOf(scored[series].model, chosen[series].length === 0);
    if (steps + cost > MOST_STEPS) continue;
    steps += cost;
    count++;
    chosen[series].push(index);
  }
  return chosen.map((indices) => indices.sort((a, b) => a - b));
}

/** What curvature may add to u_p or take from it, in activity, at the points where that is noticeable. */
function excessAtPoints(model: SeriesModel, table: PointTable): { index: number; excess: number }[] {
  const columns = model.sharedKeys.length;
  const spread = logarithmicSpread(model);
  const dispensingSpread = Math.max(0, ...model.relativeU) ** 2;
  const found: { index: number; excess: number }[] = [];
  for (let index = 0; index < table.count; index++) {
    const energy = table.energy[index];
    const slope = logisticSlope(energy);
    if (slope === 0) continue;
    let variance = table.dispensingVariance[index];
    let bend = variance * dispensingSpread;
    for (let k = 0; k < columns; k++) {
      const part = table.expectedGradient[index * columns + k] ** 2;
      variance += part;
      bend += part * spread[k];
    }
    const kappa = Math.max(table.energyU[index] ** 2, variance / slope / slope);
    if (kappa === 0 || variance === 0) continue;
    const curvature = kappa * ((1 - 2 * table.expected[index]) ** 2 + 0.25) + bend / variance / 2;
    if (curvature < LEAST_CURVATURE) continue;
    const expectedU = halfWidth(energy, Math.sqrt(kappa));
    if (expectedU >= LEAST_EXPECTED_U) found.push({ index, excess: curvature * expectedU });
  }
  return found;
}

/** σ² of what a column is the logarithm of; for sites, which multiply, the relative variance. By column. */
function logarithmicSpread(model: SeriesModel): Float64Array {
  const spread = new Float64Array(model.sharedKeys.length);
  for (const { kind, place, scale, column } of model.quantities) {
    const sigma = isLognormal(kind) ? scale : kind === 'sites' ? scale / model.sites[place] : 0;
    spread[column] = Math.max(spread[column], sigma * sigma);
  }
  return spread;
}

/** Half of what the activity moves over ± u_f: u_p, but not 0 where only the linear form stands still. */
function halfWidth(energy: number, u: number): number {
  return (logistic(energy + u) - logistic(energy - u)) / 2;
}

/** Elementary steps of one trial: of the point, and of drawing its series' model where it is the first. */
function stepsOf(model: SeriesModel, first: boolean): number {
  const sites = model.classCount * model.ligandCount;
  if (!first) return 10 + sites;
  const columns = model.sharedKeys.length;
  const mixing = model.correlation === null ? columns : (columns * columns) / 2;
  return 10 + 3 * sites + mixing + 10 * model.quantities.length;
}
