/**
 * The response of a series to one ligand alone: other ligands absent, modulators at their references. Gives
 * the sites' state at any concentration, 0 and ∞ included, and finds the concentration that has a given
 * energy: in closed form where one site class binds the ligand, by bracketing where several do and f is
 * monotonic in ln c.
 *
 *     c(f*) = (B − 1)/(1/K_I − B/K_A),   ln B = (f(0) − f*)/n        (one class)
 */
import { concentrationSlope, createSiteState, energyOf, occupySites, type SiteState } from './energy';
import type { SeriesModel } from './series-model';

/** Steps at which the sign of ∂f/∂ln c is looked at, over the range of the constants and 1e4 beyond. */
const MONOTONY_STEPS = 400;
const BEYOND_CONSTANTS = 1e4;

/** One ligand's response; holds one state, which every question overwrites. */
export class LigandResponse {
  private readonly state: SiteState;
  private readonly concentrations: Float64Array;
  /** classes that bind the ligand in at least one state */
  private readonly bindingClasses: number[];

  constructor(
    readonly model: SeriesModel,
    readonly ligand: number,
  ) {
    this.state = createSiteState(model);
    this.concentrations = new Float64Array(model.ligandCount);
    this.bindingClasses = [...model.sites.keys()].filter(
      (s) => this.inverse(s).inactive + this.inverse(s).active > 0,
    );
  }

  private inverse(s: number): { inactive: number; active: number } {
    const at = s * this.model.ligandCount + this.ligand;
    return { inactive: this.model.inverseInactive[at], active: this.model.inverseActive[at] };
  }

  /** Whether any site class binds the ligand at all. */
  binds(): boolean {
    return this.bindingClasses.length > 0;
  }

  /** Sites at concentration c ≥ 0, in the ligand's unit. The state is overwritten by the next call. */
  stateAt(c: number): SiteState {
    this.concentrations[this.ligand] = c;
    occupySites(this.model, this.concentrations, 0, this.state);
    return this.state;
  }

  /** Sites at saturation; ln B is ±∞ where a class binds in one state only. */
  stateAtSaturation(): SiteState {
    this.stateAt(0);
    for (const s of this.bindingClasses) {
      const { inactive, active } = this.inverse(s);
      const at = s * this.model.ligandCount + this.ligand;
      this.state.occupancyInactive[at] = inactive > 0 ? 1 : 0;
      this.state.occupancyActive[at] = active > 0 ? 1 : 0;
      this.state.logRatio[s] = Math.log(inactive / active);
    }
    return this.state;
  }

  energyAt(c: number): number {
    return energyOf(this.model, this.stateAt(c));
  }

  /** f at saturation, kT: ±∞ where binding to one state alone drives it, null where classes drive it both ways. */
  energyAtSaturation(): number | null {
    const energy = energyOf(this.model, this.stateAtSaturation());
    return Number.isNaN(energy) ? null : energy;
  }

  /** Whether f moves one way only as the ligand is added: −1 falls, +1 rises, 0 not at all, null both ways. */
  direction(): -1 | 0 | 1 | null {
    const signs = new Set(
      this.bindingClasses.map((s) => Math.sign(this.inverse(s).active - this.inverse(s).inactive)),
    );
    signs.delete(0);
    if (signs.size === 0) return 0;
    if (signs.size === 1) return signs.has(1) ? 1 : -1;
    return this.scannedDirection();
  }

  private scannedDirection(): -1 | 1 | null {
    const [low, high] = this.range(BEYOND_CONSTANTS);
    const seen = new Set<number>();
    for (let i = 0; i <= MONOTONY_STEPS; i++) {
      const c = Math.exp(low + ((high - low) * i) / MONOTONY_STEPS);
      seen.add(Math.sign(concentrationSlope(this.model, this.stateAt(c), this.ligand)));
    }
    seen.delete(0);
    if (seen.size !== 1) return null;
    return seen.has(1) ? 1 : -1;
  }

  /** ln of the smallest and largest constant, widened by a factor. */
  private range(factor: number): [number, number] {
    const constants: number[] = [];
    for (const s of this.bindingClasses) {
      const { inactive, active } = this.inverse(s);
      if (inactive > 0) constants.push(-Math.log(inactive));
      if (active > 0) constants.push(-Math.log(active));
    }
    return [Math.min(...constants) - Math.log(factor), Math.max(...constants) + Math.log(factor)];
  }

  /**
   * The concentration at which f is `energy`; null where there is none above 0 and below every bound of a
   * double. To be asked only where f is monotonic.
   */
  concentrationAt(energy: number): number | null {
    const c = this.bindingClasses.length === 1 ? this.closedForm(energy) : this.bracket(energy);
    return c > 0 && Number.isFinite(c) ? c : null;
  }

  private closedForm(energy: number): number {
    const [s] = this.bindingClasses;
    const { inactive, active } = this.inverse(s);
    const logB = (this.energyAt(0) - energy) / this.model.sites[s];
    // For B > 1 both parts are divided by B, so that a large B overflows nothing.
    return logB > 0
      ? -Math.expm1(-logB) / (inactive * Math.exp(-logB) - active)
      : Math.expm1(logB) / (inactive - Math.exp(logB) * active);
  }

  /** Bisection in ln c to the last bit; NaN where f never passes `energy`. */
  private bracket(energy: number): number {
    let [low, high] = this.range(Number.MAX_SAFE_INTEGER ** 2);
    const below = Math.sign(this.energyAt(Math.exp(low)) - energy);
    if (below === Math.sign(this.energyAt(Math.exp(high)) - energy)) return Number.NaN;
    for (let middle = (low + high) / 2; low < middle && middle < high; middle = (low + high) / 2) {
      if (Math.sign(this.energyAt(Math.exp(middle)) - energy) === below) low = middle;
      else high = middle;
    }
    return Math.exp((low + high) / 2);
  }
}
