/**
 * Tail probabilities of the normal, Student, χ² and F distributions. Each is computed as a tail and never
 * as 1 − cdf, so that a probability of 1e-200 is still one.
 *
 * Source: Abramowitz & Stegun, Handbook of Mathematical Functions, 26.2.29, 26.5.27, 26.4.19 and 26.6.2;
 * the incomplete gamma and beta functions are those of @stdlib.
 */
import betainc from '@stdlib/math-base-special-betainc';
import erfc from '@stdlib/math-base-special-erfc';
import gammainc from '@stdlib/math-base-special-gammainc';
import { gammaTail, LARGE_SHAPE } from './gamma-tail';

/** Beyond this many degrees of freedom Student and F are their limits to better than 1e-12. */
const ENDLESS_DEGREES_OF_FREEDOM = 1e13;

/** P(|Z| > |z|) of the standard normal. */
export function normalTwoSided(z: number): number {
  return erfc(Math.abs(z) * Math.SQRT1_2);
}

/** P(|T| > |t|) of Student's t with `nu` > 0 degrees of freedom, not necessarily a whole number. */
export function studentTwoSided(t: number, nu: number): number {
  if (t === 0) return 1;
  if (!(nu < ENDLESS_DEGREES_OF_FREEDOM)) return normalTwoSided(t);
  return betaTail(nu / 2, 0.5, (t * t) / nu);
}

/** P(X > x) of χ² with `degreesOfFreedom` ≥ 1, for x ≥ 0. */
export function chiSquaredUpper(x: number, degreesOfFreedom: number): number {
  if (x <= 0) return 1;
  const shape = degreesOfFreedom / 2;
  if (shape >= LARGE_SHAPE) return gammaTail(shape, x / 2);
  return gammainc(x / 2, shape, true, true);
}

/** P(X > x) of F with m ≥ 1 and nu > 0 degrees of freedom, for x ≥ 0. */
export function fisherUpper(x: number, m: number, nu: number): number {
  if (x <= 0) return 1;
  if (!(nu < ENDLESS_DEGREES_OF_FREEDOM)) return chiSquaredUpper(m * x, m);
  return betaTail(nu / 2, m / 2, (m * x) / nu);
}

/** I_{1/(1+odds)}(a, b), by whichever side of the incomplete beta function keeps its digits. */
function betaTail(a: number, b: number, odds: number): number {
  if (odds === Number.POSITIVE_INFINITY) return 0;
  return odds < 1 ? betainc(odds / (1 + odds), b, a, true, true) : betainc(1 / (1 + odds), a, b, true, false);
}
