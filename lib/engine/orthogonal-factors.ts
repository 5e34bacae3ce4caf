/**
 * Orthogonal factorisations for least squares, so that no normal matrix is formed and no digits are squared
 * away: Householder triangularisation of a tall matrix, and the singular values of the small triangle by
 * one-sided Jacobi rotations, which keep small singular values accurate. Matrices stand row by row.
 *
 * Source: Golub & Van Loan, Matrix Computations, 4th ed., algorithms 5.2.1 (Householder) and 8.6.3 (one-sided
 * Jacobi); Demmel & Veselić, SIAM J. Matrix Anal. Appl. 13, 1204 (1992). Block by block: Demmel, Grigori,
 * Hoemmen & Langou, SIAM J. Sci. Comput. 34, A206 (2012).
 */

const MOST_SWEEPS = 60;

/** Rows that are triangularised at once: well above the number of variables, so that each block shrinks. */
const BLOCK_ROWS = 256;

export interface Triangle {
  /** upper triangular factor R, n×n */
  factor: Float64Array;
  /** first n elements of Qᵀ·b */
  rotated: Float64Array;
}

/**
 * R and the first n elements of Qᵀb of an m×n matrix A = QR. Neither argument is changed. Where m < n, the
 * missing rows are 0.
 *
 * Many rows are triangularised block by block, each block in the columns that it has (the points of a series depend
 * on few of the variables of a dataset), and then the triangles together.
 */
export function triangularise(matrix: Float64Array, b: Float64Array, m: number, n: number): Triangle {
  if (m <= 2 * BLOCK_ROWS || n === 0 || 2 * n > BLOCK_ROWS) return triangulariseWhole(matrix, b, m, n);
  const rows: number[] = [];
  const right: number[] = [];
  for (let first = 0; first < m; first += BLOCK_ROWS) {
    const count = Math.min(BLOCK_ROWS, m - first);
    const block = matrix.subarray(first * n, (first + count) * n);
    const used = usedColumns(block, count, n);
    const { factor, rotated } = triangulariseWhole(
      pickColumns(block, count, n, used),
      b.subarray(first, first + count),
      count,
      used.length,
    );
    for (let i = 0; i < used.length; i++) {
      const row = new Array<number>(n).fill(0);
      for (let k = i; k < used.length; k++) row[used[k]] = factor[i * used.length + k];
      for (const value of row) rows.push(value);
      right.push(rotated[i]);
    }
  }
  return triangularise(Float64Array.from(rows), Float64Array.from(right), right.length, n);
}

/** Which columns of a block are not 0 throughout. */
function usedColumns(block: Float64Array, count: number, n: number): number[] {
  const used: number[] = [];
  for (let j = 0; j < n; j++) {
    for (let i = 0; i < count; i++) {
      if (block[i * n + j] === 0) continue;
      used.push(j);
      break;
    }
  }
  return used;
}

function pickColumns(block: Float64Array, count: number, n: number, used: readonly number[]): Float64Array {
  if (used.length === n) return block;
  const picked = new Float64Array(count * used.length);
  for (let i = 0; i < count; i++) {
    for (let k = 0; k < used.length; k++) picked[i * used.length + k] = block[i * n + used[k]];
  }
  return picked;
}

function triangulariseWhole(matrix: Float64Array, b: Float64Array, m: number, n: number): Triangle {
  const work = columnsOf(matrix, m, n);
  const rotated = Float64Array.from(b);
  for (let j = 0; j < Math.min(m, n); j++) {
    const mirror = makeMirror(work[j], j);
    if (mirror === null) continue;
    for (let k = j + 1; k < n; k++) reflect(work[j], mirror.scale, j, work[k]);
    reflect(work[j], mirror.scale, j, rotated);
    work[j][j] = mirror.diagonal;
  }
  const factor = new Float64Array(n * n);
  const top = new Float64Array(n);
  for (let i = 0; i < Math.min(m, n); i++) {
    for (let j = i; j < n; j++) factor[i * n + j] = work[j][i];
    top[i] = rotated[i];
  }
  return { factor, rotated: top };
}

