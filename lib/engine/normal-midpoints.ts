/** The standard normal distribution cut into slices of equal probability. */
import erfc from '@stdlib/math-base-special-erfc';

/**
 * The middle of each of `count` slices of equal probability, ascending, scaled so that their variance is 1 (the
 * middles alone miss a little of what the outermost slices hold).
 *
 * @param count at least 2
 */
export function normalMidpoints(count: number): Float64Array {
  const points = new Float64Array(count);
  let squares = 0;
  // From the middle outwards every slice is close to the one before: a few steps of Newton's method reach it.
  let x = 0;
  for (let i = Math.ceil(count / 2); i < count; i++) {
    x = normalQuantile((i + 0.5) / count, x);
    points[i] = x;
    points[count - 1 - i] = -x;
    squares += 2 * x * x;
  }
  const scale = Math.sqrt(count / squares);
  return points.map((value) => value * scale);
}

/** x with Φ(x) = p, for ½ ≤ p < 1, by Newton's method from a start at or below it. */
function normalQuantile(p: number, start: number): number {
  let x = start;
  for (let step = 0; step < 50; step++) {
    const excess = 0.5 * erfc(x * Math.SQRT1_2) - (1 - p);
    const change = (excess * Math.sqrt(2 * Math.PI)) / Math.exp((-x * x) / 2);
    x += change;
    if (Math.abs(change) < 1e-13) break;
  }
  return x;
}
