/** Q of series and datasets against the dense formula rᵀC⁻¹r, C written out in full for all points. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assess } from '@/lib/engine/assess';
import { datasetQ } from '@/lib/engine/dataset-q';
import type { CorrelationInput, DatasetInput, SeriesInput } from '@/lib/engine/inputs';
import { computePointTable } from '@/lib/engine/point-table';
import type { ScoredSeries } from '@/lib/engine/q-statistic';
import { buildSeriesModel } from '@/lib/engine/series-model';
import { independentVariance } from '@/lib/engine/series-noise';
import { fisherUpper } from '@/lib/engine/tails';
import { expectClose } from '@/tests/support/close-to';

function series(id: string, gap: number, correlations: CorrelationInput[], replicated = false): SeriesInput {
  const concentrations = [0, 0.5, 2, 8, 30, 120];
  return {
    id,
    parameters: {
      origin: 'independent',
      gap: { value: gap, unit: 'kJ/mol', orientation: 'inactive-minus-active', u: 0.3 },
      siteClasses: [
        {
          id: 'main',
          sites: { value: 2, u: 0.2, sharedAs: 'sites' },
          binding: [
            {
              ligand: 'velline',
              inactive: { value: 5, unit: 'uM', u: 1, sharedAs: 'inactive' },
              active: { value: 200, unit: 'uM', u: 20 },
            },
          ],
        },
      ],
      correlations,
    },
    points: concentrations.map((c, i) => {
      const activity = 0.8 / (1 + c / 6) + 0.03 * Math.sin(7 * i + gap);
      const ligands = { velline: c };
      return replicated
        ? { ligands, replicates: [activity - 0.02, activity, activity + 0.03] }
        : { ligands, activity, u: 0.02 };
    }),
  };
}

function dataset(all: SeriesInput[], temperatureU = 1): DatasetInput {
  return {
    temperature: { value: 298.15, unit: 'K', u: temperatureU },
    ligands: [{ id: 'velline', unit: 'uM', concentration: 'free', relativeU: 0.05, stockRelativeU: 0.1 }],
    normalisation: { method: 'absolute' },
    series: all,
  };
}

function scored(document: DatasetInput): ScoredSeries[] {
  return document.series.map((one) => {
    const model = buildSeriesModel(document, one);
    return { model, table: computePointTable(document, one, model), fittedHere: false, fittedCount: 0 };
  });
}

/** C over all points, quantities with one key being one quantity, correlations between the rest as given. */
function denseCovariance(all: ScoredSeries[], correlationOf: (a: string, b: string) => number): number[][] {
  const rows = all.flatMap(({ model, table }, s) =>
    Array.from({ length: table.count }, (_, i) => {
      const columns = model.sharedKeys.length;
      const gradient = new Map<string, number>();
      model.sharedKeys.forEach((key, k) => {
        gradient.set(key ?? `own ${s} ${k}`, table.expectedGradient[i * columns + k]);
      });
      return { gradient, own: independentVariance(table)[i] };
    }),
  );
  return rows.map((a, i) =>
    rows.map((b, j) => {
      let sum = i === j ? a.own : 0;
      for (const [keyA, valueA] of a.gradient) {
        for (const [keyB, valueB] of b.gradient)
          sum += valueA * valueB * (keyA === keyB ? 1 : correlationOf(keyA, keyB));
      }
      return sum;
    }),
  );
}

/** Solves by Gaussian elimination with pivoting: independent of the code under test. */
function solve(matrix: number[][], b: number[]): number[] {
  const a = matrix.map((row, i) => [...row, b[i]]);
  for (let k = 0; k < a.length; k++) {
    const pivot = a
      .slice(k)
      .reduce((best, row, i) => (Math.abs(row[k]) > Math.abs(a[best][k]) ? i + k : best), k);
    [a[k], a[pivot]] = [a[pivot], a[k]];
    for (let i = 0; i < a.length; i++) {
      if (i === k) continue;
      const factor = a[i][k] / a[k][k];
      for (let j = k; j <= a.length; j++) a[i][j] -= factor * a[k][j];
    }
  }
  return a.map((row, i) => row[a.length] / row[i]);
}

function quadratic(matrix: number[][], r: number[]): number {
  return solve(matrix, r).reduce((sum, x, i) => sum + x * r[i], 0);
}

const residuals = (all: ScoredSeries[]) => all.flatMap(({ table }) => [...table.residual]);

