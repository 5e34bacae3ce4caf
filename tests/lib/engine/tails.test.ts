/**
 * Tails where library routines lose their digits: thousands of degrees of freedom, and values far out. The figures
 * are computed with 40 digits (mpmath 1.2.1: gammainc(m/2, x/2, inf, regularized=True)). Tolerance 1e-11.
 */
import gammainc from '@stdlib/math-base-special-gammainc';
import { describe, expect, it } from 'vitest';
import { gammaTail } from '@/lib/engine/gamma-tail';
import { chiSquaredUpper, fisherUpper, normalTwoSided, studentTwoSided } from '@/lib/engine/tails';
import { expectClose } from '@/tests/support/close-to';

describe('χ² with many degrees of freedom', () => {
  it.each([
    [2000, 2000, 0.4957947558197845],
    [2001, 2001, 0.4957958067483724],
    [2200, 2001, 0.001115903432394033],
    [1800, 2001, 0.9994805166540652],
    [20000, 20000, 0.4986701916600448],
    [20800, 20000, 0.0000388801705739882],
    [19000, 20000, 0.9999998137545348],
    [25000, 20000, 3.681519716987669e-119],
    [2100, 399, 2.195819643662419e-228],
    [2001, 300, 1.02296082684623e-248],
    [1999, 399, 1.0700593812752e-210],
  ])('P(χ² > %d) with %d', (x, m, wanted) => {
    expectClose(chiSquaredUpper(x, m), wanted, 1e-11, 'tail', 0);
  });
  it('agrees with the library’s routine where that one is good', () => {
    for (const shape of [30, 45.5, 80, 150]) {
      for (const share of [0.6, 0.9, 1, 1.1, 1.5, 2]) {
        const x = shape * share;
        expectClose(gammaTail(shape, x), gammainc(x, shape, true, true), 1e-11, `Q(${shape}, ${x})`, 0);
      }
    }
  });
  it('is 0 and not NaN where no double holds it, and falls all the way there', () => {
    expect(chiSquaredUpper(1e6, 12)).toBe(0);
    expect(chiSquaredUpper(1e7, 20_000)).toBe(0);
    expect(chiSquaredUpper(11_732.8, 56)).toBe(0);
    expect(chiSquaredUpper(1400, 56)).toBeGreaterThan(chiSquaredUpper(1450, 56));
  });
});

describe('limits of Student and F', () => {
  it('are the normal and χ²', () => {
    expectClose(studentTwoSided(2.5, 1e12), normalTwoSided(2.5), 1e-10, 't', 0);
    expectClose(fisherUpper(1.1, 2001, 1e12), chiSquaredUpper(2201.1, 2001), 1e-7, 'F', 0);
  });
});
