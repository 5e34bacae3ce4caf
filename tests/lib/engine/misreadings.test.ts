/** Each reading of a series, by what it must do to numbers that can be worked out by hand. */
import { describe, expect, it } from 'vitest';
import type { Misreading } from '@/lib/engine/assessment';
import type { DatasetInput, GapStatement, ParametersInput, SeriesInput } from '@/lib/engine/inputs';
import { MISREADINGS, rereadSeries } from '@/lib/engine/misreadings';
import { expectClose } from '@/tests/support/close-to';
import { assessOne, bindingOf, datasetOf, LIGAND, pointsAt, siteClass } from '@/tests/support/small-dataset';

const kT = (value: number, u?: number): GapStatement => ({
  value,
  unit: 'kT',
  orientation: 'inactive-minus-active',
  u,
});

const PARAMETERS: Omit<ParametersInput, 'origin'> = { gap: kT(2, 0.1), siteClasses: [siteClass(6, 18, 900)] };

const dataset = (changes: Partial<ParametersInput> = {}, points = pointsAt(0, 5, 50)): DatasetInput =>
  datasetOf({ ...PARAMETERS, ...changes }, points);

function read(from: DatasetInput, misreading: Misreading): SeriesInput | null {
  const before = structuredClone(from);
  const reread = rereadSeries(from, from.series[0], misreading);
  expect(from).toEqual(before);
  return reread;
}

/** The assessment of the one series as re-read. */
function assessed(from: DatasetInput, misreading: Misreading) {
  const series = read(from, misreading);
  if (series === null) throw new Error('no reading');
  return assessOne({ ...from, series: [series] });
}

describe('gap-orientation', () => {
  it('turns every gap round and leaves slopes as they are', () => {
    const slope = { value: 0.1, unit: 'kT', orientation: 'inactive-minus-active' } as const;
    const from = dataset({ modulation: [{ modulator: 'V', slope, reference: 0 }] }, [
      { ligands: {}, modulators: { V: 10 }, activity: 0.5, u: 0.02 },
    ]);
    expectClose(assessOne(from).points[0].energy, 3, 1e-14);
    expectClose(assessed(from, { misreading: 'gap-orientation' }).points[0].energy, -1, 1e-14);
  });
  it('of a ratio and per site', () => {
    const ratio: GapStatement = { value: 10, unit: 'ratio', orientation: 'inactive-over-active' };
    const from = dataset({ gap: undefined, siteClasses: [{ ...siteClass(2, 1, 9), gapPerSite: ratio }] });
    expectClose(assessOne(from).gapKT, -2 * Math.LN10, 1e-14);
    expectClose(assessed(from, { misreading: 'gap-orientation' }).gapKT, 2 * Math.LN10, 1e-14);
  });
  it('keeps the correlations of the number stated, so that its error moves the energy the other way', () => {
    const correlations = [{ a: 'gap', b: `main/${LIGAND}/inactive`, r: 0.5 }];
    const from = dataset({ siteClasses: [siteClass(6, 18, 900, { inactive: 0.1 })], correlations });
    const [, before] = assessOne(from).points;
    const [, after] = assessed(from, { misreading: 'gap-orientation' }).points;
    // u_f² = g² + k² ± 2·0.5·g·k with g = 0.1 and k = n·occupancy·0.1
    const k = 6 * (5 / 18 / (1 + 5 / 18)) * 0.1;
    expectClose(before.energyU ** 2, 0.01 + k * k + 0.1 * k, 1e-12);
    expectClose(after.energyU ** 2, 0.01 + k * k - 0.1 * k, 1e-12);
  });
  it('is none where there is no gap', () => {
    expect(read(dataset({ gap: kT(0, 0.1) }), { misreading: 'gap-orientation' })).toBeNull();
  });
});

