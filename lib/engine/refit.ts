/**
 * Fits freed parameters of a dataset to its points: least squares of (p(f) − a)/√(u_a² + u_0²), started at the
 * stated values. The result is a suggestion; published parameters are those stated.
 *
 * A value is not determined by the data where it belongs to a direction beyond a condition number of 1e8 of the
 * scaled normal matrix, where it ended at a bound of its range, or where its standard error is above 1 in ln K or
 * ln n.
 */
import { uncertaintyOfFit } from './fit-uncertainty';
import { type FreeParameter, type FreeParameterKind, type FreeValue, freeValues } from './free-parameters';
import type { DatasetInput } from './inputs';
import {
  type IterationState,
  type LeastSquaresFit,
  minimiseLeastSquares,
  REDUCTION_TOLERANCE,
} from './levenberg-marquardt';
import { RefitModel } from './refit-model';

export interface RefitProgress {
  iteration: number;
  chiSquared: number;
  /** 0 to 1, never decreasing */
  progress: number;
}

export interface RefitOptions {
  /** called after each iteration */
  onProgress?: (progress: RefitProgress) => void;
  /** asked after each iteration; where it says so, the refit ends where it stands, not converged */
  shouldStop?: () => boolean;
  mostIterations?: number;
}

export interface RefitEstimate {
  /** id of the series; null where one value stands for the dataset */
  series: string | null;
  parameter: FreeParameterKind;
  siteClass: string | null;
  ligand: string | null;
  modulator: string | null;
  /** that of the (first) statement for a constant, kT for gaps and slopes (per unit of the modulator), null for sites */
  unit: FreeValue['unit'];
  /** gaps and slopes: inactive − active */
  value: number;
  /** standard error; null where the points do not depend on the value, or it ended at a bound of its range */
  u: number | null;
  /** where the fit started: the stated value, or the mean (of K and n the geometric) of different ones */
  stated: number;
  determined: boolean;
}

export interface RefitResult {
  /** false also where the points respond to none of the values, so that nothing says where to go */
  converged: boolean;
  iterations: number;
  chiSquared: number;
  /** points less values; 0 where there are more values than points */
  degreesOfFreedom: number;
  /** null where no degrees of freedom are left */
  reducedChiSquared: number | null;
  estimates: RefitEstimate[];
  /** among the variables ln K, ln n, g and b, in the order of `estimates`; null where the data do not depend on one */
  correlations: (number | null)[][];
}

const MOST_ITERATIONS = 500;

/** A fall of χ² over twenty steps that says nothing: values that still move then are not determined. */
const NEGLIGIBLE_FALL = 1e-6;

/** Where one step of a value, 1 in ln or 1 kT, changes the weighted residuals by less than this, they do not respond to it. */
const LEAST_RESPONSE = 1e-6;

/** By how many of its own steps (1 in ln, 1 kT) a variable may move in one iteration. */
const MOST_STEPS = 3;

/** Standard error of ln K or ln n beyond which a value is not determined. */
const MOST_UNCERTAIN = 1;

/**
 * Refits a dataset.
 *
 * @param dataset a valid dataset
 * @param free parameters to fit, without errors (`checkFree`)
 */
export function refit(
  dataset: DatasetInput,
  free: readonly FreeParameter[],
  options: RefitOptions = {},
): RefitResult {
  const values = freeValues(dataset, free);
  const model = new RefitModel(dataset, values);
  const bounded = values.map(({ lower, upper }) => ({ lower, upper }));
  const fit = minimiseLeastSquares(
    {
      count: model.count,
      start: Float64Array.from(values, startOf),
      lower: Float64Array.from(bounded, ({ lower }) => lower),
      upper: Float64Array.from(bounded, ({ upper }) => upper),
      reach: Float64Array.from(values, ({ step }) => MOST_STEPS * step),
      residuals: (x, out) => model.writeResiduals(x, out),
      jacobian: (x, out) => model.writeJacobian(x, out),
    },
    {
      mostIterations: options.mostIterations ?? MOST_ITERATIONS,
      negligibleFall: NEGLIGIBLE_FALL,
      onIteration: reporter(options),
    },
  );
  return resultOf(values, fit, model.count);
}

function startOf({ stated, logarithmic, factor, lower, upper }: FreeValue): number {
  const start = logarithmic ? Math.log(stated * factor) : stated;
  return Math.min(upper, Math.max(lower, start));
}

function reporter({ onProgress, shouldStop, mostIterations = MOST_ITERATIONS }: RefitOptions) {
  let progress = 0;
  return ({ iteration, sumOfSquares, promised }: IterationState): boolean => {
    // What a step promises falls from about 1 to the tolerance, where the fit ends.
    const fallen = promised > 0 ? Math.log(promised) / Math.log(REDUCTION_TOLERANCE) : 1;
    progress = Math.max(progress, iteration / mostIterations, Math.min(1, fallen));
    onProgress?.({ iteration, chiSquared: sumOfSquares, progress });
    return shouldStop?.() !== true;
  };
}

function resultOf(values: readonly FreeValue[], fit: LeastSquaresFit, points: number): RefitResult {
  const held = values.map(({ lower, upper }, j) => fit.x[j] <= lower || fit.x[j] >= upper);
  const { standardErrors, correlations, entangled } = uncertaintyOfFit(
    fit.jacobian,
    points,
    values.length,
    held,
  );
  const degreesOfFreedom = Math.max(0, points - values.length);
  return {
    converged: fit.converged && (fit.sumOfSquares === 0 || pointsRespond(values, fit.jacobian)),
    iterations: fit.iterations,
    chiSquared: fit.sumOfSquares,
    degreesOfFreedom,
    reducedChiSquared: degreesOfFreedom > 0 ? fit.sumOfSquares / degreesOfFreedom : null,
    estimates: values.map((value, j) => estimateOf(value, fit.x[j], standardErrors[j], entangled[j])),
    correlations,
  };
}

/** Whether the points depend on any of the values there. */
function pointsRespond(values: readonly FreeValue[], jacobian: Float64Array): boolean {
  return (
    values.length === 0 ||
    jacobian.some((slope, at) => Math.abs(slope * values[at % values.length].step) >= LEAST_RESPONSE)
  );
}

function estimateOf(
  value: FreeValue,
  x: number,
  standardError: number | null,
  entangled: boolean,
): RefitEstimate {
  const { parameter, siteClass = null, ligand = null, modulator = null } = value.parameter;
  // Where nothing moved it, the value stays as stated, without the rounding of ln and exp.
  const moved = value.logarithmic ? Math.exp(x) / value.factor : x;
  const estimate = x === startOf(value) ? value.stated : moved;
  // A gap counts as not determined only where the points do not respond to it at all.
  const widest = value.logarithmic ? MOST_UNCERTAIN : value.step / LEAST_RESPONSE;
  const u = standardError === null ? null : standardError * (value.logarithmic ? estimate : 1);
  return {
    series: value.series,
    parameter,
    siteClass,
    ligand,
    modulator,
    unit: value.unit,
    value: estimate,
    u: u !== null && Number.isFinite(u) ? u : null,
    stated: value.stated,
    determined: standardError !== null && !entangled && standardError <= widest,
  };
}
