/**
 * Generalised least squares of one or two numbers φ whose covariance depends on them: the C of the residuals
 * is taken anew at every step, and the fit is where nothing moves any more,
 *
 *     Jᵀ C⁻¹ r = 0   with r, J = ∂(expected)/∂φ and C all at φ;   u² = diag (Jᵀ C⁻¹ J)⁻¹
 *
 * Gauss–Newton steps, shortened until they reduce rᵀC⁻¹r at the C that they start from. Since C moves along,
 * such steps may approach the fit slowly, or from one side and the other; so each is corrected by what the one
 * before it has missed by.
 *
 * Source: Carroll & Ruppert, Transformation and Weighting in Regression (1988), 2.1 (iterated generalised
 * least squares); Anderson, J. ACM 12, 547 (1965), with a memory of one step, which for one number is the
 * secant method.
 */
import { choleskySemidefinite, solveLower, solveLowerTransposed } from './linear-algebra';

/** A covariance C, of which only these are asked. */
export interface Noise {
  /** aᵀC⁻¹b for every pair of the columns, columns × columns */
  gram(columns: readonly Float64Array[]): Float64Array;
  /** rᵀC⁻¹r */
  quadraticForm(residual: Float64Array): number;
  /** ln det C */
  logDeterminant(): number;
}

/** What one choice of φ makes of the points. */
export interface Trial {
  /** measured less expected, m numbers */
  residual: Float64Array;
  /** ∂(expected)/∂φ, one column of m numbers for each φ */
  jacobian: Float64Array[];
  /** C at this φ; asked for only where a step has come to rest */
  noise: () => Noise;
}

export interface LeastSquaresProblem {
  start: readonly number[];
  /** longest step in each φ: keeps far-off points from throwing the fit out of reach */
  longestStep: readonly number[];
  at: (values: readonly number[]) => Trial;
}

export interface LeastSquaresFit {
  values: number[];
  /** standard uncertainties, > 0 */
  u: number[];
  /** rᵀC⁻¹r at the fit */
  chiSquared: number;
  /** ln det C at the fit */
  logDeterminant: number;
}

const MOST_STEPS = 40;
const MOST_HALVINGS = 12;
/** A step this short, in standard uncertainties, is rest. */
const REST = 1e-6;
/** Longest corrected step, in Newton steps. */
const LONGEST_CORRECTION = 3;
/** Steps shorter than this, in standard uncertainties, may rise at the C that they leave, for the C that they reach. */
const UNCHECKED = 1;

/** The fit, or null where none is found: no rest, or numbers that the points do not determine. */
export function fitLeastSquares(problem: LeastSquaresProblem): LeastSquaresFit | null {
  let values: readonly number[] = problem.start;
  let trial = problem.at(values);
  let before: Visit | null = null;
  for (let iteration = 0; iteration < MOST_STEPS; iteration++) {
    const noise = trial.noise();
    const size = values.length;
    const gram = noise.gram([...trial.jacobian, trial.residual]);
    const newton = solveNormalEquations(gram, size);
    if (newton === null) return null;
    const chiSquared = gram[size * (size + 1) + size];
    if (newton.length <= REST) {
      return { values: [...values], u: newton.u, chiSquared, logDeterminant: noise.logDeterminant() };
    }
    const here: Visit = { values, step: newton.step };
    const corrected = correctStep(here, before, gram);
    const next =
      newton.length < UNCHECKED
        ? stepAlong(problem, values, corrected, 1)
        : stepDown(problem, values, corrected, noise, chiSquared);
    if (next === null) return null;
    before = here;
    ({ values, trial } = next);
  }
  return null;
}

/** Where the fit was, and the Newton step that it found there. */
interface Visit {
  values: readonly number[];
  step: Float64Array;
}

/** The Newton step, corrected by how the last one changed it; lengths are in standard uncertainties. */
function correctStep(here: Visit, before: Visit | null, gram: Float64Array): Float64Array {
  if (before === null) return here.step;
  const change = here.step.map((value, j) => value - before.step[j]);
  const square = innerProduct(gram, change, change);
  if (!(square > 0)) return here.step;
  const share = innerProduct(gram, change, here.step) / square;
  const corrected = here.step.map(
    (value, j) => value - share * (here.values[j] - before.values[j] + change[j]),
  );
  const forward = innerProduct(gram, corrected, here.step);
  const most = LONGEST_CORRECTION ** 2 * innerProduct(gram, here.step, here.step);
  const usable = forward > 0 && innerProduct(gram, corrected, corrected) <= most;
  return usable ? corrected : here.step;
}

/** aᵀN b, N being the leading part of the gram of [J r]. */
function innerProduct(gram: Float64Array, a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let j = 0; j < a.length; j++) {
    for (let k = 0; k < b.length; k++) sum += a[j] * gram[j * (a.length + 1) + k] * b[k];
  }
  return sum;
}

interface NewtonStep {
  step: Float64Array;
  u: number[];
  /** √(bᵀN⁻¹b): the step in standard uncertainties */
  length: number;
}

/** Solves N·step = b, N and b being parts of the gram of [J r]; null where N is singular. */
function solveNormalEquations(gram: Float64Array, size: number): NewtonStep | null {
  const width = size + 1;
  const scale = Array.from({ length: size }, (_, j) => Math.sqrt(gram[j * width + j]));
  if (!scale.every((value) => value > 0 && value < Number.POSITIVE_INFINITY)) return null;
  const scaled = new Float64Array(size * size);
  for (let j = 0; j < size; j++) {
    for (let k = 0; k < size; k++) scaled[j * size + k] = gram[j * width + k] / (scale[j] * scale[k]);
  }
  const { factor } = choleskySemidefinite(scaled, size);
  const step = Float64Array.from(scale, (value, j) => gram[j * width + size] / value);
  const u: number[] = [];
  for (let j = 0; j < size; j++) {
    if (factor[j * size + j] === 0) return null;
    const unit = new Float64Array(size);
    unit[j] = 1;
    solveLower(factor, size, unit);
    u.push(norm(unit) / scale[j]);
  }
  solveLower(factor, size, step);
  const length = norm(step);
  if (!Number.isFinite(length)) return null;
  solveLowerTransposed(factor, size, step);
  for (let j = 0; j < size; j++) step[j] /= scale[j];
  return { step, u, length };
}

/** The step, bounded and halved until it goes down at the C that it starts from; null where it never does. */
function stepDown(
  problem: LeastSquaresProblem,
  from: readonly number[],
  step: Float64Array,
  noise: Noise,
  chiSquared: number,
): { values: number[]; trial: Trial } | null {
  let share = 1;
  for (let halving = 0; halving < MOST_HALVINGS; halving++) {
    const next = stepAlong(problem, from, step, share);
    if (noise.quadraticForm(next.trial.residual) <= chiSquared) return next;
    share /= 2;
  }
  return null;
}

function stepAlong(
  { longestStep, at }: LeastSquaresProblem,
  from: readonly number[],
  step: Float64Array,
  share: number,
): { values: number[]; trial: Trial } {
  let bounded = share;
  for (let j = 0; j < step.length; j++)
    bounded = Math.min(bounded, (share * longestStep[j]) / Math.abs(step[j]));
  const values = from.map((value, j) => value + bounded * step[j]);
  return { values, trial: at(values) };
}

function norm(v: Float64Array): number {
  let sum = 0;
  for (const value of v) sum += value * value;
  return Math.sqrt(sum);
}
