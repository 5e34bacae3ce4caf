/**
 * The engine against the same equations computed with 50 digits (mpmath 1.3.0). Tolerance 1e-12 relative,
 * 1e-12 absolute near zero, 1e-9 for p: what a double can promise after sums of a few dozen terms.
 */
import { describe, expect, it } from 'vitest';
import { assess } from '@/lib/engine/assess';
import type { AssessedPoint } from '@/lib/engine/assessment';
import type { DatasetInput } from '@/lib/engine/inputs';
import vectors from '@/tests/reference/engine-vectors.json';
import { expectClose } from '@/tests/support/close-to';

type ExpectedPoint = Record<Exclude<keyof AssessedPoint, 'index' | 'q' | 'flag' | 'uncertainty'>, number> & {
  flag: string;
};
interface ExpectedSeries {
  chiSquared: number;
  degreesOfFreedom: number;
  pValue: number;
  points: ExpectedPoint[];
}

describe.each(vectors.cases)('reference case $name', ({ document, expected }) => {
  const assessment = assess(document as unknown as DatasetInput);
  const expectedSeries = expected as unknown as Record<string, ExpectedSeries>;

  it.each(assessment.series.map((series) => [series.id, series] as const))(
    'points of series %s',
    (id, series) => {
      const wanted = expectedSeries[id].points;
      expect(series.points).toHaveLength(wanted.length);
      wanted.forEach((point, i) => {
        const { flag, ...numbers } = point;
        expect(series.points[i].flag).toBe(flag);
        for (const [name, value] of Object.entries(numbers)) {
          const actual = series.points[i][name as keyof typeof numbers];
          expectClose(actual, value, name === 'pValue' ? 1e-9 : 1e-12, `${id}/${i}/${name}`);
        }
      });
    },
  );

  it.each(assessment.series.map((series) => [series.id, series] as const))('Q of series %s', (id, series) => {
    const wanted = expectedSeries[id];
    expect(series.degreesOfFreedom).toBe(wanted.degreesOfFreedom);
    expectClose(series.chiSquared, wanted.chiSquared, 1e-12, 'chiSquared');
    expectClose(series.pValue, wanted.pValue, 1e-9, 'pValue');
  });
});
