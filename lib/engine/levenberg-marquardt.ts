/**
 * Nonlinear least squares by the method of Levenberg and Marquardt with a trust region, scaled by the largest
 * columns seen, on orthogonal factors of the Jacobian (no normal matrix), within bounds.
 *
 * Source: Moré, in: Numerical Analysis, Dundee 1977, LNM 630 (Springer), 105 (1978), whose rules for the region, the scaling and the
 * end these are; Nocedal & Wright, Numerical Optimization, 2nd ed., section 10.3, and 16.7 for the projection
 * on bounds.
 */
import { normOf, type Triangle, triangularise } from './orthogonal-factors';
import { predictedReduction, prepareSubproblem, scaledLength, trustRegionStep } from './trust-region-step';

export interface LeastSquaresProblem {
  /** number of residuals, m */
  count: number;
  /** where to start, n numbers within the bounds */
  start: Float64Array;
  /** bounds, n numbers each; ±Infinity where there are none */
  lower: Float64Array;
  upper: Float64Array;
  /** Writes the residuals r(x), m numbers; a number that is not finite says that x is out of reach. */
  residuals: (x: Float64Array, out: Float64Array) => void;
  /** Writes ∂r_i/∂x_j, m×n row by row, at an x whose residuals are finite. */
  jacobian: (x: Float64Array, out: Float64Array) => void;
  /** by how much each variable may change in one step at most, n numbers; any amount where left out */
  reach?: Float64Array;
}

export interface LeastSquaresOptions {
  mostIterations?: number;
  /** where Σ r² falls by less than this over 20 trial steps, the fit has converged as well; 0 where left out */
  negligibleFall?: number;
  /** Called after each trial step; returning false ends the fit where it stands. */
  onIteration?: (state: IterationState) => boolean;
}

export interface IterationState {
  iteration: number;
  sumOfSquares: number;
  /** the reduction of the last step that the linear model promised, as a share of the sum of squares */
  promised: number;
}

export interface LeastSquaresFit {
  x: Float64Array;
  sumOfSquares: number;
  /** whether one of the tests of convergence was met */
  converged: boolean;
  /** trial steps, taken or not */
  iterations: number;
  /** ∂r/∂x at x, m×n */
  jacobian: Float64Array;
}

/** Where no step promises more than this share of the sum of squares, the fit has converged … */
export const REDUCTION_TOLERANCE = 1e-15;
/** … unless the step changes it by more than this share, which is beyond what rounding does. */
const ROUNDING = 1e-12;
/** Where the region is this small beside x, it has as well. */
const STEP_TOLERANCE = 1e-15;
const MOST_ITERATIONS = 1000;
/** Over so many trial steps a negligible fall is one. */
const FALL_ITERATIONS = 20;
/** A step is taken where it reaches this share of what was promised. */
const LEAST_RATIO = 1e-4;

/** The x at which Σ r_i² is smallest, as far as a descent from `start` finds it. */
export function minimiseLeastSquares(
  problem: LeastSquaresProblem,
  {
    mostIterations = MOST_ITERATIONS,
    negligibleFall = 0,
    onIteration = () => true,
  }: LeastSquaresOptions = {},
): LeastSquaresFit {
  const descent = new Descent(problem);
  const sums = [descent.sumOfSquares];
  let iterations = 0;
  let converged = descent.sumOfSquares === 0;
  while (!converged && iterations < mostIterations) {
    converged = descent.step();
    iterations++;
    const { sumOfSquares, promised } = descent;
    sums.push(sumOfSquares);
    if (iterations >= FALL_ITERATIONS && sums[iterations - FALL_ITERATIONS] - sumOfSquares < negligibleFall)
      converged = true;
    if (!onIteration({ iteration: iterations, sumOfSquares, promised })) break;
  }
  const { x, sumOfSquares, jacobian } = descent;
  return { x, sumOfSquares, converged, iterations, jacobian };
}

/** The state of a fit between two trial steps. */
class Descent {
  x: Float64Array;
  sumOfSquares: number;
  promised = 1;
  readonly jacobian: Float64Array;
  private residuals: Float64Array;
  private trialResiduals: Float64Array;
  private readonly scale: Float64Array;
  private radius = 0;
  private triangle: Triangle;

