/**
 * A curve bent in one or two of five ways, and what the bend makes of the residuals and their covariance.
 *
 *     expected = B + (A − B)·p(s·f + δ),   f at α times the stated concentrations
 *
 *     ∂(expected)/∂f = (A − B)·s·p(1 − p)
 *
 * so that the gradient of a point by the parameters, and its dispensing error, are those of f times one
 * number. As stated: δ = 0, s = 1, A = 1, B = 0, α = 1.
 */
import type { ShapeEstimateName } from './assessment';
import type { Trial } from './generalised-least-squares';
import { LowRankNoise } from './low-rank-noise';
import type { EnergyRows } from './shape-energies';

/** δ (kT), s, A, B and α. */
export type Bend = Readonly<Record<ShapeEstimateName, number>>;

export const AS_STATED: Bend = { offset: 0, slope: 1, ceiling: 1, floor: 0, stock: 1 };

/**
 * The measured points of a series, and what any bend of its curve makes of them. Every call of `bend` writes
 * into the same arrays: a trial holds until the next one, its noise until the next noise.
 */
export class BentCurve {
  private readonly residual: Float64Array;
  /** p(s·f + δ), 1 − p and p(1 − p) */
  private readonly risen: Float64Array;
  private readonly missing: Float64Array;
  private readonly steepness: Float64Array;
  private readonly derivatives: Float64Array[] = [];
  private readonly diagonal: Float64Array;
  /** by rank: that of the stated energies, and that at another stock */
  private readonly noises: { factor: Float64Array; covariance: LowRankNoise | null }[] = [];

  /**
   * @param activity measured, m numbers
   * @param variance u_a² + u_0², m numbers
   */
  constructor(
    private readonly activity: Float64Array,
    private readonly variance: Float64Array,
  ) {
    const count = activity.length;
    this.residual = new Float64Array(count);
    this.risen = new Float64Array(count);
    this.missing = new Float64Array(count);
    this.steepness = new Float64Array(count);
    this.diagonal = new Float64Array(count);
  }

  /**
   * Residuals, derivatives and covariance with a bend.
   *
   * @param rows energies at `bend.stock` times the stated concentrations
   * @param free what to differentiate by; `stock` by its logarithm
   */
  bend(rows: EnergyRows, bend: Bend, free: readonly ShapeEstimateName[]): Trial {
    this.climb(rows, bend);
    const { activity, residual, risen } = this;
    const height = bend.ceiling - bend.floor;
    for (let i = 0; i < activity.length; i++) residual[i] = activity[i] - bend.floor - height * risen[i];
    const jacobian = free.map((name, j) => this.differentiate(name, rows, bend, j));
    return { residual, jacobian, noise: () => this.noise(rows, bend) };
  }

  /** p, 1 − p and p(1 − p), none of them a difference: of an exponential that is at most 1. */
  private climb({ energy }: EnergyRows, bend: Bend): void {
    const { risen, missing, steepness } = this;
    for (let i = 0; i < energy.length; i++) {
      const bent = bend.slope * energy[i] + bend.offset;
      const e = Math.exp(-Math.abs(bent));
      const large = 1 / (1 + e);
      const small = e * large;
      risen[i] = bent >= 0 ? large : small;
      missing[i] = bent >= 0 ? small : large;
      steepness[i] = large * small;
    }
  }

  private differentiate(name: ShapeEstimateName, rows: EnergyRows, bend: Bend, place: number): Float64Array {
    const { risen, missing, steepness } = this;
    if (name === 'ceiling') return risen;
    if (name === 'floor') return missing;
    this.derivatives[place] ??= new Float64Array(risen.length);
    const out = this.derivatives[place];
    const height = bend.ceiling - bend.floor;
    for (let i = 0; i < out.length; i++) out[i] = height * steepness[i];
    if (name === 'slope') for (let i = 0; i < out.length; i++) out[i] *= rows.energy[i];
    if (name === 'stock')
      for (let i = 0; i < out.length; i++) out[i] *= bend.slope * rows.concentrationSlope[i];
    return out;
  }

  /** C = diag(u_a² + u_0² + dispensing) + J V Jᵀ. */
  private noise({ gradient, rank, dispensing }: EnergyRows, bend: Bend): LowRankNoise {
    const { steepness, diagonal, variance } = this;
    this.noises[rank] ??= { factor: new Float64Array(gradient.length), covariance: null };
    const noise = this.noises[rank];
    const { factor } = noise;
    const height = bend.slope * (bend.ceiling - bend.floor);
    for (let i = 0; i < diagonal.length; i++) {
      const lever = height * steepness[i];
      diagonal[i] = variance[i] + lever * lever * dispensing[i];
      for (let k = 0; k < rank; k++) factor[i * rank + k] = lever * gradient[i * rank + k];
    }
    if (noise.covariance === null) noise.covariance = new LowRankNoise(diagonal, factor, rank);
    else noise.covariance.refactor(diagonal, factor);
    return noise.covariance;
  }
}
