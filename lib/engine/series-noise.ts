/**
 * The covariance of a series' residuals, C = D + J R Jᵀ, in the two forms that the Q statistics need: the
 * series by itself, and the series as a part of its dataset, where quantities that several series share
 * are kept apart.
 */
import { choleskySemidefinite, timesLower } from './linear-algebra';
import type { PointTable } from './point-table';
import type { SeriesModel } from './series-model';

/** D: u_a² + u_0² and what dispensing adds, m numbers. */
export function independentVariance(table: PointTable): Float64Array {
  const diagonal = new Float64Array(table.count);
  for (let i = 0; i < table.count; i++) {
    diagonal[i] = table.activityU[i] ** 2 + table.modelFloor ** 2 + table.dispensingVariance[i];
  }
  return diagonal;
}

/** J·L with R = L·Lᵀ: the gradient of the expected activities in independent unit variables, m × columns. */
export function whitenedGradient(model: SeriesModel, table: PointTable): Float64Array {
  if (model.correlation === null) return table.expectedGradient;
  const columns = model.sharedKeys.length;
  const { factor } = choleskySemidefinite(model.correlation, columns);
  return timesLower(table.expectedGradient, table.count, factor, columns);
}

/** A series' gradient split between what is its own and what it shares with others of the dataset. */
export interface SplitGradient {
  /** own part in independent unit variables, m × ownRank */
  own: Float64Array;
  ownRank: number;
  /** derivative by each shared quantity, m × shared.length, own quantities correlated with it moving along */
  sharedGradient: Float64Array;
  /** which of the series' columns are shared, in the order of `sharedGradient` */
  shared: number[];
}

/**
 * Splits the gradient of a series. Own quantities that are correlated with shared ones are written as
 * own = A·shared + rest with A = R_os R_ss⁻¹, the rest being independent of all that is shared; so the
 * correlations of the series hold, and series are linked only through what they share.
 *
 * @param isShared by column
 */
export function splitGradient(
  model: SeriesModel,
  table: PointTable,
  isShared: readonly boolean[],
): SplitGradient {
  const columns = model.sharedKeys.length;
  const shared = [...isShared.keys()].filter((k) => isShared[k]);
  const own = [...isShared.keys()].filter((k) => !isShared[k]);
  const gradient = table.expectedGradient;
  const sharedGradient = pickColumns(gradient, table.count, columns, shared);
  const ownGradient = pickColumns(gradient, table.count, columns, own);
  if (model.correlation === null) {
    return { own: ownGradient, ownRank: own.length, sharedGradient, shared };
  }
  const order = [...shared, ...own];
  const { factor } = choleskySemidefinite(reorder(model.correlation, columns, order), columns);
  const drag = dragMatrix(factor, columns, shared.length);
  addProduct(sharedGradient, ownGradient, drag, table.count, own.length, shared.length);
  const rest = lowerRightBlock(factor, columns, shared.length);
  return {
    own: timesLower(ownGradient, table.count, rest, own.length),
    ownRank: own.length,
    sharedGradient,
    shared,
  };
}

function pickColumns(
  matrix: Float64Array,
  rows: number,
  columns: number,
  picked: readonly number[],
): Float64Array {
  const out = new Float64Array(rows * picked.length);
  for (let i = 0; i < rows; i++) {
    for (let k = 0; k < picked.length; k++) out[i * picked.length + k] = matrix[i * columns + picked[k]];
  }
  return out;
}

function reorder(matrix: Float64Array, n: number, order: readonly number[]): Float64Array {
  const out = new Float64Array(n * n);
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) out[i * n + j] = matrix[order[i] * n + order[j]];
  }
  return out;
}

/** A with A·L_ss = L_os, for the factor of a matrix whose first `split` rows are the shared ones; own × shared. */
function dragMatrix(factor: Float64Array, n: number, split: number): Float64Array {
  const drag = new Float64Array((n - split) * split);
  for (let i = split; i < n; i++) {
    const row = (i - split) * split;
    for (let j = split - 1; j >= 0; j--) {
      const pivot = factor[j * n + j];
      // A vanishing pivot: this shared quantity is a combination of earlier ones and adds nothing.
      if (pivot === 0) continue;
      let rest = factor[i * n + j];
      for (let k = j + 1; k < split; k++) rest -= drag[row + k] * factor[k * n + j];
      drag[row + j] = rest / pivot;
    }
  }
  return drag;
}

function lowerRightBlock(factor: Float64Array, n: number, split: number): Float64Array {
  const size = n - split;
  const block = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    for (let j = 0; j <= i; j++) block[i * size + j] = factor[(i + split) * n + j + split];
  }
  return block;
}

/** target (rows × columns) += left (rows × inner) · right (inner × columns). */
function addProduct(
  target: Float64Array,
  left: Float64Array,
  right: Float64Array,
  rows: number,
  inner: number,
  columns: number,
): void {
  for (let i = 0; i < rows; i++) {
    for (let k = 0; k < inner; k++) {
      const value = left[i * inner + k];
      for (let j = 0; j < columns; j++) target[i * columns + j] += value * right[k * columns + j];
    }
  }
}
