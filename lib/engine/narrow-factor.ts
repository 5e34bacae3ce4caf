/**
 * The thinnest W′ with W′·W′ᵀ = W·Wᵀ. Uncertain quantities often move the curve in the same way (a gap and
 * the temperature, a stock and its constants), so that a gradient has fewer independent directions than
 * columns; whoever factors D + W·Wᵀ many times gains by leaving the rest out.
 *
 * Householder reflections from the right, the longest remaining row first, as in a QR factorisation of Wᵀ
 * with column pivoting. Source: Golub & Van Loan, Matrix Computations, 4th ed., 5.4.2.
 */

/** Rows shorter than this, beside the longest, are rounding. */
const ROUNDING = 1e-13;

export interface NarrowOptions {
  /** rows that are shorter than this may be left out as well, in the unit of W */
  negligible?: number;
  /** how many columns W′ may have at most */
  mostColumns?: number;
}

/**
 * @param rows W, m × columns, row by row; it is read and never changed
 * @returns W′, m × rank, row by row; null where more than `mostColumns` are needed
 */
export function narrowFactor(
  rows: Float64Array,
  m: number,
  columns: number,
  { negligible = 0, mostColumns = columns }: NarrowOptions = {},
): { factor: Float64Array; rank: number } | null {
  const work = rows.slice();
  const reflection = new Float64Array(columns);
  const most = Math.min(m, columns);
  let rank = 0;
  let shortest = negligible;
  while (rank < most) {
    const pivot = longestRow(work, m, columns, rank);
    if (rank === 0) shortest = Math.max(negligible, ROUNDING * pivot.length);
    if (pivot.length <= shortest) break;
    if (rank === mostColumns) return null;
    reflectRows(work, m, columns, rank, pivot, reflection);
    rank++;
  }
  return { factor: leadingColumns(work, m, columns, rank), rank };
}

interface Row {
  index: number;
  length: number;
}

/** The row that is longest from column `from` on. */
function longestRow(work: Float64Array, m: number, columns: number, from: number): Row {
  let index = 0;
  let longest = -1;
  for (let i = 0; i < m; i++) {
    let square = 0;
    for (let k = from; k < columns; k++) square += work[i * columns + k] * work[i * columns + k];
    if (square <= longest) continue;
    index = i;
    longest = square;
  }
  return { index, length: Math.sqrt(longest) };
}

/** Turns all rows, from column `from` on, so that the pivot row lies along that column. */
function reflectRows(
  work: Float64Array,
  m: number,
  columns: number,
  from: number,
  pivot: Row,
  reflection: Float64Array,
): void {
  const start = pivot.index * columns;
  const lead = work[start + from];
  // The sign that adds to the leading entry, so that nothing cancels.
  const shifted = lead + (lead < 0 ? -pivot.length : pivot.length);
  for (let k = from + 1; k < columns; k++) reflection[k] = work[start + k] / shifted;
  reflection[from] = 1;
  const scale = Math.abs(shifted) / pivot.length;
  for (let i = 0; i < m; i++) {
    const row = i * columns;
    let along = 0;
    for (let k = from; k < columns; k++) along += reflection[k] * work[row + k];
    along *= scale;
    for (let k = from; k < columns; k++) work[row + k] -= along * reflection[k];
  }
}

function leadingColumns(work: Float64Array, m: number, columns: number, rank: number): Float64Array {
  const factor = new Float64Array(m * rank);
  for (let i = 0; i < m; i++) {
    for (let k = 0; k < rank; k++) factor[i * rank + k] = work[i * columns + k];
  }
  return factor;
}