function columnsOf(matrix: Float64Array, m: number, n: number): Float64Array[] {
  const columns = Array.from({ length: n }, () => new Float64Array(m));
  for (let i = 0; i < m; i++) {
    for (let j = 0; j < n; j++) columns[j][i] = matrix[i * n + j];
  }
  return columns;
}

/** A reflection 1 − scale·v·vᵀ whose v stands in a column, its first element 1, and what it leaves of that column. */
interface Mirror {
  scale: number;
  diagonal: number;
}

/** Turns the part of a column from `from` on into the vector of its reflection; null where there is nothing to reflect. */
function makeMirror(column: Float64Array, from: number): Mirror | null {
  const norm = normOf(column, from);
  if (norm === 0) return null;
  const diagonal = column[from] > 0 ? -norm : norm;
  const first = column[from] - diagonal;
  for (let i = from + 1; i < column.length; i++) column[i] /= first;
  column[from] = 1;
  return { scale: Math.abs(first) / norm, diagonal };
}

function reflect(mirror: Float64Array, scale: number, from: number, column: Float64Array): void {
  let product = 0;
  for (let i = from; i < column.length; i++) product += mirror[i] * column[i];
  product *= scale;
  for (let i = from; i < column.length; i++) column[i] -= product * mirror[i];
}

/** Euclidean norm from `from` on; scaled, so that nothing overflows or vanishes on the way. */
export function normOf(column: Float64Array, from = 0): number {
  let largest = 0;
  for (let i = from; i < column.length; i++) largest = Math.max(largest, Math.abs(column[i]));
  if (largest === 0 || !Number.isFinite(largest)) return largest;
  let sum = 0;
  for (let i = from; i < column.length; i++) sum += (column[i] / largest) ** 2;
  return largest * Math.sqrt(sum);
}

export interface SingularFactors {
  /** singular values s, not sorted, ≥ 0 */
  values: Float64Array;
  /** columns u_k·s_k of A·V, n arrays of n */
  scaledLeft: Float64Array[];
  /** right singular vectors v_k, n arrays of n */
  right: Float64Array[];
}

/** Singular values and vectors of an n×n matrix: A = Σ_k s_k u_k v_kᵀ. */
export function singularFactors(matrix: Float64Array, n: number): SingularFactors {
  const scaledLeft = columnsOf(matrix, n, n);
  const right = scaledLeft.map((_, k) => Float64Array.from({ length: n }, (_, i) => (i === k ? 1 : 0)));
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    let rotations = 0;
    for (let p = 0; p < n - 1; p++) {
      for (let q = p + 1; q < n; q++) {
        const turn = turnOf(scaledLeft[p], scaledLeft[q]);
        if (turn === null) continue;
        rotate(scaledLeft[p], scaledLeft[q], turn);
        rotate(right[p], right[q], turn);
        rotations++;
      }
    }
    if (rotations === 0) break;
  }
  return { values: Float64Array.from(scaledLeft, (column) => normOf(column)), scaledLeft, right };
}

interface Turn {
  cosine: number;
  sine: number;
}

/** The rotation that makes two columns orthogonal; null where they are. */
function turnOf(a: Float64Array, b: Float64Array): Turn | null {
  const [aNorm, bNorm] = [normOf(a), normOf(b)];
  if (aNorm === 0 || bNorm === 0) return null;
  let cosineBetween = 0;
  for (let i = 0; i < a.length; i++) cosineBetween += (a[i] / aNorm) * (b[i] / bNorm);
  if (Math.abs(cosineBetween) <= Number.EPSILON * a.length) return null;
  const zeta = (bNorm / aNorm - aNorm / bNorm) / (2 * cosineBetween);
  const tangent = Math.sign(zeta || 1) / (Math.abs(zeta) + Math.hypot(1, zeta));
  const cosine = 1 / Math.hypot(1, tangent);
  return { cosine, sine: cosine * tangent };
}

function rotate(a: Float64Array, b: Float64Array, { cosine, sine }: Turn): void {
  for (let i = 0; i < a.length; i++) {
    const [x, y] = [a[i], b[i]];
    a[i] = cosine * x - sine * y;
    b[i] = sine * x + cosine * y;
  }
}
