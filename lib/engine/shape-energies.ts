/**
 * Energies and their uncertainty at the points of a series, as stated and with the ligand's stock off by a
 * factor: what the alternatives of `shape.ts` bend.
 */
import { addScaledGradient, concentrationSlope, createSiteState, energyOf, occupySites } from './energy';
import type { DatasetInput, SeriesInput } from './inputs';
import { choleskySemidefinite, timesLower } from './linear-algebra';
import { readPoint } from './point-table';
import type { SeriesModel } from './series-model';

/** m points, one entry (or row) each. */
export interface EnergyRows {
  /** f, kT */
  energy: Float64Array;
  /** ∂f by independent unit variables, kT, m × rank: gradient·gradientᵀ is the covariance of f that the statements give */
  gradient: Float64Array;
  rank: number;
  /** variance of f from dispensing, kT² */
  dispensing: Float64Array;
  /** Σ_l ∂f/∂ln c_l, kT */
  concentrationSlope: Float64Array;
}

/** The points of a series at any factor of concentration. */
export class SeriesEnergies {
  private readonly count: number;
  /** m × ligands and m × modulation entries, row by row */
  private readonly concentrations: Float64Array;
  private readonly displacements: Float64Array;
  private readonly whitening: Float64Array | null;

  constructor(
    dataset: DatasetInput,
    { points }: SeriesInput,
    private readonly model: SeriesModel,
  ) {
    const { ligandCount, correlation } = model;
    const moved = model.slopes.length;
    this.count = points.length;
    this.concentrations = new Float64Array(this.count * ligandCount);
    this.displacements = new Float64Array(this.count * moved);
    points.forEach((point, i) => {
      const concentrations = this.concentrations.subarray(i * ligandCount, (i + 1) * ligandCount);
      readPoint(
        dataset,
        model,
        point,
        concentrations,
        this.displacements.subarray(i * moved, (i + 1) * moved),
      );
    });
    this.whitening =
      correlation === null ? null : choleskySemidefinite(correlation, model.sharedKeys.length).factor;
  }

  /**
   * Whether exactly one ligand acts: bound by a site class, and present at some point. Only then is a factor
   * of all concentrations the error of one stock.
   */
  hasOneLigand(): boolean {
    const { ligandCount, inverseInactive, inverseActive } = this.model;
    const acts = (l: number) =>
      inverseInactive.some((inactive, at) => at % ligandCount === l && inactive + inverseActive[at] > 0) &&
      this.concentrations.some((c, at) => at % ligandCount === l && c > 0);
    return Array.from({ length: ligandCount }, (_, l) => l).filter(acts).length === 1;
  }

  /**
   * @param factor what all concentrations are multiplied by, > 0
   * @param into rows of an earlier call to overwrite
   */
  at(factor: number, into: EnergyRows = this.emptyRows()): EnergyRows {
    const { model, whitening } = this;
    this.fill(into, factor);
    if (whitening !== null)
      into.gradient = timesLower(into.gradient, into.energy.length, whitening, model.sharedKeys.length);
    return into;
  }

  private emptyRows(): EnergyRows {
    const columns = this.model.sharedKeys.length;
    return {
      energy: new Float64Array(this.count),
      gradient: new Float64Array(this.count * columns),
      rank: columns,
      dispensing: new Float64Array(this.count),
      concentrationSlope: new Float64Array(this.count),
    };
  }

  private fill(rows: EnergyRows, factor: number): void {
    const { model, concentrations, displacements } = this;
    const state = createSiteState(model);
    const c = new Float64Array(model.ligandCount);
    const moved = state.displacement.length;
    rows.gradient.fill(0);
    for (let i = 0; i < this.count; i++) {
      for (let l = 0; l < c.length; l++) c[l] = factor * concentrations[i * c.length + l];
      for (let m = 0; m < moved; m++) state.displacement[m] = displacements[i * moved + m];
      occupySites(model, c, 0, state);
      addScaledGradient(model, state, rows.gradient, i * rows.rank);
      rows.energy[i] = energyOf(model, state);
      let [whole, dispensing] = [0, 0];
      for (let l = 0; l < c.length; l++) {
        const slope = concentrationSlope(model, state, l);
        whole += slope;
        dispensing += (slope * model.relativeU[l]) ** 2;
      }
      rows.concentrationSlope[i] = whole;
      rows.dispensing[i] = dispensing;
    }
  }
}

/** Mean over the points of √(gᵀVg), kT: how far the stated uncertainties alone would move them. */
export function meanStatedU({ energy, gradient, rank }: EnergyRows): number {
  let sum = 0;
  for (let i = 0; i < energy.length; i++) {
    let square = 0;
    for (let k = 0; k < rank; k++) square += gradient[i * rank + k] ** 2;
    sum += Math.sqrt(square);
  }
  return sum / energy.length;
}
