/**
 * Covariance of the form C = D + W·Wᵀ with D diagonal (m) and W thin (m × k), used without ever forming
 * the m × m matrix.
 *
 *     C⁻¹ = D⁻¹ − D⁻¹W M⁻¹ WᵀD⁻¹,   M = 1 + WᵀD⁻¹W,   det C = det D · det M
 *
 * Source: Woodbury, Inverting modified matrices, Princeton Statistical Research Group, Memo 42 (1950).
 */
import { choleskyOfUnitPlus, solveLower, solveLowerTransposed } from './linear-algebra';

/** C = D + W·Wᵀ, factored once and asked often. */
export class LowRankNoise {
  private readonly count: number;
  /** 1/√D, m numbers */
  private readonly weight: Float64Array;
  /** D^(−1/2)·W, column by column: every sum below runs along a column */
  private readonly columns: Float64Array[];
  /** lower Cholesky factor of M, k × k */
  private readonly core: Float64Array;
  /** room for what `split` leaves of each vector of a call */
  private readonly room: Float64Array[] = [];

  /**
   * @param diagonal D, m numbers > 0
   * @param factor W, m × k, row by row
   * @param rank k, may be 0
   */
  constructor(
    diagonal: Float64Array,
    factor: Float64Array,
    private readonly rank: number,
  ) {
    this.count = diagonal.length;
    this.weight = new Float64Array(this.count);
    this.columns = Array.from({ length: rank }, () => new Float64Array(this.count));
    this.core = new Float64Array(rank * rank);
    this.refactor(diagonal, factor);
  }

  /** Takes another D and W of the same sizes; for callers that would make thousands of these. */
  refactor(diagonal: Float64Array, factor: Float64Array): void {
    const { count, rank, weight, columns } = this;
    for (let i = 0; i < count; i++) weight[i] = 1 / Math.sqrt(diagonal[i]);
    for (let k = 0; k < rank; k++) {
      const column = columns[k];
      for (let i = 0; i < count; i++) column[i] = weight[i] * factor[i * rank + k];
    }
    this.buildCore();
  }

  private buildCore(): void {
    const { rank, columns, core } = this;
    for (let a = 0; a < rank; a++) {
      for (let b = 0; b <= a; b++) core[a * rank + b] = dot(columns[a], columns[b]);
      core[a * rank + a] += 1;
    }
    choleskyOfUnitPlus(core, rank);
  }

  /**
   * rᵀC⁻¹r, as the smallest Σ(r − Wη)²/D + |η|²: a sum of squares, so that no digits cancel where W is
   * large beside D.
   */
  quadraticForm(residual: Float64Array): number {
    return this.gram([residual])[0];
  }

  /**
   * aᵀC⁻¹b for every pair of the given vectors, each of m numbers; vectors × vectors, row by row. As sums of
   * squares and products of remainders, for the same reason as `quadraticForm`.
   */
  gram(vectors: readonly Float64Array[]): Float64Array {
    const size = vectors.length;
    const parts = vectors.map((vector, place) => this.split(vector, place));
    const out = new Float64Array(size * size);
    for (let a = 0; a < size; a++) {
      for (let b = 0; b <= a; b++) {
        const sum = dot(parts[a].left, parts[b].left) + dot(parts[a].eta, parts[b].eta);
        out[a * size + b] = sum;
        out[b * size + a] = sum;
      }
    }
    return out;
  }

  /** ln det C. */
  logDeterminant(): number {
    let sum = 0;
    for (let k = 0; k < this.rank; k++) sum += Math.log(this.core[k * this.rank + k]);
    for (const value of this.weight) sum -= Math.log(value);
    return 2 * sum;
  }

  /** C⁻¹v, m numbers. */
  applyInverse(v: Float64Array): Float64Array {
    const { left } = this.split(v, 0);
    return left.map((value, i) => value * this.weight[i]);
  }

  /** The diagonal of C⁻¹, m numbers. */
  inverseDiagonal(): Float64Array {
    const { count, rank, weight, columns, core } = this;
    const out = new Float64Array(count);
    const row = new Float64Array(rank);
    for (let i = 0; i < count; i++) {
      for (let k = 0; k < rank; k++) row[k] = columns[k][i];
      solveLower(core, rank, row);
      out[i] = weight[i] * weight[i] * (1 - dot(row, row));
    }
    return out;
  }

  /** η = M⁻¹WᵀD⁻¹v, k numbers, and what it leaves of v, D^(−1/2)(v − Wη), m numbers in the room at `place`. */
  private split(v: Float64Array, place: number): { eta: Float64Array; left: Float64Array } {
    const { count, rank, weight, columns, core } = this;
    this.room[place] ??= new Float64Array(count);
    const left = this.room[place];
    for (let i = 0; i < count; i++) left[i] = weight[i] * v[i];
    const eta = new Float64Array(rank);
    for (let k = 0; k < rank; k++) eta[k] = dot(columns[k], left);
    solveLower(core, rank, eta);
    solveLowerTransposed(core, rank, eta);
    for (let k = 0; k < rank; k++) {
      const column = columns[k];
      const share = eta[k];
      for (let i = 0; i < count; i++) left[i] -= share * column[i];
    }
    return { eta, left };
  }
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i];
  return sum;
}
