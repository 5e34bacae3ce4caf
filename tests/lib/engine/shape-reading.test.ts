import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assess } from '@/lib/engine/assess';
import type { ShapeEstimateName } from '@/lib/engine/assessment';
import type { DatasetInput, SeriesInput } from '@/lib/engine/inputs';
import { predictEnergies } from '@/lib/engine/predict-energies';
import { applyShape } from '@/lib/engine/shape-reading';
import { arbitraryDataset } from '@/tests/support/arbitrary-dataset';
import { datasetOf, pointsAt, siteClass } from '@/tests/support/small-dataset';

type Bend = Partial<Record<ShapeEstimateName, number>>;

const estimatesOf = (bend: Bend) =>
  Object.entries(bend).map(([name, value]) => ({ name: name as ShapeEstimateName, value }));

function reread(dataset: DatasetInput, bend: Bend): DatasetInput {
  return { ...dataset, series: dataset.series.map((one) => applyShape(dataset, one, estimatesOf(bend))) };
}

/** f of the stated parameters at `stock` times the concentrations. */
function statedEnergies(dataset: DatasetInput, series: SeriesInput, stock = 1): number[] {
  const points = series.points.map(({ ligands, modulators }) => ({
    ligands: Object.fromEntries(Object.entries(ligands).map(([id, c]) => [id, c * stock])),
    modulators,
  }));
  return [...predictEnergies(dataset, series, points)];
}

/** Sum of the sizes of what makes up f: near f = 0 rounding is that of the terms, not of their sum. */
function sizeOf({ parameters }: SeriesInput, energy: number): number {
  const sites = parameters.siteClasses.reduce((sum, { sites }) => sum + sites.value, 0);
  return 1 + 200 + 200 * sites + Math.abs(energy);
}

const bends = fc.record(
  {
    offset: fc.double({ min: -20, max: 20, noNaN: true }),
    slope: fc.double({ min: 0.2, max: 3, noNaN: true }),
    stock: fc.double({ min: 0.01, max: 100, noNaN: true }),
  },
  { requiredKeys: [] },
);

describe('a series with another shape', () => {
  it('has the energies s·f(αc) + δ, whatever its statements are stated in', () => {
    fc.assert(
      fc.property(arbitraryDataset, bends, (dataset, bend) => {
        const energies = reread(dataset, bend).series.map((one) => statedEnergies(dataset, one));
        dataset.series.forEach((series, s) => {
          statedEnergies(dataset, series, bend.stock).forEach((stated, i) => {
            const wanted = (bend.slope ?? 1) * stated + (bend.offset ?? 0);
            const allowed = 1e-12 * sizeOf(series, wanted);
            expect(Math.abs(energies[s][i] - wanted)).toBeLessThanOrEqual(allowed);
          });
        });
      }),
      { numRuns: 300 },
    );
  });

  const PLAIN = datasetOf(
    {
      gap: { value: -5.95, unit: 'kJ/mol', orientation: 'active-minus-inactive', u: 0.25 },
      siteClasses: [siteClass(6, 18, 900, { inactive: 0.06 })],
    },
    pointsAt(0, 3, 10, 30, 100),
  );

  it('is moved in the unit and the orientation of its own gap', () => {
    const [{ parameters }] = reread(PLAIN, { offset: -1.2 }).series;
    // 1.2 kT at 298.15 K are 1.2 · 8.31446261815324 · 298.15 / 1000 = 2.974748 kJ/mol, and active − inactive grows by it.
    expect(parameters.gap?.value).toBeCloseTo(-5.95 + 2.974748, 5);
    expect(parameters.gap).toMatchObject({ unit: 'kJ/mol', orientation: 'active-minus-inactive', u: 0.25 });
  });

  it('gets a gap where only gaps per site were stated', () => {
    const [first] = PLAIN.series[0].parameters.siteClasses;
    const perSite = datasetOf(
      {
        siteClasses: [
          { ...first, gapPerSite: { value: 0.4, unit: 'kT', orientation: 'inactive-minus-active' } },
        ],
      },
      pointsAt(0, 10),
    );
    const [{ parameters }] = reread(perSite, { offset: 0.7 }).series;
    expect(parameters.gap).toEqual({ value: 0.7, unit: 'kT', orientation: 'inactive-minus-active' });
  });

  it('keeps relative uncertainties where energies are scaled', () => {
    const [{ parameters }] = reread(PLAIN, { slope: 0.8 }).series;
    expect(parameters.gap?.u).toBeCloseTo(0.2, 12);
    const [{ energyU }] = assess(PLAIN).series[0].points;
    const [scaled] = assess(reread(PLAIN, { slope: 0.8 })).series[0].points;
    expect(scaled.energyU).toBeCloseTo(0.8 * energyU, 12);
  });

  it('has activities (a − B)/(A − B), with their uncertainties and replicates', () => {
    const dataset = datasetOf({ siteClasses: PLAIN.series[0].parameters.siteClasses }, [
      { ligands: { velline: 1 }, activity: 0.5, u: 0.02 },
      { ligands: { velline: 2 }, replicates: [0.3, 0.46] },
    ]);
    const [{ points }] = reread(dataset, { floor: 0.1, ceiling: 0.9 }).series;
    expect(points[0].activity).toBeCloseTo(0.5, 12);
    expect(points[0].u).toBeCloseTo(0.025, 12);
    expect(points[1].replicates?.map((value) => Number(value.toFixed(12)))).toEqual([0.25, 0.45]);
  });

  it('is the very same where nothing is changed, and never changes what it was made from', () => {
    const before = structuredClone(PLAIN);
    expect(reread(PLAIN, {})).toEqual(before);
    reread(PLAIN, { offset: 1, slope: 2, ceiling: 0.8, floor: 0.1, stock: 3 });
    expect(PLAIN).toEqual(before);
  });
});
