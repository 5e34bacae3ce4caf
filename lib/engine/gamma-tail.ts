/**
 * Q(a, x) = Γ(a, x)/Γ(a), the upper tail of the gamma distribution, for large a: what χ² with thousands of
 * degrees of freedom needs, where library routines switch to expansions of a few digits.
 *
 *     Q = 1 − D Σ_k x^k/((a+1)…(a+k))          for x < a + 1
 *     Q = a D / (x + 1 − a − 1(1 − a)/(x + 3 − a − …))   else
 *     D = x^a e^(−x)/Γ(a + 1) = e^(a(ln(1+t) − t)) / (√(2πa) Γ*(a)),   t = x/a − 1
 *
 * Source: Abramowitz & Stegun, 6.5.29, 6.5.31 and 6.1.37; Gil, Segura & Temme, SIAM J. Sci. Comput. 34, A2965
 * (2012) for the form of D.
 */

/** From here on the routine below is used; it needs a large for the series of Γ*. */
export const LARGE_SHAPE = 30;

const MOST_TERMS = 200_000;
const TINY = 1e-300;

/**
 * @param a shape, ≥ LARGE_SHAPE
 * @param x > 0
 * @returns Q(a, x), relative error below 1e-11; 0 where it is below the smallest double
 */
export function gammaTail(a: number, x: number): number {
  const t = (x - a) / a;
  const exponent = a * (Math.log1p(t) - t);
  const density = Math.exp(exponent) / (Math.sqrt(2 * Math.PI * a) * stirlingRatio(a));
  return x < a + 1 ? 1 - density * lowerSeries(a, x) : (a * density) / upperFraction(a, x);
}

/** Γ*(a) = Γ(a) e^a a^(1/2 − a)/√(2π), by Stirling's series; the next term is below 1e-13 for a ≥ 30. */
function stirlingRatio(a: number): number {
  const b = 1 / a;
  return (
    1 + b * (1 / 12 + b * (1 / 288 + b * (-139 / 51840 + b * (-571 / 2488320 + (b * 163879) / 209018880))))
  );
}

function lowerSeries(a: number, x: number): number {
  let sum = 1;
  let term = 1;
  for (let k = 1; k < MOST_TERMS; k++) {
    term *= x / (a + k);
    sum += term;
    if (term < sum * Number.EPSILON) break;
  }
  return sum;
}

/** The continued fraction from the front (modified Lentz). */
function upperFraction(a: number, x: number): number {
  let b = x + 1 - a;
  let f = b;
  let c = b;
  let d = 0;
  for (let k = 1; k < MOST_TERMS; k++) {
    const numerator = -k * (k - a);
    b += 2;
    d = b + numerator * d;
    if (Math.abs(d) < TINY) d = TINY;
    c = b + numerator / c;
    if (Math.abs(c) < TINY) c = TINY;
    d = 1 / d;
    const delta = c * d;
    f *= delta;
    if (Math.abs(delta - 1) < Number.EPSILON) break;
  }
  return f;
}
