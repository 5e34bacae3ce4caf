/**
 * Covariance of the form C = D + W·Wᵀ with D diagonal (m) and W thin (m × k), used without ever forming
 * the m × m matrix.
 *
 *     C⁻¹ = D⁻¹ − D⁻¹W M⁻¹ WᵀD⁻¹,   M = 1 + WᵀD⁻¹W
 *
 * Source: Woodbury, Inverting modified matrices, Princeton Statistical Research Group, Memo 42 (1950).
 */
import { choleskyOfUnitPlus, solveLower, solveLowerTransposed } from './linear-algebra';

/** C = D + W·Wᵀ, factored once and asked often. */
export class LowRankNoise {
  private readonly count: number;
  /** lower Cholesky factor of M, k × k */
  private readonly core: Float64Array;

  /**
   * @param diagonal D, m numbers > 0
   * @param factor W, m × k, row by row
   * @param rank k, may be 0
   */
  constructor(
    private readonly diagonal: Float64Array,
    private readonly factor: Float64Array,
    private readonly rank: number,
  ) {
    this.count = diagonal.length;
    this.core = this.buildCore();
  }

  private buildCore(): Float64Array {
    const { count, rank, factor, diagonal } = this;
    const core = new Float64Array(rank * rank);
    for (let a = 0; a < rank; a++) core[a * rank + a] = 1;
    for (let i = 0; i < count; i++) {
      const row = i * rank;
      for (let a = 0; a < rank; a++) {
        const weighted = factor[row + a] / diagonal[i];
        if (weighted === 0) continue;
        for (let b = 0; b <= a; b++) core[a * rank + b] += weighted * factor[row + b];
      }
    }
    choleskyOfUnitPlus(core, rank);
    return core;
  }

  /**
   * rᵀC⁻¹r, as the smallest Σ(r − Wη)²/D + |η|²: a sum of squares, so that no digits cancel where W is
   * large beside D.
   */
  quadraticForm(residual: Float64Array): number {
    const eta = this.solveCore(residual);
    let sum = 0;
    for (const value of eta) sum += value * value;
    for (let i = 0; i < this.count; i++) sum += this.remainder(residual, eta, i) ** 2 / this.diagonal[i];
    return sum;
  }

  /** C⁻¹v, m numbers. */
  applyInverse(v: Float64Array): Float64Array {
    const eta = this.solveCore(v);
    const out = new Float64Array(this.count);
    for (let i = 0; i < this.count; i++) out[i] = this.remainder(v, eta, i) / this.diagonal[i];
    return out;
  }

  /** The diagonal of C⁻¹, m numbers. */
  inverseDiagonal(): Float64Array {
    const { count, rank, factor, diagonal, core } = this;
    const out = new Float64Array(count);
    const row = new Float64Array(rank);
    for (let i = 0; i < count; i++) {
      for (let k = 0; k < rank; k++) row[k] = factor[i * rank + k] / diagonal[i];
      solveLower(core, rank, row);
      let explained = 0;
      for (const value of row) explained += value * value;
      out[i] = 1 / diagonal[i] - explained;
    }
    return out;
  }

  /** η = M⁻¹WᵀD⁻¹v, k numbers. */
  private solveCore(v: Float64Array): Float64Array {
    const { count, rank, factor, diagonal, core } = this;
    const eta = new Float64Array(rank);
    for (let i = 0; i < count; i++) {
      const weighted = v[i] / diagonal[i];
      for (let k = 0; k < rank; k++) eta[k] += factor[i * rank + k] * weighted;
    }
    solveLower(core, rank, eta);
    solveLowerTransposed(core, rank, eta);
    return eta;
  }

  private remainder(v: Float64Array, eta: Float64Array, i: number): number {
    let value = v[i];
    for (let k = 0; k < this.rank; k++) value -= this.factor[i * this.rank + k] * eta[k];
    return value;
  }
}
