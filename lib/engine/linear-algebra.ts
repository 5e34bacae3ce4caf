/**
 * The little dense algebra that the statistics need: Cholesky factors of small symmetric matrices, stored
 * row by row in Float64Array. Source: Golub & Van Loan, Matrix Computations, 4th ed., algorithms 4.2.1
 * and 3.1.1.
 */

/** A pivot below this, beside a largest diagonal of 1, is rounding: the direction carries nothing. */
const PIVOT_FLOOR = 1e-12;

/**
 * Lower Cholesky factor of a symmetric positive semi-definite matrix with a diagonal of order 1. A column
 * whose pivot vanishes is set to 0, so that L·Lᵀ still is the matrix.
 *
 * @param matrix n×n, row by row
 * @returns L, n×n, and whether the matrix was positive semi-definite (within 1e-9)
 */
export function choleskySemidefinite(
  matrix: Float64Array,
  n: number,
): { factor: Float64Array; semidefinite: boolean } {
  const factor = new Float64Array(n * n);
  let semidefinite = true;
  for (let j = 0; j < n; j++) {
    let pivot = matrix[j * n + j];
    for (let k = 0; k < j; k++) pivot -= factor[j * n + k] ** 2;
    if (pivot < -1e-9) semidefinite = false;
    const vanishes = pivot < PIVOT_FLOOR;
    const root = vanishes ? 0 : Math.sqrt(pivot);
    factor[j * n + j] = root;
    for (let i = j + 1; i < n; i++) {
      let rest = matrix[i * n + j];
      for (let k = 0; k < j; k++) rest -= factor[i * n + k] * factor[j * n + k];
      if (vanishes && Math.abs(rest) > 1e-6) semidefinite = false;
      factor[i * n + j] = vanishes ? 0 : rest / root;
    }
  }
  return { factor, semidefinite };
}

/**
 * Overwrites 1 + S, S symmetric positive semi-definite (n×n), with its lower Cholesky factor; the upper part
 * is left. Every pivot of such a matrix is at least 1; where S is so large and its columns so alike that
 * rounding says otherwise, the pivot is taken as 1.
 */
export function choleskyOfUnitPlus(matrix: Float64Array, n: number): void {
  for (let j = 0; j < n; j++) {
    const rowJ = j * n;
    let pivot = matrix[rowJ + j];
    for (let k = 0; k < j; k++) pivot -= matrix[rowJ + k] * matrix[rowJ + k];
    const root = Math.sqrt(Math.max(pivot, 1));
    matrix[rowJ + j] = root;
    for (let i = j + 1; i < n; i++) {
      const rowI = i * n;
      let rest = matrix[rowI + j];
      for (let k = 0; k < j; k++) rest -= matrix[rowI + k] * matrix[rowJ + k];
      matrix[rowI + j] = rest / root;
    }
  }
}

/** Solves L·x = b in place, L lower n×n; `offset` is where b starts in its array. */
export function solveLower(factor: Float64Array, n: number, b: Float64Array, offset = 0): void {
  for (let i = 0; i < n; i++) {
    let rest = b[offset + i];
    for (let k = 0; k < i; k++) rest -= factor[i * n + k] * b[offset + k];
    b[offset + i] = rest / factor[i * n + i];
  }
}

/** Solves Lᵀ·x = b in place, L lower n×n; `offset` is where b starts in its array. */
export function solveLowerTransposed(factor: Float64Array, n: number, b: Float64Array, offset = 0): void {
  for (let i = n - 1; i >= 0; i--) {
    let rest = b[offset + i];
    for (let k = i + 1; k < n; k++) rest -= factor[k * n + i] * b[offset + k];
    b[offset + i] = rest / factor[i * n + i];
  }
}

/** Each row of an m×n matrix times a lower factor: out = rows·L. */
export function timesLower(rows: Float64Array, m: number, factor: Float64Array, n: number): Float64Array {
  const out = new Float64Array(m * n);
  for (let i = 0; i < m; i++) {
    for (let j = 0; j < n; j++) {
      let sum = 0;
      for (let k = j; k < n; k++) sum += rows[i * n + k] * factor[k * n + j];
      out[i * n + j] = sum;
    }
  }
  return out;
}