describe('Q against the dense formula', () => {
  const none = () => 0;

  it('one series', () => {
    const document = dataset([series('a', 4, [])]);
    const all = scored(document);
    const wanted = quadratic(denseCovariance(all, none), residuals(all));
    expectClose(assess(document).series[0].chiSquared, wanted, 1e-11);
    expectClose(assess(document).summary.chiSquared, wanted, 1e-11);
  });

  it('three series that share sites, a constant, the stock and the temperature', () => {
    const all = scored(dataset([series('a', 4, []), series('b', 2, []), series('c', -1, [])]));
    const wanted = quadratic(denseCovariance(all, none), residuals(all));
    expectClose(datasetQ(all).chiSquared, wanted, 1e-11);
    const apart = all.reduce((sum, one) => sum + datasetQ([one]).chiSquared, 0);
    expect(Math.abs(apart - wanted)).toBeGreaterThan(1e-3 * wanted);
  });

  it('a correlation between two shared quantities', () => {
    const stated = [{ a: 'main/sites', b: 'main/velline/inactive', r: 0.8 }];
    const all = scored(dataset([series('a', 4, stated), series('b', 2, stated)]));
    const keys = ['label sites', 'label inactive'];
    const wanted = quadratic(
      denseCovariance(all, (a, b) => (keys.includes(a) && keys.includes(b) ? 0.8 : 0)),
      residuals(all),
    );
    expectClose(datasetQ(all).chiSquared, wanted, 1e-11);
  });

  it('a correlation between an own and a shared quantity', () => {
    const all = scored(
      dataset([series('a', 4, [{ a: 'gap', b: 'main/velline/inactive', r: -0.6 }]), series('b', 2, [])]),
    );
    const wanted = quadratic(
      denseCovariance(all, (a, b) =>
        [a, b].includes('own 0 0') && [a, b].includes('label inactive') ? -0.6 : 0,
      ),
      residuals(all),
    );
    expectClose(datasetQ(all).chiSquared, wanted, 1e-11);
  });

  it('own quantities of two series that each go with a shared one go with each other through it', () => {
    const stated = [{ a: 'gap', b: 'main/velline/inactive', r: -0.9 }];
    const all = scored(dataset([series('a', 4, stated), series('b', 2, stated)]));
    const gaps = ['own 0 0', 'own 1 0'];
    const wanted = quadratic(
      denseCovariance(all, (a, b) => {
        if (gaps.includes(a) && gaps.includes(b)) return 0.81;
        return (gaps.includes(a) && b === 'label inactive') || (gaps.includes(b) && a === 'label inactive')
          ? -0.9
          : 0;
      }),
      residuals(all),
    );
    expectClose(datasetQ(all).chiSquared, wanted, 1e-10);
  });

  it('replicates refer Q/m to F with the degrees of freedom of their pooled spread', () => {
    const all = scored(dataset([series('a', 4, [], true), series('b', 2, [])]));
    const dense = denseCovariance(all, none);
    const points = dense.length;
    let t = 0;
    for (let i = 0; i < all[0].table.count; i++) {
      const unit = Array.from({ length: points }, (_, j) => (i === j ? 1 : 0));
      t += (solve(dense, unit)[i] * all[0].table.activityU[i] ** 2) / points;
    }
    const nu = all[0].table.degreesOfFreedom / t ** 2;
    expect(all[0].table.degreesOfFreedom).toBe(12);
    const { pValue, chiSquared } = datasetQ(all);
    expectClose(pValue, fisherUpper(chiSquared / points, points, nu), 1e-10);
  });

  it('is never negative and never above the sum of squares of an uncorrelated reading', () => {
    fc.assert(
      fc.property(fc.double({ min: -10, max: 10, noNaN: true }), (gap) => {
        const all = scored(dataset([series('a', gap, []), series('b', 1, [])]));
        const plain = all.reduce((sum, { table }) => {
          const d = independentVariance(table);
          return sum + table.residual.reduce((inner, r, i) => inner + (r * r) / d[i], 0);
        }, 0);
        const { chiSquared } = datasetQ(all);
        expect(chiSquared).toBeGreaterThanOrEqual(0);
        expect(chiSquared).toBeLessThanOrEqual(plain * (1 + 1e-12));
      }),
    );
  });
});

describe('series that cannot be tested', () => {
  const fitted = (fittedCount: number): DatasetInput => {
    const one = series('a', 4, []);
    return dataset([{ ...one, parameters: { ...one.parameters, origin: 'fitted-here', fittedCount } }]);
  };
  it('a fit to its own points loses its degrees of freedom and counts no model uncertainty', () => {
    const { series: assessed, summary } = assess(fitted(4));
    expect(assessed[0].degreesOfFreedom).toBe(2);
    const plain = assessed[0].points.reduce((sum, { residual }) => sum + residual ** 2, 0);
    expect(assessed[0].chiSquared).toBeGreaterThan(plain);
    expect(summary.degreesOfFreedom).toBe(2);
    assessed[0].points.forEach(({ activityU, residualU }) => {
      expectClose(residualU, Math.hypot(activityU, 0.01), 1e-14);
    });
  });
  it('no degrees of freedom, no p', () => {
    const { series: assessed, summary } = assess(fitted(6));
    expect(assessed[0]).toMatchObject({ degreesOfFreedom: 0, pValue: null });
    expect(summary.pValue).toBeNull();
    expect(assessed[0].notes.map(({ code }) => code)).toContain('no-degrees-of-freedom');
  });
  it('an assumed uncertainty gives no p to its series and its dataset, and to no other series', () => {
    const bare = series('a', 4, []);
    bare.points[2] = { ligands: { velline: 2 }, activity: 0.5 };
    const { series: assessed, summary } = assess(dataset([bare, series('b', 2, [])]));
    expect(assessed[0].pValue).toBeNull();
    expect(assessed[1].pValue).not.toBeNull();
    expect(summary.pValue).toBeNull();
    expect(assessed[0].points[2]).toMatchObject({ uncertainty: 'assumed', activityU: 0.02 });
    expect(assessed[0].notes.find(({ code }) => code === 'assumed-uncertainty')?.points).toEqual([2]);
  });
});
