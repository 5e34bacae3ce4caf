/**
 * The free-energy coordinate of a point and its derivatives.
 *
 *     f = g0 + Σ_s n_s (g_s − ln B_s) + Σ_m b_m (x_m − x_m,ref)
 *     B_s = (1 + Σ_l c_l/K_I,s,l) / (1 + Σ_l c_l/K_A,s,l)
 *
 * f in kT; positive favours the active state. c_l ≥ 0 in the ligand's own unit.
 *
 * Source: Monod, Wyman & Changeux, J. Mol. Biol. 12, 88 (1965); the product over site classes is the
 * general form of a mixed cluster, competition within a class the usual binding polynomial.
 */
import type { SeriesModel } from './series-model';
import type { UncertainQuantity } from './uncertain-quantities';

/** What one set of concentrations and modulator values makes of the sites; reused from point to point. */
export interface SiteState {
  /** ln B_s by class */
  logRatio: Float64Array;
  /** fraction of class s that ligand l would occupy in each state, class × ligand */
  occupancyInactive: Float64Array;
  occupancyActive: Float64Array;
  /** x_m − x_m,ref by modulation entry */
  displacement: Float64Array;
}

/** An empty state of the size that a model needs; everything in it is 0. */
export function createSiteState(model: SeriesModel): SiteState {
  return {
    logRatio: new Float64Array(model.classCount),
    occupancyInactive: new Float64Array(model.classCount * model.ligandCount),
    occupancyActive: new Float64Array(model.classCount * model.ligandCount),
    displacement: new Float64Array(model.slopes.length),
  };
}

/**
 * Fills `state` for concentrations `c` (by ligand, starting at `offset`). Leaves `displacement` as it is.
 * ln B is taken from the difference of the two sums, so that nearly equal constants keep their digits.
 */
export function occupySites(model: SeriesModel, c: Float64Array, offset: number, state: SiteState): void {
  const { classCount, ligandCount, inverseInactive, inverseActive } = model;
  for (let s = 0; s < classCount; s++) {
    const row = s * ligandCount;
    let inactive = 0;
    let active = 0;
    for (let l = 0; l < ligandCount; l++) {
      inactive += c[offset + l] * inverseInactive[row + l];
      active += c[offset + l] * inverseActive[row + l];
    }
    state.logRatio[s] = logOfRatio(inactive, active);
    for (let l = 0; l < ligandCount; l++) {
      state.occupancyInactive[row + l] = (c[offset + l] * inverseInactive[row + l]) / (1 + inactive);
      state.occupancyActive[row + l] = (c[offset + l] * inverseActive[row + l]) / (1 + active);
    }
  }
}

/** ln((1 + a)/(1 + b)) for a, b ≥ 0, without cancellation. */
function logOfRatio(a: number, b: number): number {
  return a >= b ? Math.log1p((a - b) / (1 + b)) : -Math.log1p((b - a) / (1 + a));
}

/** f of a filled state, kT. */
export function energyOf(model: SeriesModel, state: SiteState): number {
  let energy = model.gapKT;
  for (let s = 0; s < model.classCount; s++) energy -= model.sites[s] * state.logRatio[s];
  for (let m = 0; m < model.slopes.length; m++) energy += model.slopes[m] * state.displacement[m];
  return energy;
}

/** ∂f/∂ln c_l of a filled state, kT. */
export function concentrationSlope(model: SeriesModel, state: SiteState, ligand: number): number {
  let slope = 0;
  for (let s = 0; s < model.classCount; s++) {
    const at = s * model.ligandCount + ligand;
    slope -= model.sites[s] * (state.occupancyInactive[at] - state.occupancyActive[at]);
  }
  return slope;
}

/**
 * Adds to `out` (starting at `offset`, one number a column) the scaled gradient ∂f/∂θ·u_θ of a filled
 * state. `out` must be 0 there before.
 */
export function addScaledGradient(
  model: SeriesModel,
  state: SiteState,
  out: Float64Array,
  offset: number,
  quantities: readonly UncertainQuantity[] = model.quantities,
): void {
  for (const quantity of quantities) {
    out[offset + quantity.column] += quantity.scale * derivative(model, state, quantity);
  }
}

/** ∂f/∂θ for θ = g0, g_s, n_s, ln K_I, ln K_A, b_m, T or ln(stock factor). */
function derivative(model: SeriesModel, state: SiteState, quantity: UncertainQuantity): number {
  const { kind, place, ligand } = quantity;
  switch (kind) {
    case 'gap':
      return 1;
    case 'gapPerSite':
      return model.sites[place];
    case 'sites':
      return model.gapPerSite[place] - state.logRatio[place];
    case 'inactive':
      return model.sites[place] * state.occupancyInactive[place * model.ligandCount + ligand];
    case 'active':
      return -model.sites[place] * state.occupancyActive[place * model.ligandCount + ligand];
    case 'slope':
      return state.displacement[place];
    case 'temperature':
      return -thermalEnergy(model, state) / model.temperatureKelvin;
    case 'stock':
      return concentrationSlope(model, state, ligand);
  }
}

/** The part of f that was stated in kJ/mol, kcal/mol or meV and so depends on the temperature, kT. */
function thermalEnergy(model: SeriesModel, state: SiteState): number {
  let energy = model.thermalGapKT;
  for (let m = 0; m < model.thermalSlopes.length; m++)
    energy += model.thermalSlopes[m] * state.displacement[m];
  return energy;
}
