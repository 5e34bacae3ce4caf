/**
 * Everything that is computed point by point: energy, expected activity, their uncertainties, residual, z
 * and p. One table a series, a typed array a column.
 *
 *     u_f² = gᵀVg + Σ_l (∂f/∂ln c_l·relativeU_l)²      u_p = p(1 − p) u_f
 *     r = a − p      u_r² = u_a² + u_p² + u_0²          z = r/u_r
 *
 * In a series whose parameters were fitted to these points u_p is left out of u_r. p of a point is the
 * two-sided normal tail of z; where u_a comes from pooled replicates, Student's with the
 * Welch–Satterthwaite degrees of freedom u_r⁴/(u_a⁴/ν).
 *
 * Source: JCGM 100:2008 (GUM), 5.2 and G.4.1.
 */
import { addScaledGradient, concentrationSlope, createSiteState, energyOf, occupySites } from './energy';
import { POLICY } from './flags';
import type { DatasetInput, PointInput, SeriesInput } from './inputs';
import { logistic, logisticSlope } from './logistic';
import { type MeasuredActivity, measureActivity } from './measured-activity';
import type { SeriesModel } from './series-model';
import { normalTwoSided, studentTwoSided } from './tails';

export interface PointTable extends MeasuredActivity {
  /** number of points, m */
  count: number;
  /** u_0, in activity */
  modelFloor: number;
  /** f, kT */
  energy: Float64Array;
  energyU: Float64Array;
  /** p(f) */
  expected: Float64Array;
  expectedU: Float64Array;
  residual: Float64Array;
  residualU: Float64Array;
  z: Float64Array;
  pValue: Float64Array;
  /** scaled gradient of p, p(1 − p)·∂f/∂θ·u_θ, m × columns, row by row */
  expectedGradient: Float64Array;
  /** variance of p from dispensing, independent from point to point, m numbers */
  dispensingVariance: Float64Array;
}

/**
 * Computes the table of a series.
 *
 * @param modelFloor u_0, in activity; that of the policy unless a simulation knows the model to be exact
 */
export function computePointTable(
  dataset: DatasetInput,
  series: SeriesInput,
  model: SeriesModel,
  modelFloor: number = POLICY.modelFloor,
): PointTable {
  const { points } = series;
  const count = points.length;
  const columns = model.sharedKeys.length;
  const table: PointTable = {
    count,
    modelFloor,
    ...measureActivity(points),
    energy: new Float64Array(count),
    energyU: new Float64Array(count),
    expected: new Float64Array(count),
    expectedU: new Float64Array(count),
    residual: new Float64Array(count),
    residualU: new Float64Array(count),
    z: new Float64Array(count),
    pValue: new Float64Array(count),
    expectedGradient: new Float64Array(count * columns),
    dispensingVariance: new Float64Array(count),
  };
  fillExpected(dataset, points, model, table);
  fillScores(table, series.parameters.origin === 'fitted-here');
  return table;
}

function fillExpected(
  dataset: DatasetInput,
  points: readonly PointInput[],
  model: SeriesModel,
  table: PointTable,
): void {
  const state = createSiteState(model);
  const concentrations = new Float64Array(model.ligandCount);
  const columns = model.sharedKeys.length;
  for (let i = 0; i < table.count; i++) {
    readPoint(dataset, model, points[i], concentrations, state.displacement);
    occupySites(model, concentrations, 0, state);
    const row = i * columns;
    addScaledGradient(model, state, table.expectedGradient, row);
    let dispensing = 0;
    for (let l = 0; l < model.ligandCount; l++) {
      if (model.relativeU[l] === 0) continue;
      dispensing += (concentrationSlope(model, state, l) * model.relativeU[l]) ** 2;
    }
    const energy = energyOf(model, state);
    const slope = logisticSlope(energy);
    const energyU = Math.sqrt(
      quadraticForm(table.expectedGradient, row, columns, model.correlation) + dispensing,
    );
    for (let k = 0; k < columns; k++) table.expectedGradient[row + k] *= slope;
    table.energy[i] = energy;
    table.energyU[i] = energyU;
    table.expected[i] = logistic(energy);
    table.expectedU[i] = slope * energyU;
    table.dispensingVariance[i] = slope * slope * dispensing;
  }
}

/** Concentrations by ligand and displacements by modulation entry of one point; what is left out is 0. */
export function readPoint(
  dataset: DatasetInput,
  model: SeriesModel,
  point: Pick<PointInput, 'ligands' | 'modulators'>,
  concentrations: Float64Array,
  displacement: Float64Array,
): void {
  for (let l = 0; l < concentrations.length; l++)
    concentrations[l] = point.ligands[dataset.ligands[l].id] ?? 0;
  for (let m = 0; m < displacement.length; m++) {
    const value = point.modulators?.[model.modulators[m]];
    displacement[m] = value === undefined ? 0 : value - model.references[m];
  }
}

/** gᵀRg of the scaled gradient starting at `row`; R is the unit matrix where `correlation` is null. */
export function quadraticForm(
  gradient: Float64Array,
  row: number,
  columns: number,
  correlation: Float64Array | null,
): number {
  let sum = 0;
  for (let j = 0; j < columns; j++) {
    const g = gradient[row + j];
    sum += g * g;
    if (correlation === null) continue;
    for (let k = 0; k < j; k++) sum += 2 * g * correlation[j * columns + k] * gradient[row + k];
  }
  // Rounding may leave a perfectly anticorrelated pair a hair below 0.
  return Math.max(0, sum);
}

function fillScores(table: PointTable, fittedHere: boolean): void {
  const { activityU, expectedU, degreesOfFreedom, modelFloor } = table;
  for (let i = 0; i < table.count; i++) {
    const modelVariance = fittedHere ? 0 : expectedU[i] ** 2;
    const variance = activityU[i] ** 2 + modelVariance + modelFloor ** 2;
    table.residual[i] = table.activity[i] - table.expected[i];
    table.residualU[i] = Math.sqrt(variance);
    const z = table.residual[i] / table.residualU[i];
    table.z[i] = z;
    const pooled = table.uncertainty[i] === 'replicates' && activityU[i] > 0;
    table.pValue[i] = pooled
      ? studentTwoSided(z, (variance * variance * degreesOfFreedom) / activityU[i] ** 4)
      : normalTwoSided(z);
  }
}
