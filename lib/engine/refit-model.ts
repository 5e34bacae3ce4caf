/**
 * The expected activities of a dataset as a function of the values that a refit changes: weighted residuals
 * (p(f) − a)/√(u_a² + u_0²) and their derivatives, p(1 − p)·∂f/∂x over the same.
 */
import { addScaledGradient, createSiteState, energyOf, occupySites, type SiteState } from './energy';
import { POLICY } from './flags';
import type { FreePlace, FreeValue } from './free-parameters';
import type { DatasetInput, SeriesInput } from './inputs';
import { logistic, logisticSlope } from './logistic';
import { measureActivity } from './measured-activity';
import { readPoint } from './point-table';
import { buildSeriesModel, type SeriesModel } from './series-model';
import type { UncertainQuantity } from './uncertain-quantities';

/** One series with its place among all points. */
interface Part {
  model: SeriesModel;
  state: SiteState;
  /** number of its points, and of the points before it */
  count: number;
  first: number;
  /** count × ligands, and count × modulation entries */
  concentrations: Float64Array;
  displacements: Float64Array;
  activity: Float64Array;
  /** √(u_a² + u_0²) */
  weightU: Float64Array;
  /** g0, kT: what `model.gapKT` has beside the gaps of the sites */
  wholeGapKT: number;
  /** what of it depends on the values that are fitted */
  quantities: UncertainQuantity[];
}

export class RefitModel {
  /** number of points in the dataset */
  readonly count: number;
  private readonly parts: Part[];

  constructor(
    dataset: DatasetInput,
    private readonly values: readonly FreeValue[],
  ) {
    let first = 0;
    this.parts = dataset.series.map((series) => {
      const part = partOf(dataset, series, first);
      first += part.count;
      return part;
    });
    this.count = first;
    values.forEach((value, column) => {
      for (const { seriesIndex, place, ligand } of value.places)
        this.parts[seriesIndex].quantities.push({
          kind: value.parameter.parameter,
          place,
          ligand,
          scale: 1,
          column,
        });
    });
  }

  /** Weighted residuals at x, one a point. */
  writeResiduals(x: Float64Array, out: Float64Array): void {
    this.put(x);
    this.eachPoint((part, i) => {
      const expected = logistic(energyOf(part.model, part.state));
      out[part.first + i] = (expected - part.activity[i]) / part.weightU[i];
    });
  }

  /** Their derivatives by x, count × values; `out` must be 0 before. */
  writeJacobian(x: Float64Array, out: Float64Array): void {
    const columns = this.values.length;
    this.put(x);
    this.eachPoint((part, i) => {
      const row = (part.first + i) * columns;
      const weight = logisticSlope(energyOf(part.model, part.state)) / part.weightU[i];
      addScaledGradient(part.model, part.state, out, row, part.quantities);
      for (const { column } of part.quantities) out[row + column] *= weight;
    });
  }

  /** Puts the values of x into the series. */
  private put(x: Float64Array): void {
    this.values.forEach((value, j) => {
      const number = value.logarithmic ? Math.exp(x[j]) : x[j];
      for (const place of value.places) putValue(this.parts[place.seriesIndex], value, place, number);
    });
    for (const part of this.parts) {
      const { model } = part;
      model.gapKT = part.wholeGapKT;
      for (let s = 0; s < model.classCount; s++) model.gapKT += model.sites[s] * model.gapPerSite[s];
      // ∂f/∂ln n = n·∂f/∂n
      for (const quantity of part.quantities)
        if (quantity.kind === 'sites') quantity.scale = model.sites[quantity.place];
    }
  }

  private eachPoint(visit: (part: Part, i: number) => void): void {
    for (const part of this.parts) {
      const { model, state, displacements } = part;
      const entries = state.displacement.length;
      for (let i = 0; i < part.count; i++) {
        for (let m = 0; m < entries; m++) state.displacement[m] = displacements[i * entries + m];
        occupySites(model, part.concentrations, i * model.ligandCount, state);
        visit(part, i);
      }
    }
  }
}

/** Sets one parameter of one series: K in the ligand's unit, n, or kT. */
function putValue(part: Part, value: FreeValue, { place, ligand }: FreePlace, number: number): void {
  const { model } = part;
  switch (value.parameter.parameter) {
    case 'gap':
      part.wholeGapKT = number;
      break;
    case 'gapPerSite':
      model.gapPerSite[place] = number;
      break;
    case 'sites':
      model.sites[place] = number;
      break;
    case 'inactive':
      model.inverseInactive[place * model.ligandCount + ligand] = 1 / number;
      break;
    case 'active':
      model.inverseActive[place * model.ligandCount + ligand] = 1 / number;
      break;
    case 'slope':
      model.slopes[place] = number;
      break;
  }
}

function partOf(dataset: DatasetInput, series: SeriesInput, first: number): Part {
  const model = buildSeriesModel(dataset, series);
  const { points } = series;
  const { activity, activityU } = measureActivity(points);
  const part: Part = {
    model,
    state: createSiteState(model),
    count: points.length,
    first,
    concentrations: new Float64Array(points.length * model.ligandCount),
    displacements: new Float64Array(points.length * model.slopes.length),
    activity,
    weightU: activityU.map((u) => Math.hypot(u, POLICY.modelFloor)),
    wholeGapKT: wholeGapOf(model),
    quantities: [],
  };
  points.forEach((point, i) => {
    const [c, x] = [i * model.ligandCount, i * model.slopes.length];
    const concentrations = part.concentrations.subarray(c, c + model.ligandCount);
    readPoint(dataset, model, point, concentrations, part.displacements.subarray(x, x + model.slopes.length));
  });
  return part;
}

/** g0 of a model, kT. */
function wholeGapOf(model: SeriesModel): number {
  let gap = model.gapKT;
  for (let s = 0; s < model.classCount; s++) gap -= model.sites[s] * model.gapPerSite[s];
  return gap;
}
