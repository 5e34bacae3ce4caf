/** When a misreading is reported, and how findings are ordered and gathered. */
import { describe, expect, it } from 'vitest';
import type { ConventionFinding } from '@/lib/engine/assessment';
import { datasetConventions, findConventions } from '@/lib/engine/conventions';
import type { DatasetInput } from '@/lib/engine/inputs';
import { computePointTable } from '@/lib/engine/point-table';
import { type ScoredSeries, seriesQ } from '@/lib/engine/q-statistic';
import { buildSeriesModel } from '@/lib/engine/series-model';
import { expectClose } from '@/tests/support/close-to';
import { datasetOf, LIGAND, siteClass } from '@/tests/support/small-dataset';

const CONCENTRATIONS = [0, 1, 3, 10, 30, 100, 300];

/** Activities of a true gap (2 kT), six sites, 18 and 900 µM, stated under another gap. */
function stated(
  gap: { value: number; reversed?: boolean; truth?: number },
  u: number | null = 0.02,
): DatasetInput {
  const points = CONCENTRATIONS.map((c) => {
    const weight = Math.exp(-(gap.truth ?? 2)) * ((1 + c / 18) / (1 + c / 900)) ** 6;
    return { ligands: { [LIGAND]: c }, activity: 1 / (1 + weight), ...(u === null ? {} : { u }) };
  });
  const orientation = gap.reversed ? ('active-minus-inactive' as const) : ('inactive-minus-active' as const);
  return datasetOf(
    { gap: { value: gap.value, unit: 'kT', orientation, u: 0.1 }, siteClasses: [siteClass(6, 18, 900)] },
    points,
  );
}

function score(dataset: DatasetInput): ScoredSeries {
  const [series] = dataset.series;
  const model = buildSeriesModel(dataset, series);
  return { model, table: computePointTable(dataset, series, model), fittedHere: false, fittedCount: 0 };
}

function find(dataset: DatasetInput): ConventionFinding[] {
  const scored = score(dataset);
  return findConventions(dataset, dataset.series[0], scored, seriesQ(scored));
}

describe('findConventions', () => {
  it('names the orientation with what it brings the residuals to', () => {
    const dataset = stated({ value: 2, reversed: true });
    const [first] = find(dataset);
    const before = score(dataset).table.z.reduce((sum, z) => sum + z * z, 0);
    expect(first.misreading).toBe('gap-orientation');
    expectClose(first.rmsZ, 0, 1e-9);
    expectClose(first.deltaSumZ2, -before, 1e-9);
  });
  it('says nothing of a series that is not rejected, though another reading would fit too', () => {
    expect(find(stated({ value: 2 }))).toEqual([]);
  });
  it('goes by RMS z where an uncertainty is assumed and there is no p', () => {
    const dataset = stated({ value: 2, reversed: true }, null);
    expect(seriesQ(score(dataset)).pValue).toBeNull();
    expect(find(dataset)[0].misreading).toBe('gap-orientation');
    // The gap 0.6 kT off: RMS z between 2 and 3, which p of Q rejects and this rule does not.
    const near = { value: 0.3, truth: 0.3, reversed: true };
    expect(find(stated(near))[0].misreading).toBe('gap-orientation');
    expect(seriesQ(score(stated(near, null))).rmsZ).toBeGreaterThan(2);
    expect(find(stated(near, null))).toEqual([]);
  });
  it('reports only what explains: RMS z at most 2', () => {
    for (const { rmsZ, deltaSumZ2 } of find(stated({ value: 2, reversed: true }))) {
      expect(rmsZ).toBeLessThanOrEqual(2);
      expect(deltaSumZ2).toBeLessThanOrEqual(-20);
    }
    expect(find(stated({ value: -4.4 }))).toEqual([]);
  });
  it('best first; the simpler one where two leave the same residuals', () => {
    // Without a gap, exchanged constants and inverted activity are one and the same.
    const points = CONCENTRATIONS.map((c) => ({
      ligands: { [LIGAND]: c },
      activity: 1 / (1 + ((1 + c / 900) / (1 + c / 18)) ** 6),
      u: 0.02,
    }));
    const gap = { value: 0, unit: 'kT', orientation: 'inactive-minus-active', u: 0.1 } as const;
    const found = find(datasetOf({ gap, siteClasses: [siteClass(6, 18, 900)] }, points));
    expect(found.map(({ misreading }) => misreading).slice(0, 2)).toEqual([
      'swapped-constants',
      'inverted-activity',
    ]);
    const order = found.map(({ rmsZ }) => rmsZ);
    for (let i = 1; i < order.length; i++) expect(order[i]).toBeGreaterThanOrEqual(order[i - 1] - 1e-9);
  });
});

describe('datasetConventions', () => {
  const orientation = { misreading: 'gap-orientation', rmsZ: 1, deltaSumZ2: -100 } as const;
  const scale = (factor: number, rmsZ: number): ConventionFinding => ({
    misreading: 'concentration-scale',
    factor,
    rmsZ,
    deltaSumZ2: -50,
  });
  const two = [score(stated({ value: 2 })), score({ ...stated({ value: 2 }) })];

  it('what every series shows, over all points', () => {
    const found = datasetConventions(two, [
      [orientation, scale(1e3, 1.2)],
      [scale(1e3, 0.4), { ...orientation, rmsZ: 1.5, deltaSumZ2: -300 }],
    ]);
    expect(found).toEqual([
      {
        misreading: 'concentration-scale',
        factor: 1e3,
        rmsZ: Math.sqrt((1.44 + 0.16) / 2),
        deltaSumZ2: -100,
      },
      { misreading: 'gap-orientation', rmsZ: Math.sqrt((1 + 2.25) / 2), deltaSumZ2: -400 },
    ]);
  });
  it('not what one of them lacks, and not another factor', () => {
    expect(datasetConventions(two, [[orientation], []])).toEqual([]);
    expect(datasetConventions(two, [[scale(1e3, 1)], [scale(1e-3, 1)]])).toEqual([]);
  });
});
