/**
 * A series' model with its uncertain quantities drawn at random: lognormal for dissociation constants,
 * ratios and stocks (their logarithm is normal about the logarithm of what is stated, with u(ln K) = u(K)/K),
 * normal for the rest. Correlations hold between the underlying normal variables (a Gaussian copula).
 *
 * Source: JCGM 101:2008, 6.4.7 and 6.4.8 (normal and multivariate normal inputs).
 */
import { choleskySemidefinite } from './linear-algebra';
import type { SeriesModel } from './series-model';
import type { QuantityKind, UncertainQuantity } from './uncertain-quantities';

/** A number of sites or a temperature never falls below this share of what is stated: none can be negative. */
const LEAST_SHARE = 1e-3;

/** Logarithms are drawn within this, so that products of what is drawn stay finite: e^150 is 1e65. */
const LARGEST_LOGARITHM = 150;

/** e^x, x taken within the bounds of what is drawn. */
export function boundedExp(x: number): number {
  return Math.exp(Math.min(LARGEST_LOGARITHM, Math.max(-LARGEST_LOGARITHM, x)));
}

export class DrawnModel {
  /** the model as drawn last; only what the energy needs of it */
  readonly model: SeriesModel;
  /** by ligand: what every concentration of the series is multiplied by, as drawn last */
  readonly stockFactor: Float64Array;
  /** correlated standard normal numbers as drawn last, one a column */
  readonly normals: Float64Array;
  private readonly factor: Float64Array | null;
  /** g0 as stated, kT */
  private readonly wholeGapKT: number;

  constructor(private readonly stated: SeriesModel) {
    const { sites, gapPerSite, inverseInactive, inverseActive, slopes } = stated;
    this.model = {
      ...stated,
      sites: sites.slice(),
      gapPerSite: gapPerSite.slice(),
      inverseInactive: inverseInactive.slice(),
      inverseActive: inverseActive.slice(),
      slopes: slopes.slice(),
    };
    const columns = stated.sharedKeys.length;
    this.stockFactor = new Float64Array(stated.ligandCount);
    this.normals = new Float64Array(columns);
    this.factor = stated.correlation && choleskySemidefinite(stated.correlation, columns).factor;
    this.wholeGapKT = sites.reduce((gap, n, s) => gap - n * gapPerSite[s], stated.gapKT);
  }

  /**
   * Draws the model anew.
   *
   * @param independent standard normal numbers, one a column of the model, starting at `offset`
   */
  draw(independent: Float64Array, offset: number): void {
    this.correlate(independent, offset);
    this.reset();
    for (const quantity of this.stated.quantities) {
      this.shift(quantity, quantity.scale * this.normals[quantity.column]);
    }
    const { model, stated } = this;
    for (let s = 0; s < model.classCount; s++) {
      model.sites[s] = Math.max(model.sites[s], LEAST_SHARE * stated.sites[s]);
      model.gapKT += model.sites[s] * model.gapPerSite[s];
    }
    if (model.temperatureKelvin !== stated.temperatureKelvin) this.warm();
  }

  private correlate(independent: Float64Array, offset: number): void {
    const { normals, factor } = this;
    const columns = normals.length;
    for (let i = 0; i < columns; i++) {
      let value = factor === null ? independent[offset + i] : 0;
      if (factor !== null)
        for (let k = 0; k <= i; k++) value += factor[i * columns + k] * independent[offset + k];
      normals[i] = value;
    }
  }

  private reset(): void {
    const { model, stated } = this;
    model.sites.set(stated.sites);
    model.gapPerSite.set(stated.gapPerSite);
    model.inverseInactive.set(stated.inverseInactive);
    model.inverseActive.set(stated.inverseActive);
    model.slopes.set(stated.slopes);
    model.temperatureKelvin = stated.temperatureKelvin;
    model.gapKT = this.wholeGapKT;
    this.stockFactor.fill(1);
  }

  /** Moves one quantity by `by`, in kT, in sites, in K, or in the logarithm. */
  private shift({ kind, place, ligand }: UncertainQuantity, by: number): void {
    const { model } = this;
    if (kind === 'gap') model.gapKT += by;
    else if (kind === 'gapPerSite') model.gapPerSite[place] += by;
    else if (kind === 'sites') model.sites[place] += by;
    else if (kind === 'inactive')
      model.inverseInactive[place * model.ligandCount + ligand] *= boundedExp(-by);
    else if (kind === 'active') model.inverseActive[place * model.ligandCount + ligand] *= boundedExp(-by);
    else if (kind === 'slope') model.slopes[place] += by;
    else if (kind === 'temperature') model.temperatureKelvin += by;
    else this.stockFactor[ligand] *= boundedExp(by);
  }

  /** What was stated in kJ/mol, kcal/mol or meV is fewer kT at a higher temperature. */
  private warm(): void {
    const { model, stated } = this;
    const kelvin = Math.max(model.temperatureKelvin, LEAST_SHARE * stated.temperatureKelvin);
    const change = stated.temperatureKelvin / kelvin - 1;
    model.gapKT += stated.thermalGapKT * change;
    for (let m = 0; m < model.slopes.length; m++) model.slopes[m] += stated.thermalSlopes[m] * change;
  }
}

/** Whether a quantity is drawn from a lognormal distribution, so that its scale is that of a logarithm. */
export function isLognormal(kind: QuantityKind): boolean {
  return kind === 'inactive' || kind === 'active' || kind === 'stock';
}
