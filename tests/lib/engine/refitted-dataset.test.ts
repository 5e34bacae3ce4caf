/** What a refit puts in the place of the statements is a valid document again, and lies on its curve. */
import { describe, expect, it } from 'vitest';
import { checkDocument } from '@/lib/documents/check-document';
import { assess } from '@/lib/engine/assess';
import type { FreeParameter } from '@/lib/engine/free-parameters';
import { refit } from '@/lib/engine/refit';
import { applyEstimates } from '@/lib/engine/refitted-dataset';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import reference from '@/tests/reference/refit-reference.json';
import { expectClose } from '@/tests/support/close-to';
import { contractDocument } from '@/tests/support/contract-document';

/** The dataset of the reference as a whole document; its series state labels and correlations as well. */
function referenceDocument(): DatasetDocument {
  const { dataset } = structuredClone(reference) as unknown as { dataset: DatasetDocument };
  const whole: DatasetDocument = {
    ...contractDocument(),
    ...dataset,
    ligands: [{ ...dataset.ligands[0], name: 'velline' }],
    modulators: [{ id: 'V', name: 'membrane potential', unit: 'mV' }],
  };
  whole.series = dataset.series.map((series) => ({ ...series, label: series.id, variant: series.id }));
  for (const { parameters } of whole.series) {
    const [{ binding }] = parameters.siteClasses;
    binding[0].inactive = { value: 18, unit: 'uM', u: 1, sharedAs: 'velline-inactive' };
    parameters.correlations = [
      { a: 'gap', b: 'main/velline/inactive', r: -0.4 },
      { a: 'main/sites', b: 'V/slope', r: 0.2 },
    ];
  }
  return whole;
}

const free = reference.fits[0].free as FreeParameter[]; // gap per series, sites and K_inactive shared

describe('a dataset with the estimates of a refit', () => {
  const document = referenceDocument();
  const result = refit(document, free);
  const refitted = applyEstimates(document, result);
  const [first, second] = refitted.series.map(({ parameters }) => parameters);

  it('is a valid document, and the stated one is left as it was', () => {
    expect(checkDocument(document)).toEqual({ ok: true, document });
    expect(checkDocument(refitted)).toEqual({ ok: true, document: refitted });
    expect(document).toEqual(referenceDocument());
  });

  it('states gaps in kT, constants in the unit of the estimate, with their standard errors', () => {
    const [gap, otherGap, , inactive] = result.estimates;
    expect(first.gap).toEqual({
      value: gap.value,
      u: gap.u,
      unit: 'kT',
      orientation: 'inactive-minus-active',
    });
    expect(second.gap).toMatchObject({ value: otherGap.value, unit: 'kT' });
    expect(second.siteClasses[0].binding[0]).toMatchObject({
      inactive: { value: inactive.value, u: inactive.u, unit: 'uM' },
      active: { value: 0.14, unit: 'mM' },
    });
    expect(second.modulation).toEqual(document.series[1].parameters.modulation);
  });

  it('shares one label for a shared estimate, and counts it once', () => {
    const labels = [first, second].map(({ siteClasses }) => siteClasses[0].binding[0].inactive?.sharedAs);
    expect(labels[0]).toBeTruthy();
    expect(labels[1]).toBe(labels[0]);
    expect(labels[0]).not.toBe('velline-inactive');
    expect(first.siteClasses[0].sites.sharedAs).not.toBe(labels[0]);
    expect([first.origin, second.origin]).toEqual(['fitted-here', 'fitted-here']);
    expect((first.fittedCount ?? 0) + (second.fittedCount ?? 0)).toBe(result.estimates.length);
  });

  it('states the correlations of the fit, and keeps those of what was not fitted', () => {
    const between = (a: string, b: string) =>
      first.correlations?.find((one) => one.a === a && one.b === b)?.r;
    expect(between('gap', 'main/velline/inactive')).toBe(result.correlations[0][3]);
    expect(between('main/sites', 'main/velline/inactive')).toBe(result.correlations[2][3]);
    expect(between('main/sites', 'V/slope')).toBeUndefined();
  });

  it('misses its points by the χ² of the refit', () => {
    const { summary } = assess(refitted);
    expectClose(summary.chiSquared, result.chiSquared, 1e-9);
    expect(summary.degreesOfFreedom).toBe(result.degreesOfFreedom);
  });

  it('leaves series as they are in which nothing was fitted', () => {
    const onlyFirst = referenceDocument();
    delete onlyFirst.series[1].parameters.modulation;
    onlyFirst.series[1].parameters.correlations = [];
    const slope = refit(onlyFirst, [{ parameter: 'slope', modulator: 'V', share: 'dataset' }]);
    const [changed, same] = applyEstimates(onlyFirst, slope).series;
    expect(changed.parameters.modulation?.[0].slope.value).toBe(slope.estimates[0].value);
    expect(changed.parameters.fittedCount).toBe(1);
    expect(same).toBe(onlyFirst.series[1]);
  });

  it('takes over values that are not determined, without an uncertainty', () => {
    const flat = referenceDocument();
    for (const series of flat.series)
      series.points = series.points.filter(({ ligands }) => ligands.velline === 0);
    const unknown = refit(flat, [
      { parameter: 'active', siteClass: 'main', ligand: 'velline', share: 'series' },
    ]);
    expect(unknown.estimates.map(({ determined, value }) => [determined, value])).toEqual([
      [false, 140],
      [false, 0.14],
    ]);
    const [{ parameters }] = applyEstimates(flat, unknown).series;
    expect(parameters.siteClasses[0].binding[0].active).toEqual({ value: 140, unit: 'uM' });
  });
});