  constructor(private readonly problem: LeastSquaresProblem) {
    const { count, start, reach } = problem;
    this.x = Float64Array.from(start);
    this.residuals = new Float64Array(count);
    this.trialResiduals = new Float64Array(count);
    this.jacobian = new Float64Array(count * start.length);
    this.scale = new Float64Array(start.length);
    problem.residuals(this.x, this.residuals);
    this.sumOfSquares = sumOfSquaresOf(this.residuals);
    this.triangle = this.linearise();
    this.radius = scaledLength(reach ?? this.x, this.scale) || 1;
  }

  /** One trial step; whether the fit has converged. */
  step(): boolean {
    const scale = this.scaleForRadius();
    const { step: proposed, damping } = trustRegionStep(prepareSubproblem(this.triangle, scale), this.radius);
    const trial = this.withinBounds(proposed);
    const step = trial.map((value, j) => value - this.x[j]);
    const length = scaledLength(step, scale);
    const predicted = predictedReduction(this.triangle, step);
    this.promised = this.sumOfSquares > 0 ? predicted / this.sumOfSquares : 0;
    if (length === 0) return true;
    this.problem.residuals(trial, this.trialResiduals);
    const actual = this.reductionOf(this.trialResiduals);
    const ratio = predicted > 0 ? actual / predicted : -1;
    this.adjustRadius(ratio, length, damping);
    if (ratio >= LEAST_RATIO) this.take(trial);
    return this.hasConverged(actual, predicted);
  }

  private hasConverged(actual: number, predicted: number): boolean {
    const promisesNothing = Math.abs(predicted) <= REDUCTION_TOLERANCE * this.sumOfSquares;
    if (promisesNothing && Math.abs(actual) <= ROUNDING * this.sumOfSquares) return true;
    return this.radius <= STEP_TOLERANCE * (scaledLength(this.x, this.scale) || 1);
  }

  /** Σ r² now less Σ r² there, as Σ (r − r')(r + r'): the digits of the difference are kept. */
  private reductionOf(there: Float64Array): number {
    let sum = 0;
    for (let i = 0; i < there.length; i++)
      sum += (this.residuals[i] - there[i]) * (this.residuals[i] + there[i]);
    return Number.isFinite(sum) ? sum : Number.NEGATIVE_INFINITY;
  }

  private adjustRadius(ratio: number, length: number, damping: number): void {
    if (ratio <= 0.25) this.radius = (ratio >= 0 ? 0.5 : 0.25) * Math.min(this.radius, 10 * length);
    else if (damping === 0 || ratio >= 0.75) this.radius = 2 * length;
  }

  private take(trial: Float64Array): void {
    this.x = trial;
    [this.residuals, this.trialResiduals] = [this.trialResiduals, this.residuals];
    this.sumOfSquares = sumOfSquaresOf(this.residuals);
    this.triangle = this.linearise();
  }

  /** D, raised where the radius would let a variable change by more than its reach; 1 where nothing depends on it yet. */
  private scaleForRadius(): Float64Array {
    const { reach } = this.problem;
    return this.scale.map((value, j) => Math.max(value, reach ? this.radius / reach[j] : 0) || 1);
  }

  private withinBounds(step: Float64Array): Float64Array {
    const { lower, upper } = this.problem;
    return this.x.map((value, j) => Math.min(upper[j], Math.max(lower[j], value + step[j])));
  }

  /** The linear model at x, without the variables that a bound holds. */
  private linearise(): Triangle {
    const { count, jacobian: write } = this.problem;
    const n = this.x.length;
    this.jacobian.fill(0);
    write(this.x, this.jacobian);
    const free = Float64Array.from(this.jacobian);
    const column = new Float64Array(count);
    for (let j = 0; j < n; j++) {
      for (let i = 0; i < count; i++) column[i] = free[i * n + j];
      this.scale[j] = Math.max(this.scale[j], normOf(column));
      if (this.isHeld(j, column)) for (let i = 0; i < count; i++) free[i * n + j] = 0;
    }
    return triangularise(free, this.residuals, count, n);
  }

  /** Whether x_j stands at a bound and descent leads beyond it. */
  private isHeld(j: number, column: Float64Array): boolean {
    const { lower, upper } = this.problem;
    if (this.x[j] > lower[j] && this.x[j] < upper[j]) return false;
    let slope = 0;
    for (let i = 0; i < column.length; i++) slope += column[i] * this.residuals[i];
    return this.x[j] <= lower[j] ? slope > 0 : slope < 0;
  }
}

function sumOfSquaresOf(residuals: Float64Array): number {
  let sum = 0;
  for (const value of residuals) sum += value * value;
  return sum;
}
