import { describe, expect, it } from 'vitest';
import { estimateRows } from '@/components/refit/estimate-rows';
import { freeableRows } from '@/components/refit/freeable';
import type { RefitEstimate, RefitResult } from '@/lib/engine/refit';
import { plottedExample } from '@/tests/support/plotted-dataset';

const { document } = plottedExample('collapse');
const { document: mixed } = plottedExample('mixed-classes');

describe('what can be freed', () => {
  it('is every parameter that a series states, with what is stated', () => {
    expect(freeableRows(document).map(({ label, stated }) => [label, stated])).toEqual([
      ['Energy gap', '4 different values in 4 series'],
      ['Sites', '6'],
      ['K inactive', '2 different values in 4 series'],
      ['K active', '0.900 ± 0.020\u00a0mM'],
    ]);
  });

  it('names class and ligand where there are several, and has slopes', () => {
    const rows = freeableRows(mixed);
    const classes = mixed.series[0].parameters.siteClasses.map(({ id }) => id);
    expect(classes.length).toBeGreaterThan(1);
    for (const id of classes)
      expect(rows.filter(({ label }) => label.endsWith(`class ${id}`)).length).toBeGreaterThan(1);
    expect(rows.some(({ place }) => place.parameter === 'slope' && place.modulator !== undefined)).toBe(true);
    expect(new Set(rows.map(({ key }) => key)).size).toBe(rows.length);
  });
});

describe('an estimate beside its statement', () => {
  const estimate = (overrides: Partial<RefitEstimate>): RefitEstimate => ({
    series: 'wt',
    parameter: 'gap',
    siteClass: null,
    ligand: null,
    modulator: null,
    unit: 'kT',
    value: 2.5,
    u: 0.08,
    stated: 2.4,
    determined: true,
    ...overrides,
  });
  const rowsOf = (...estimates: RefitEstimate[]) => estimateRows(document, { estimates } as RefitResult);

  it('differs by so many combined uncertainties', () => {
    const [row] = rowsOf(estimate({}));
    expect(row).toMatchObject({ parameter: 'Energy gap', series: 'wild type', statedU: 0.06 });
    // 0.1 / √(0.08² + 0.06²)
    expect(row.difference).toBeCloseTo(1, 12);
  });

  it('takes the uncertainty of a gap in kT whatever it was stated in', () => {
    const [row] = rowsOf(estimate({ series: 'T61A', value: 3.4, stated: 3.308 }));
    // 0.15 kJ/mol / 2.4790 kJ/mol
    expect(row.statedU).toBeCloseTo(0.0605, 4);
  });

  it('has no difference where nothing is determined, or where series state different things', () => {
    expect(rowsOf(estimate({ u: null, determined: false }))[0].difference).toBeNull();
    const shared = {
      series: null,
      parameter: 'inactive' as const,
      siteClass: 'main',
      ligand: 'velline',
      unit: 'uM' as const,
    };
    expect(rowsOf(estimate({ ...shared, value: 20, stated: 22.6 }))[0]).toMatchObject({
      series: null,
      statedU: null,
      difference: null,
    });
    expect(
      rowsOf(estimate({ ...shared, parameter: 'active', unit: 'mM', value: 1, stated: 0.9 }))[0].statedU,
    ).toBe(0.02);
  });
});