describe('gap-scope', () => {
  const scope: Misreading = { misreading: 'gap-scope' };
  it('a gap of the whole as one per site, whose error counts once over several classes', () => {
    const from = dataset({ siteClasses: [siteClass(6, 18, 900), siteClass(2, 5, 50, {}, 'other')] });
    const after = assessed(from, scope);
    expectClose(after.gapKT, 16, 1e-14);
    expectClose(after.points[0].energyU, 0.8, 1e-12);
  });
  it('a gap per site as that of the whole', () => {
    const from = dataset({
      gap: undefined,
      siteClasses: [{ ...siteClass(6, 18, 900), gapPerSite: kT(2, 0.1) }],
    });
    const after = assessed(from, scope);
    expectClose(after.gapKT, 2, 1e-14);
    expectClose(after.points[0].energyU, 0.1, 1e-12);
  });
  it('gaps of several classes, g_s → g_s / n_s; a ratio by its root', () => {
    const ratio: GapStatement = { value: 16, unit: 'ratio', orientation: 'active-over-inactive', u: 1.6 };
    const classes = [
      { ...siteClass(4, 18, 900), gapPerSite: ratio },
      { ...siteClass(2, 5, 50, {}, 'other'), gapPerSite: kT(3, 0.1) },
    ];
    const after = assessed(dataset({ gap: undefined, siteClasses: classes }), scope);
    expectClose(after.gapKT, Math.log(16) + 3, 1e-14);
    expectClose(after.points[0].energyU, Math.hypot(0.1, 0.1), 1e-12);
  });
  it('takes the correlations along', () => {
    const other = `main/${LIGAND}/active`;
    const from = dataset({ correlations: [{ a: other, b: 'gap', r: -0.4 }] });
    const reread = read(from, scope);
    expect(reread?.parameters.correlations).toEqual([{ a: other, b: 'main/gapPerSite', r: -0.4 }]);
    expect(reread?.parameters).not.toHaveProperty('gap');
    const back = reread && rereadSeries(from, reread, scope);
    expect(back?.parameters).toEqual({ ...from.series[0].parameters, siteClasses: PARAMETERS.siteClasses });
  });
  it('is none for one site, without a gap, or where both are stated', () => {
    expect(read(dataset({ siteClasses: [siteClass(1, 18, 900)] }), scope)).toBeNull();
    expect(read(dataset({ gap: kT(0) }), scope)).toBeNull();
    expect(
      read(dataset({ siteClasses: [{ ...siteClass(6, 18, 900), gapPerSite: kT(1) }] }), scope),
    ).toBeNull();
  });
});

describe('swapped-constants', () => {
  const swapped: Misreading = { misreading: 'swapped-constants' };
  it('exchanges the states, a state that is not bound too, with their correlations', () => {
    const from = dataset({
      siteClasses: [siteClass(6, 18, null, { inactive: 0.1 })],
      correlations: [{ a: 'gap', b: `main/${LIGAND}/inactive`, r: 0.3 }],
    });
    const reread = read(from, swapped);
    expect(reread?.parameters.siteClasses[0].binding).toEqual([bindingOf(LIGAND, null, 18, { active: 0.1 })]);
    expect(reread?.parameters.correlations).toEqual([{ a: 'gap', b: `main/${LIGAND}/active`, r: 0.3 }]);
    expectClose(assessed(from, swapped).points[2].energy, 2 + 6 * Math.log1p(50 / 18), 1e-14);
  });
  it('is none where the two are alike', () => {
    expect(read(dataset({ siteClasses: [siteClass(6, 18, 18)] }), swapped)).toBeNull();
  });
});

describe('association-constants', () => {
  const association: Misreading = { misreading: 'association-constants' };
  it('K → 1/K with its relative uncertainty; null stays', () => {
    const from = dataset({ siteClasses: [siteClass(6, 0.05, null, { inactive: 0.1 })] });
    const [binding] = read(from, association)?.parameters.siteClasses[0].binding ?? [];
    expect(binding.active).toBeNull();
    expectClose(binding.inactive?.value ?? null, 20, 1e-14);
    expectClose(binding.inactive?.u ?? null, 2, 1e-14);
  });
  it('turns correlations with what is no constant, and keeps those between constants', () => {
    const [one, other] = [`main/${LIGAND}/inactive`, `main/${LIGAND}/active`];
    const correlations = [
      { a: 'gap', b: one, r: 0.3 },
      { a: other, b: one, r: 0.7 },
      { a: 'gap', b: 'main/sites', r: 0.2 },
    ];
    expect(read(dataset({ correlations }), association)?.parameters.correlations).toEqual([
      { a: 'gap', b: one, r: -0.3 },
      ...correlations.slice(1),
    ]);
  });
  it('is none where 1/K is beyond 1e-15 to 1e3 M', () => {
    expect(read(dataset({ siteClasses: [siteClass(6, 1e-9, null)] }), association)).not.toBeNull();
    expect(read(dataset({ siteClasses: [siteClass(6, 1e-10, null)] }), association)).toBeNull();
  });
});

