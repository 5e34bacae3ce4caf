/**
 * Q of a whole dataset: as of a series, with every quantity that several series share (labels, stocks, the
 * dataset's temperature) counted once. The covariance is block diagonal plus low rank and is solved by the
 * Woodbury identity twice, within the series and across them; nothing of the size points × points exists.
 */
import type { QStatistic } from './assessment';
import { choleskyOfUnitPlus, choleskySemidefinite, solveLower, solveLowerTransposed } from './linear-algebra';
import { LowRankNoise } from './low-rank-noise';
import {
  degreesOfFreedomOf,
  pValueOf,
  replicateSoftness,
  rootMeanSquare,
  type ScoredSeries,
} from './q-statistic';
import { independentVariance, splitGradient } from './series-noise';
import { indexSharedQuantities, type SharedQuantities } from './shared-quantities';

/** One series as a part of the whole. */
interface Block {
  series: ScoredSeries;
  noise: LowRankNoise;
  /** derivative by independent unit variables of what is shared, m × indices.length */
  shared: Float64Array;
  /** C_s⁻¹·shared, m × indices.length */
  solved: Float64Array;
  /** which of the dataset's shared variables the columns are */
  indices: number[];
}

/**
 * Q of a dataset.
 *
 * @param all its series, each with its model and table
 * @returns Q, degrees of freedom, upper tail (null where none exists) and the RMS of all z
 */
export function datasetQ(all: readonly ScoredSeries[]): QStatistic {
  const quantities = indexSharedQuantities(all.map(({ model, fittedHere }) => (fittedHere ? null : model)));
  const mixing = sharedFactor(quantities);
  const blocks = all.map((series, i) =>
    buildBlock(series, quantities.indexOfColumn[i], mixing, quantities.count),
  );
  const core = couplingCore(blocks, quantities.count);
  const degreesOfFreedom = all.reduce((sum, series) => sum + degreesOfFreedomOf(series), 0);
  const points = all.reduce((sum, { table }) => sum + table.count, 0);
  const chiSquared = solveForQ(blocks, core, quantities.count);
  let softness = 0;
  for (const block of blocks) {
    if (block.series.table.degreesOfFreedom === 0) continue;
    const inverse = inverseDiagonal(block, core, quantities.count);
    softness += replicateSoftness(block.series.table, inverse, points);
  }
  return {
    chiSquared,
    degreesOfFreedom,
    pValue: pValueOf(chiSquared, degreesOfFreedom, softness, all),
    rmsZ: rootMeanSquare(all.map(({ table }) => table)),
  };
}

/** Lower factor of the correlation among shared quantities, null where they are uncorrelated. */
function sharedFactor(quantities: SharedQuantities): Float64Array | null {
  if (quantities.correlation === null) return null;
  return choleskySemidefinite(quantities.correlation, quantities.count).factor;
}

function buildBlock(
  series: ScoredSeries,
  indexOfColumn: readonly (number | null)[],
  mixing: Float64Array | null,
  sharedCount: number,
): Block {
  const diagonal = independentVariance(series.table);
  if (series.fittedHere) {
    const noise = new LowRankNoise(diagonal, new Float64Array(0), 0);
    return { series, noise, shared: new Float64Array(0), solved: new Float64Array(0), indices: [] };
  }
  const split = splitGradient(
    series.model,
    series.table,
    indexOfColumn.map((index) => index !== null),
  );
  const noise = new LowRankNoise(diagonal, split.own, split.ownRank);
  const ofQuantity = split.shared.map((column) => indexOfColumn[column] ?? 0);
  const { shared, indices } = mix(split.sharedGradient, series.table.count, ofQuantity, mixing, sharedCount);
  return {
    series,
    noise,
    shared,
    solved: solveColumns(noise, shared, series.table.count, indices.length),
    indices,
  };
}

/** Rewrites a gradient by shared quantities as one by the independent variables behind them. */
function mix(
  gradient: Float64Array,
  count: number,
  ofQuantity: number[],
  mixing: Float64Array | null,
  sharedCount: number,
): { shared: Float64Array; indices: number[] } {
  if (mixing === null) return { shared: gradient, indices: ofQuantity };
  const touches = (variable: number) =>
    ofQuantity.some((quantity) => mixing[quantity * sharedCount + variable] !== 0);
  const indices = Array.from({ length: sharedCount }, (_, variable) => variable).filter(touches);
  const shared = new Float64Array(count * indices.length);
  for (let i = 0; i < count; i++) {
    ofQuantity.forEach((quantity, j) => {
      const slope = gradient[i * ofQuantity.length + j];
      indices.forEach((variable, k) => {
        shared[i * indices.length + k] += slope * mixing[quantity * sharedCount + variable];
      });
    });
  }
  return { shared, indices };
}

function solveColumns(
  noise: LowRankNoise,
  columns: Float64Array,
  count: number,
  width: number,
): Float64Array {
  const out = new Float64Array(count * width);
  const column = new Float64Array(count);
  for (let k = 0; k < width; k++) {
    for (let i = 0; i < count; i++) column[i] = columns[i * width + k];
    const solved = noise.applyInverse(column);
    for (let i = 0; i < count; i++) out[i * width + k] = solved[i];
  }
  return out;
}

/** Cholesky factor of 1 + Σ_s S_sᵀC_s⁻¹S_s, count × count. */
function couplingCore(blocks: readonly Block[], count: number): Float64Array {
  const core = new Float64Array(count * count);
  for (let k = 0; k < count; k++) core[k * count + k] = 1;
  for (const { series, shared, solved, indices } of blocks) {
    const width = indices.length;
    for (let i = 0; i < series.table.count; i++) {
      for (let a = 0; a < width; a++) {
        for (let b = 0; b < width; b++) {
          core[indices[a] * count + indices[b]] += shared[i * width + a] * solved[i * width + b];
        }
      }
    }
  }
  choleskyOfUnitPlus(core, count);
  return core;
}

/** Q as the sum of squares that is left when the shared variables take their best values η. */
function solveForQ(blocks: readonly Block[], core: Float64Array, count: number): number {
  const eta = new Float64Array(count);
  for (const { series, solved, indices } of blocks) {
    for (let i = 0; i < series.table.count; i++) {
      indices.forEach((index, a) => {
        eta[index] += solved[i * indices.length + a] * series.table.residual[i];
      });
    }
  }
  solveLower(core, count, eta);
  solveLowerTransposed(core, count, eta);
  let sum = 0;
  for (const value of eta) sum += value * value;
  for (const block of blocks) sum += block.noise.quadraticForm(residualLessShared(block, eta));
  return sum;
}

function residualLessShared({ series, shared, indices }: Block, eta: Float64Array): Float64Array {
  return series.table.residual.map((residual, i) => {
    let value = residual;
    for (let a = 0; a < indices.length; a++) value -= shared[i * indices.length + a] * eta[indices[a]];
    return value;
  });
}

/** The block's part of the diagonal of C⁻¹. */
function inverseDiagonal({ noise, solved, indices }: Block, core: Float64Array, count: number): Float64Array {
  const row = new Float64Array(count);
  return noise.inverseDiagonal().map((value, i) => {
    row.fill(0);
    for (let a = 0; a < indices.length; a++) row[indices[a]] = solved[i * indices.length + a];
    solveLower(core, count, row);
    let explained = 0;
    for (const part of row) explained += part * part;
    return value - explained;
  });
}
