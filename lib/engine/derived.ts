/**
 * What a series looks like in numbers, for each ligand alone: leakiness p(0), saturation p(∞), dynamic
 * range |p(∞) − p(0)|, half-activity concentration (p = 1/2), EC50 (halfway between leakiness and
 * saturation) and the effective Hill coefficient there,
 *
 *     h = 4 p(1 − p) |∂f/∂ln c| / |p(∞) − p(0)|,
 *
 * each with its propagated standard uncertainty (implicit differentiation of f(c*) = f*; JCGM 100, 5.2).
 * A quantity that does not exist is null, and a note says why.
 */
import type { DerivedQuantities, Estimate, Note } from './assessment';
import { addScaledGradient, concentrationSlope, type SiteState } from './energy';
import type { DatasetInput } from './inputs';
import { LigandResponse } from './ligand-response';
import { logistic, logisticSlope } from './logistic';
import { quadraticForm } from './point-table';
import type { SeriesModel } from './series-model';
import type { UncertainQuantity } from './uncertain-quantities';

/** An end of the response: its energy, its activity, and the scaled gradient of its activity. */
interface End {
  p: number;
  /** 1 − p, not by subtraction */
  rest: number;
  gradient: Float64Array;
}

/** Derived quantities of every ligand that the series binds, and notes on those that do not exist. */
export function deriveQuantities(
  dataset: DatasetInput,
  model: SeriesModel,
): { derived: DerivedQuantities[]; notes: Note[] } {
  const derived: DerivedQuantities[] = [];
  const notes: Note[] = [];
  // The stock is a matter of the assay, not of the protein.
  const quantities = model.quantities.filter((quantity) => quantity.kind !== 'stock');
  dataset.ligands.forEach((ligand, index) => {
    const response = new LigandResponse(model, index);
    const direction = response.direction();
    const saturation = response.energyAtSaturation();
    const name = ligand.name ?? ligand.id;
    if (direction === 0) {
      if (response.binds())
        notes.push(missing(`${name} binds both states alike: the activity does not change with it.`));
      return;
    }
    if (saturation === null) {
      notes.push(
        missing(
          `At saturation ${name} drives one site class fully one way and another fully the other, so no limit exists.`,
        ),
      );
      return;
    }
    const found = deriveOne(response, saturation, direction, quantities);
    derived.push({ ligand: ligand.id, unit: ligand.unit, ...found });
    const reason = whyMissing(name, direction, found);
    if (reason) notes.push(missing(reason));
  });
  return { derived, notes };
}

function missing(detail: string): Note {
  return { code: 'derived-not-defined', detail };
}

function whyMissing(
  name: string,
  direction: -1 | 1 | null,
  found: Omit<DerivedQuantities, 'ligand' | 'unit'>,
): string | null {
  if (direction === null) {
    return `The energy is not monotonic in the concentration of ${name}: half-activity, EC50 and Hill coefficient are not single numbers.`;
  }
  if (found.ec50 === null)
    return `With ${name} the activity does not change by an amount that a computer can hold: no EC50 or Hill coefficient.`;
  if (found.halfActivity === null) {
    const side = found.leakiness.value > 0.5 ? 'above' : 'below';
    return `With ${name} the expected activity stays ${side} one half at every concentration: no half-activity concentration.`;
  }
  return null;
}

function deriveOne(
  response: LigandResponse,
  saturationEnergy: number,
  direction: -1 | 1 | null,
  quantities: readonly UncertainQuantity[],
): Omit<DerivedQuantities, 'ligand' | 'unit'> {
  const { model } = response;
  const leak = endOf(model, response.stateAt(0), response.energyAt(0), quantities);
  const full = endOf(model, response.stateAtSaturation(), saturationEnergy, quantities);
  const difference = full.gradient.map((value, k) => value - leak.gradient[k]);
  const range = Math.abs(full.p < 0.5 ? full.p - leak.p : leak.rest - full.rest);
  const limits = {
    leakiness: estimate(model, leak.p, leak.gradient),
    saturation: estimate(model, full.p, full.gradient),
    dynamicRange: estimate(model, range, difference),
  };
  if (direction === null) return { ...limits, halfActivity: null, ec50: null, effectiveHill: null };
  const halfActivity = concentrationOf(response, 0, new Float64Array(difference.length), quantities);
  return {
    ...limits,
    halfActivity: halfActivity?.estimate ?? null,
    ...midpoint(response, leak, full, quantities),
  };
}

