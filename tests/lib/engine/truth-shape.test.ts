/**
 * Whether the figures mean what they say: series are simulated whose true parameters and concentrations are
 * drawn from what is stated, and flags, p of Q and the alternatives of shape are counted. The model floor u_0 is
 * 0 here, since the simulated curve is exact. `npm run bench` counts ten times as many.
 */
import { describe, expect, it } from 'vitest';
import type { ShapeKind } from '@/lib/engine/assessment';
import { kolmogorovTail, uniformityPValue } from '@/tests/support/kolmogorov-smirnov';
import { correctSeries, PLANTED, plantedShape } from '@/tests/support/shape-truth';

const SERIES = 2000;
const PLANTED_SERIES = 500;

const report = (line: string) => console.info(line);

describe('the Kolmogorov–Smirnov tail', () => {
  it.each([
    // The critical values that every table of the limiting distribution has (from memory).
    [1.22385, 0.1],
    [1.3581, 0.05],
    [1.62762, 0.01],
  ])('at %f is %f', (lambda, tail) => {
    expect(Math.abs(kolmogorovTail(lambda) - tail)).toBeLessThan(1e-5);
  });

  it('rejects what is not uniform', () => {
    const even = Array.from({ length: 500 }, (_, i) => (i + 0.5) / 500);
    expect(uniformityPValue(even)).toBeGreaterThan(0.999);
    expect(uniformityPValue(even.map((p) => p ** 1.3))).toBeLessThan(1e-3);
  });
});

describe.each([
  ['u stated', 1],
  ['three replicates', 3],
])('correct series of 14 points, %s', (name, replicates) => {
  const { beyondWarning, pValues, named } = correctSeries(SERIES, replicates, 12);

  it('4.55 ± 1 % of the points lie beyond the warning limit', () => {
    report(`${name}: ${(100 * beyondWarning).toFixed(2)} % of points beyond the warning limit (4.55 ± 1)`);
    expect(Math.abs(beyondWarning - 0.0455)).toBeLessThan(0.01);
  });

  it('p of Q is uniform', () => {
    const p = uniformityPValue(pValues);
    report(`${name}: p of Q uniform, Kolmogorov–Smirnov p = ${p.toPrecision(3)} (> 0.01)`);
    expect(p).toBeGreaterThan(0.01);
  });

  it('a shape is named for at most 3 %', () => {
    report(`${name}: a shape named for ${(100 * named).toFixed(2)} % (at most 3)`);
    expect(named).toBeLessThanOrEqual(0.03);
  });
});

describe('series with a shape planted', () => {
  it.each(PLANTED)('%s %o: estimate ± 2u covers the truth in 90 to 99 %', (kind: ShapeKind, bend) => {
    const { coverage, fitted, chosen } = plantedShape(kind, bend, PLANTED_SERIES, 7);
    for (const [name, share] of Object.entries(coverage)) {
      report(
        `${kind} ${JSON.stringify(bend)}: ± 2u of ${name} covers ${(100 * share).toFixed(1)} % (90 to 99), named ${kind} for ${(100 * chosen).toFixed(1)} %`,
      );
      expect(share).toBeGreaterThanOrEqual(0.9);
      expect(share).toBeLessThanOrEqual(0.99);
    }
    expect(fitted).toBeGreaterThanOrEqual(0.99);
  });
});
