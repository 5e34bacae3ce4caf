/**
 * The check on linear propagation: the standard uncertainty of the expected activity by the Monte Carlo
 * method, on at most 100 points of a dataset, and a note where it differs from the linear one by more than 5 %.
 *
 * Two things make few trials do. The inputs are a Latin hypercube sample. And in every trial the linear form is
 * evaluated on the same numbers as the model: its spread over the trials is off its known value by the luck of
 * the draw, and so, nearly alike, is that of the model, so that the ratio of the two tells a few per cent.
 *
 * Sources: JCGM 101:2008 (propagation of distributions) and its clause 8 (validation of the GUM framework);
 * McKay, Beckman & Conover, Technometrics 21, 239 (1979).
 */
import type { Note } from './assessment';
import { chooseCurvedPoints, LEAST_EXPECTED_U } from './curved-points';
import { boundedExp, DrawnModel } from './draw-model';
import { concentrationSlope, createSiteState, energyOf, occupySites } from './energy';
import type { DatasetInput } from './inputs';
import { logistic, logisticSlope } from './logistic';
import { normalMidpoints } from './normal-midpoints';
import { readPoint } from './point-table';
import { propagate } from './propagate';
import type { ScoredSeries } from './q-statistic';
import { SeededRandom } from './seeded-random';

const TRIALS = 2000;
/** The same draws for every dataset: the same document gives the same assessment. */
const SEED = 101;
/** Where the two uncertainties differ by more than this, relative to the linear one, it is said. */
const DISAGREEMENT = 0.05;

/** The two standard uncertainties of the expected activity at a point. */
export interface UncertaintyPair {
  index: number;
  linear: number;
  monteCarlo: number;
}

/** Notes on the series whose linear uncertainties should not be trusted, one list a series. */
export function noteLinearUncertainty(dataset: DatasetInput, scored: readonly ScoredSeries[]): Note[][] {
  return compareWithMonteCarlo(dataset, scored).map((pairs) => {
    const off = pairs.filter(disagrees);
    return off.length === 0 ? [] : [describe(off, pairs.length)];
  });
}

/**
 * Linear and Monte Carlo uncertainties at the points where they are most likely to differ, by series.
 *
 * @param trials at the default a ratio near 1 has a standard error of 0.004 to 0.008, as 10,000 to 30,000 plain trials would give
 */
export function compareWithMonteCarlo(
  dataset: DatasetInput,
  scored: readonly ScoredSeries[],
  trials = TRIALS,
  seed = SEED,
): UncertaintyPair[][] {
  const chosen = chooseCurvedPoints(scored);
  const widths = scored.map(({ model }, s) =>
    chosen[s].length === 0 ? 0 : model.sharedKeys.length + model.ligandCount,
  );
  const width = Math.max(0, ...widths);
  // Series share their draws: each point is judged by itself.
  const normals = drawNormals(trials, width, seed);
  return scored.map((series, s) =>
    chosen[s].length === 0 ? [] : comparePoints(dataset, s, series, chosen[s], normals, width, trials),
  );
}

/**
 * Standard normal numbers, trials × width, each column a Latin hypercube sample: the normal distribution cut into
 * as many slices of equal probability as there are trials, the middle of each taken once, in random order.
 */
function drawNormals(trials: number, width: number, seed: number): Float64Array {
  const random = new SeededRandom(seed);
  const column = width > 0 ? normalMidpoints(trials) : new Float64Array(0);
  const normals = new Float64Array(trials * width);
  for (let j = 0; j < width; j++) {
    random.shuffle(column);
    for (let i = 0; i < trials; i++) normals[i * width + j] = column[i];
  }
  return normals;
}

/** A point as the trials need it. */
interface TriedPoint {
  concentrations: Float64Array;
  displacement: Float64Array;
  /** scaled gradient of the expected activity by the columns of the model, then by dispensing of each ligand */
  gradient: Float64Array;
}