describe('readings of the points', () => {
  it('inverted-activity: activities and replicates', () => {
    const points = [
      { ligands: {}, activity: 0.9, u: 0.02 },
      { ligands: {}, replicates: [0.1, 0.2] },
    ];
    const reread = read(dataset({}, points), { misreading: 'inverted-activity' });
    expectClose(reread?.points[0].activity ?? null, 0.1, 1e-15);
    expect(reread?.points[0].u).toBe(0.02);
    expect(reread?.points[1].replicates?.map((a) => a.toFixed(6))).toEqual(['0.900000', '0.800000']);
  });
  it('concentration-scale: what the stated ones must be multiplied by', () => {
    const from = dataset();
    const reread = read(from, { misreading: 'concentration-scale', factor: 1e3 });
    expect(reread?.points.map(({ ligands }) => ligands[LIGAND])).toEqual([0, 5000, 50000]);
    // 50 µM times 10⁶ is 50 M; 5,000 µM times 10⁶ would be 5,000 M, which no document may state.
    expect(read(from, { misreading: 'concentration-scale', factor: 1e6 })).not.toBeNull();
    expect(read(dataset({}, pointsAt(5000)), { misreading: 'concentration-scale', factor: 1e6 })).toBeNull();
    expect(read(dataset({}, pointsAt(0)), { misreading: 'concentration-scale', factor: 1e3 })).toBeNull();
  });
});

describe('the number of the gap', () => {
  it('gap-unit: in every other unit, and in no ratio', () => {
    const from = dataset({ gap: { ...kT(2, 0.1), unit: 'kcal/mol' } as GapStatement });
    const after = assessed(from, { misreading: 'gap-unit', unit: 'kJ/mol' });
    // kT at 298.15 K is 2.478957 kJ/mol (outside check A01)
    expectClose(after.gapKT, 2 / 2.4789570296, 1e-9);
    expectClose(after.points[0].energyU, 0.1 / 2.4789570296, 1e-9);
    expect(read(from, { misreading: 'gap-unit', unit: 'kcal/mol' })).toBeNull();
    const ratio = dataset({ gap: { value: 9, unit: 'ratio', orientation: 'inactive-over-active' } });
    expect(read(ratio, { misreading: 'gap-unit', unit: 'kJ/mol' })).toBeNull();
  });
  it('gap-unit: none beyond 200 kT', () => {
    const from = dataset({ gap: { ...kT(300), unit: 'meV' } as GapStatement });
    expect(read(from, { misreading: 'gap-unit', unit: 'kT' })).toBeNull();
  });
  it('log-ratio: u(ln L) = u·ln 10, or u', () => {
    const from = dataset({ gap: { value: 3, unit: 'ratio', orientation: 'inactive-over-active', u: 0.1 } });
    const ten = assessed(from, { misreading: 'log-ratio', base: '10' });
    expectClose(ten.gapKT, -3 * Math.LN10, 1e-14);
    expectClose(ten.points[0].energyU, 0.1 * Math.LN10, 1e-12);
    const natural = assessed(from, { misreading: 'log-ratio', base: 'e' });
    expectClose(natural.gapKT, -3, 1e-14);
    expectClose(natural.points[0].energyU, 0.1, 1e-12);
  });
  it('log-ratio: none of an energy, none beyond 200 kT or 1e30, which no document may state', () => {
    expect(read(dataset(), { misreading: 'log-ratio', base: '10' })).toBeNull();
    const ratio = (value: number) =>
      dataset({ gap: { value, unit: 'ratio', orientation: 'inactive-over-active' } });
    expect(read(ratio(90), { misreading: 'log-ratio', base: '10' })).toBeNull();
    expect(read(ratio(60), { misreading: 'log-ratio', base: '10' })).toBeNull();
    expect(read(ratio(60), { misreading: 'log-ratio', base: 'e' })).not.toBeNull();
    expect(read(ratio(90), { misreading: 'log-ratio', base: 'e' })).toBeNull();
  });
});

describe('all readings', () => {
  it('pass on what else a series carries', () => {
    const from = dataset();
    const labelled = { ...from.series[0], label: 'wild type' };
    const applicable = MISREADINGS.map((one) => rereadSeries(from, labelled, one)).filter(
      (one) => one !== null,
    );
    expect(applicable.length).toBeGreaterThanOrEqual(11);
    for (const reread of applicable) expect(reread.label).toBe('wild type');
  });
});
