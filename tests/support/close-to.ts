import { expect } from 'vitest';

/**
 * Expects agreement within a relative tolerance, or the same tolerance absolute near zero.
 *
 * @param floor magnitude below which the tolerance is taken of the floor instead of the value
 */
export function expectClose(
  actual: number | null,
  expected: number,
  tolerance: number,
  name = 'value',
  floor = 1,
): void {
  expect(actual, name).not.toBeNull();
  const allowed = tolerance * Math.max(Math.abs(expected), floor);
  const difference = Math.abs((actual ?? Number.NaN) - expected);
  expect(difference <= allowed, `${name}: ${actual} is not within ${allowed} of ${expected}`).toBe(true);
}