function comparePoints(
  dataset: DatasetInput,
  series: number,
  { model, table }: ScoredSeries,
  indices: readonly number[],
  normals: Float64Array,
  width: number,
  trials: number,
): UncertaintyPair[] {
  const columns = model.sharedKeys.length;
  const points = indices.map((index) => preparePoint(dataset, series, { model, table }, index));
  const drawn = new DrawnModel(model);
  const state = createSiteState(model);
  const factors = new Float64Array(model.ligandCount);
  const concentrations = new Float64Array(model.ligandCount);
  const { deviation } = propagate(trials, 2 * points.length, (out, trial) => {
    const offset = trial * width;
    drawn.draw(normals, offset);
    for (let l = 0; l < factors.length; l++)
      factors[l] = drawn.stockFactor[l] * boundedExp(model.relativeU[l] * normals[offset + columns + l]);
    points.forEach((point, k) => {
      for (let l = 0; l < factors.length; l++) concentrations[l] = point.concentrations[l] * factors[l];
      occupySites(drawn.model, concentrations, 0, state);
      state.displacement.set(point.displacement);
      out[2 * k] = logistic(energyOf(drawn.model, state));
      let linear = 0;
      for (let j = 0; j < columns; j++) linear += point.gradient[j] * drawn.normals[j];
      for (let l = 0; l < factors.length; l++)
        linear += point.gradient[columns + l] * normals[offset + columns + l];
      out[2 * k + 1] = linear;
    });
  });
  return indices.map((index, k) => {
    const linear = table.expectedU[index];
    const spread = deviation[2 * k + 1];
    const monteCarlo = spread > 0 ? (linear * deviation[2 * k]) / spread : deviation[2 * k];
    return { index, linear, monteCarlo };
  });
}

function preparePoint(
  dataset: DatasetInput,
  series: number,
  { model, table }: Pick<ScoredSeries, 'model' | 'table'>,
  index: number,
): TriedPoint {
  const columns = model.sharedKeys.length;
  const concentrations = new Float64Array(model.ligandCount);
  const displacement = new Float64Array(model.slopes.length);
  readPoint(dataset, model, dataset.series[series].points[index], concentrations, displacement);
  const state = createSiteState(model);
  occupySites(model, concentrations, 0, state);
  const slope = logisticSlope(table.energy[index]);
  const gradient = new Float64Array(columns + model.ligandCount);
  for (let j = 0; j < columns; j++) gradient[j] = table.expectedGradient[index * columns + j];
  for (let l = 0; l < model.ligandCount; l++)
    gradient[columns + l] = slope * model.relativeU[l] * concentrationSlope(model, state, l);
  return { concentrations, displacement, gradient };
}

function describe(off: readonly UncertaintyPair[], tried: number): Note {
  const worst = off.reduce((far, pair) => (distance(pair) > distance(far) ? pair : far));
  const where = `At ${off.length} of the ${tried} ${tried === 1 ? 'point' : 'points'} tried`;
  const figures = `${worst.monteCarlo.toPrecision(2)} instead of ${worst.linear.toPrecision(2)}`;
  return {
    code: 'linear-uncertainty',
    detail: `${where} the Monte Carlo method of JCGM 101 gives an uncertainty of the expected activity that differs from the linear one by more than 5 %, at most ${figures} (point ${worst.index + 1}): the linear figures should not be trusted there.`,
    points: off.map(({ index }) => index),
  };
}

function disagrees({ linear, monteCarlo }: UncertaintyPair): boolean {
  if (Math.max(linear, monteCarlo) < LEAST_EXPECTED_U) return false;
  return Math.abs(monteCarlo - linear) > DISAGREEMENT * linear;
}

/** How far apart the two are, as a ratio either way. */
function distance({ linear, monteCarlo }: UncertaintyPair): number {
  return Math.abs(Math.log(monteCarlo / linear));
}
