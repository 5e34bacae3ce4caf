/**
 * The step of Levenberg and Marquardt within a trust region: of all steps p with |D·p| ≤ Δ the one that makes
 * |r + J·p| smallest. The damping λ ≥ 0 that belongs to Δ is found from the singular values of J·D⁻¹, where its
 * equation is a sum of n terms.
 *
 * Source: Moré, in: Numerical Analysis, Dundee 1977, LNM 630 (Springer), 105 (1978), sections 2 and 5; Nocedal & Wright, Numerical
 * Optimization, 2nd ed., section 10.3 and algorithm 4.3.
 */
import { normOf, type SingularFactors, singularFactors, type Triangle } from './orthogonal-factors';

/** How far |D·p| may miss Δ, relative. */
const RADIUS_TOLERANCE = 0.1;
const MOST_DAMPING_STEPS = 60;

/** A singular value this far below the largest is rounding. */
const RANK_FLOOR = 1e-14;

export interface Subproblem {
  /** D, n numbers > 0 */
  scale: Float64Array;
  singular: SingularFactors;
  /** u_kᵀ·Qᵀr, n numbers; 0 where s_k is rounding */
  projected: Float64Array;
}

export interface Step {
  /** p */
  step: Float64Array;
  /** λ; 0: the whole Gauss–Newton step lies within the region */
  damping: number;
}

/** Prepares J·D⁻¹ of the triangle of J for steps of any radius. */
export function prepareSubproblem(triangle: Triangle, scale: Float64Array): Subproblem {
  const n = scale.length;
  const singular = singularFactors(
    triangle.factor.map((value, at) => value / scale[at % n]),
    n,
  );
  const largest = singular.values.reduce((most, value) => Math.max(most, value), 0);
  const projected = singular.values.map((value, k) => {
    if (value <= RANK_FLOOR * largest) return 0;
    let product = 0;
    for (let i = 0; i < n; i++) product += (singular.scaledLeft[k][i] / value) * triangle.rotated[i];
    return product;
  });
  return { scale, singular, projected };
}

/** The step within |D·p| ≤ `radius` (> 0). */
export function trustRegionStep(subproblem: Subproblem, radius: number): Step {
  const damping = dampingFor(subproblem, radius);
  const { scale, singular, projected } = subproblem;
  const step = new Float64Array(scale.length);
  projected.forEach((g, k) => {
    if (g === 0) return;
    const coefficient = dampedOf(singular.values[k], g, damping);
    for (let j = 0; j < step.length; j++) step[j] -= (coefficient * singular.right[k][j]) / scale[j];
  });
  return { step, damping };
}

/** |r|² − |r + J·p|² of the linear model, without the difference of two large numbers. */
export function predictedReduction(triangle: Triangle, step: Float64Array): number {
  const n = step.length;
  let reduction = 0;
  for (let i = 0; i < n; i++) {
    let change = 0;
    for (let j = i; j < n; j++) change += triangle.factor[i * n + j] * step[j];
    reduction -= change * (2 * triangle.rotated[i] + change);
  }
  return reduction;
}

/** |D·p| */
export function scaledLength(step: Float64Array, scale: Float64Array): number {
  return normOf(step.map((value, j) => value * scale[j]));
}

/** λ with |D·p(λ)| = Δ within a tenth; 0 where the undamped step is that short already. */
function dampingFor({ singular, projected }: Subproblem, radius: number): number {
  const at = (damping: number) => lengthAndSlope(singular.values, projected, damping);
  if (at(0).length <= (1 + RADIUS_TOLERANCE) * radius) return 0;
  let lower = 0;
  let upper = normOf(projected.map((g, k) => g * singular.values[k])) / radius;
  let damping = Math.min(upper, at(0).newton(radius, 0));
  for (let i = 0; i < MOST_DAMPING_STEPS; i++) {
    if (!(damping > lower && damping < upper)) damping = Math.max(upper * 1e-3, Math.sqrt(lower * upper));
    const { length, newton } = at(damping);
    if (Math.abs(length - radius) <= RADIUS_TOLERANCE * radius) break;
    if (length > radius) lower = damping;
    else upper = damping;
    damping = newton(radius, damping);
  }
  return damping;
}

/** |D·p(λ)| and Newton's next λ on 1/|D·p(λ)| = 1/Δ, which is nearly straight in λ (Moré's section 5). */
function lengthAndSlope(values: Float64Array, projected: Float64Array, damping: number) {
  const damped = projected.map((g, k) => dampedOf(values[k], g, damping));
  const length = normOf(damped);
  let curvature = 0;
  damped.forEach((value, k) => {
    if (value !== 0) curvature += (value / length) ** 2 / (values[k] ** 2 + damping);
  });
  const newton = (radius: number, from: number) => from + (length - radius) / (radius * curvature);
  return { length, newton };
}

function dampedOf(value: number, g: number, damping: number): number {
  if (g === 0) return 0;
  return damping === 0 ? g / value : (value * g) / (value * value + damping);
}
