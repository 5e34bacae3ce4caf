/** What must hold of any valid dataset, whatever its numbers. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assess } from '@/lib/engine/assess';
import type { DatasetInput } from '@/lib/engine/inputs';
import { logistic } from '@/lib/engine/logistic';
import {
  CONCENTRATION_UNITS,
  concentrationKind,
  convertConcentration,
  ENERGY_UNITS,
  energyFromKT,
  energyToKT,
} from '@/lib/engine/units';
import { arbitraryDataset } from '@/tests/support/arbitrary-dataset';
import { expectClose } from '@/tests/support/close-to';
import { numbersOf } from '@/tests/support/small-dataset';

const anyNumber = fc.double({ min: -1e6, max: 1e6, noNaN: true });

describe('properties', () => {
  it('p is monotone in f and stays within 0 and 1', () => {
    fc.assert(
      fc.property(anyNumber, anyNumber, (a, b) => {
        const [low, high] = a < b ? [a, b] : [b, a];
        expect(logistic(low)).toBeLessThanOrEqual(logistic(high));
        expect(logistic(low)).toBeGreaterThanOrEqual(0);
        expect(logistic(high)).toBeLessThanOrEqual(1);
      }),
    );
  });

  it('energies go to every unit and back', () => {
    const unit = fc.constantFrom(...ENERGY_UNITS);
    fc.assert(
      fc.property(anyNumber, unit, fc.double({ min: 200, max: 450, noNaN: true }), (value, to, kelvin) => {
        expectClose(energyToKT(energyFromKT(value, to, kelvin), to, kelvin), value, 1e-15);
      }),
    );
  });

  it('concentrations go to every unit of their kind and back, and to no other', () => {
    const unit = fc.constantFrom(...CONCENTRATION_UNITS);
    fc.assert(
      fc.property(fc.double({ min: 1e-12, max: 1e6, noNaN: true }), unit, unit, (value, from, to) => {
        const there = convertConcentration(value, from, to);
        if (concentrationKind(from) !== concentrationKind(to)) expect(there).toBeNull();
        else expectClose(convertConcentration(there ?? 0, to, from), value, 1e-15, 'round trip', 0);
      }),
    );
  });

  it('no NaN or Infinity leaves the engine', () => {
    fc.assert(
      fc.property(arbitraryDataset, (dataset) => {
        for (const [path, value] of numbersOf(assess(dataset))) {
          if (!Number.isFinite(value)) throw new Error(`${path} is ${value}`);
        }
      }),
      { numRuns: 600 },
    );
  });

  it('the order of points and series changes nothing but the order', () => {
    fc.assert(
      fc.property(arbitraryDataset, (dataset) => {
        const turned: DatasetInput = {
          ...dataset,
          series: dataset.series.map((one) => ({ ...one, points: [...one.points].reverse() })).reverse(),
        };
        const before = assess(dataset);
        const after = assess(turned);
        expectClose(after.summary.chiSquared, before.summary.chiSquared, 1e-9, 'Q');
        expect(after.summary.onCurve).toBe(before.summary.onCurve);
        before.series.forEach((series, s) => {
          const mirrored = after.series[after.series.length - 1 - s];
          expect(mirrored.derived).toEqual(series.derived);
          series.points.forEach((point, i) => {
            const { index: _, q, pValue, ...rest } = mirrored.points[series.points.length - 1 - i];
            expect(rest.energy).toBe(point.energy);
            expectClose(rest.activityU, point.activityU, 1e-12, 'activityU', 1e-9);
            expectClose(q, point.q, 1e-9, 'q');
            expectClose(pValue, point.pValue, 1e-9, 'p');
          });
        });
      }),
    );
  });

  it('scaling every concentration and constant together changes no energy', () => {
    fc.assert(
      fc.property(arbitraryDataset, fc.constantFrom(1e-3, 7, 1e3), (dataset, factor) => {
        const before = assess(dataset);
        const after = assess(scaleConcentrations(dataset, factor));
        before.series.forEach((series, s) => {
          series.points.forEach((point, i) => {
            const { energy, expectedU } = after.series[s].points[i];
            expectClose(energy, point.energy, 1e-11, 'energy', 100);
            expectClose(expectedU, point.expectedU, 1e-9, 'expectedU');
          });
        });
      }),
    );
  });

  it('splitting a site class in two alike changes no energy', () => {
    fc.assert(
      fc.property(arbitraryDataset, fc.double({ min: 0.1, max: 0.9, noNaN: true }), (dataset, share) => {
        const before = assess(dataset);
        const after = assess(splitFirstClass(dataset, share));
        before.series.forEach((series, s) => {
          expectClose(after.series[s].sites, series.sites, 1e-12, 'sites', 0);
          expectClose(after.series[s].gapKT, series.gapKT, 1e-12, 'gap');
          series.points.forEach((point, i) => {
            expectClose(after.series[s].points[i].energy, point.energy, 1e-11, 'energy', 100);
          });
        });
      }),
    );
  });
});

function scaleConcentrations(dataset: DatasetInput, factor: number): DatasetInput {
  const scale = <T extends { value: number; u?: number }>(constant: T | null): T | null =>
    constant && { ...constant, value: constant.value * factor, u: (constant.u ?? 0) * factor };
  return {
    ...dataset,
    series: dataset.series.map((series) => ({
      ...series,
      parameters: {
        ...series.parameters,
        siteClasses: series.parameters.siteClasses.map((siteClass) => ({
          ...siteClass,
          binding: siteClass.binding.map((binding) => ({
            ...binding,
            inactive: scale(binding.inactive),
            active: scale(binding.active),
          })),
        })),
      },
      points: series.points.map((point) => ({
        ...point,
        ligands: Object.fromEntries(Object.entries(point.ligands).map(([id, c]) => [id, c * factor])),
      })),
    })),
  };
}

function splitFirstClass(dataset: DatasetInput, share: number): DatasetInput {
  return {
    ...dataset,
    series: dataset.series.map((series) => {
      const [first, ...others] = series.parameters.siteClasses;
      const part = (id: string, fraction: number) => ({
        ...first,
        id,
        sites: { value: first.sites.value * fraction },
      });
      return {
        ...series,
        parameters: {
          ...series.parameters,
          correlations: [],
          siteClasses: [part(first.id, share), part(`${first.id}-b`, 1 - share), ...others],
        },
      };
    }),
  };
}