function endOf(
  model: SeriesModel,
  state: SiteState,
  energy: number,
  quantities: readonly UncertainQuantity[],
): End {
  const gradient = new Float64Array(model.sharedKeys.length);
  // At an infinite energy the activity is 0 or 1 whatever the parameters.
  if (Number.isFinite(energy)) {
    addScaledGradient(model, state, gradient, 0, quantities);
    const slope = logisticSlope(energy);
    for (let k = 0; k < gradient.length; k++) gradient[k] *= slope;
  }
  return { p: logistic(energy), rest: logistic(-energy), gradient };
}

function estimate(model: SeriesModel, value: number, gradient: Float64Array): Estimate {
  return { value, u: Math.sqrt(quadraticForm(gradient, 0, gradient.length, model.correlation)) };
}

/** The concentration at an energy f*, and the scaled gradient of its logarithm, (df* − ∂f)/(∂f/∂ln c). */
function concentrationOf(
  response: LigandResponse,
  energy: number,
  energyGradient: Float64Array,
  quantities: readonly UncertainQuantity[],
): { c: number; logGradient: Float64Array; estimate: Estimate } | null {
  const c = response.concentrationAt(energy);
  if (c === null) return null;
  const { model } = response;
  const state = response.stateAt(c);
  const slope = concentrationSlope(model, state, response.ligand);
  if (slope === 0) return null;
  const gradient = new Float64Array(energyGradient.length);
  addScaledGradient(model, state, gradient, 0, quantities);
  const logGradient = gradient.map((value, k) => (energyGradient[k] - value) / slope);
  const u = c * estimate(model, 1, logGradient).u;
  // Where the response is flat to the last bit, its midpoint has no place.
  return Number.isFinite(u) ? { c, logGradient, estimate: { value: c, u } } : null;
}

/** EC50 and the effective Hill coefficient there. */
function midpoint(
  response: LigandResponse,
  leak: End,
  full: End,
  quantities: readonly UncertainQuantity[],
): Pick<DerivedQuantities, 'ec50' | 'effectiveHill'> {
  const none = { ec50: null, effectiveHill: null };
  const p = (leak.p + full.p) / 2;
  const rest = (leak.rest + full.rest) / 2;
  const range = full.p < 0.5 ? full.p - leak.p : leak.rest - full.rest;
  if (range === 0 || p === 0 || rest === 0) return none;
  const pGradient = leak.gradient.map((value, k) => (value + full.gradient[k]) / 2);
  const found = concentrationOf(
    response,
    Math.log(p / rest),
    pGradient.map((value) => value / (p * rest)),
    quantities,
  );
  if (found === null) return none;
  const { model, ligand } = response;
  const state = response.stateAt(found.c);
  const slope = concentrationSlope(model, state, ligand);
  const hill = (4 * p * rest * Math.abs(slope)) / Math.abs(range);
  const slopeGradient = gradientOfSlope(model, state, ligand, quantities);
  const curvature = slopeOfSlope(model, state, ligand);
  const gradient = slopeGradient.map((value, k) => {
    const ofSlope = (value + curvature * found.logGradient[k]) / slope;
    const ofRange = (full.gradient[k] - leak.gradient[k]) / range;
    return hill * (((1 - 2 * p) * pGradient[k]) / (p * rest) + ofSlope - ofRange);
  });
  const effectiveHill = estimate(model, hill, gradient);
  if (!Number.isFinite(hill) || !Number.isFinite(effectiveHill.u)) return none;
  return { ec50: found.estimate, effectiveHill };
}

/** ∂²f/∂(ln c)² = −Σ n_s (x_I(1 − x_I) − x_A(1 − x_A)), x the occupancies by this ligand alone. */
function slopeOfSlope(model: SeriesModel, state: SiteState, ligand: number): number {
  let sum = 0;
  for (let s = 0; s < model.classCount; s++) {
    const at = s * model.ligandCount + ligand;
    sum -= model.sites[s] * (spread(state.occupancyInactive[at]) - spread(state.occupancyActive[at]));
  }
  return sum;
}

/** Scaled gradient of ∂f/∂ln c at fixed c. */
function gradientOfSlope(
  model: SeriesModel,
  state: SiteState,
  ligand: number,
  quantities: readonly UncertainQuantity[],
): Float64Array {
  const gradient = new Float64Array(model.sharedKeys.length);
  for (const { kind, place, ligand: ofLigand, scale, column } of quantities) {
    const at = place * model.ligandCount + ligand;
    const inactive = state.occupancyInactive[at];
    const active = state.occupancyActive[at];
    if (kind === 'sites') gradient[column] += scale * (active - inactive);
    if (ofLigand !== ligand) continue;
    if (kind === 'inactive') gradient[column] += scale * model.sites[place] * spread(inactive);
    if (kind === 'active') gradient[column] -= scale * model.sites[place] * spread(active);
  }
  return gradient;
}

function spread(occupancy: number): number {
  return occupancy * (1 - occupancy);
}
