/** What was meant becomes what is stated: the corrected document reads as the misreading tried. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkDocument } from '@/lib/documents/check-document';
import { stateReading } from '@/lib/documents/state-reading';
import { complementOf, shiftDecimalPoint } from '@/lib/documents/tidy-number';
import type { Misreading } from '@/lib/engine/assessment';
import type { DatasetInput, SeriesInput } from '@/lib/engine/inputs';
import { MISREADINGS, rereadSeries } from '@/lib/engine/misreadings';
import { computePointTable } from '@/lib/engine/point-table';
import { buildSeriesModel } from '@/lib/engine/series-model';
import type { DatasetDocument, Parameters, Series } from '@/schemas/dataset-1.generated';
import { arbitraryDataset } from '@/tests/support/arbitrary-dataset';
import { expectClose } from '@/tests/support/close-to';
import { contractDocument } from '@/tests/support/contract-document';

/** The first series of the small complete document, without correlations, under any id. */
function seriesOf(id: string, parameters: Partial<Parameters> = {}): Series {
  const [series] = contractDocument().series as [Series];
  const { correlations: _, ...rest } = series.parameters;
  return { ...series, id, parameters: { ...rest, ...parameters } };
}

function documentOf(...series: Series[]): DatasetDocument {
  return { ...contractDocument(), series };
}

/** The document stated so, which must be valid and leave the one given as it was. */
function state(document: DatasetDocument, misreading: Misreading, ids = document.series.map(({ id }) => id)) {
  const before = structuredClone(document);
  const stated = stateReading(document, ids, misreading);
  expect(document).toEqual(before);
  const checked = checkDocument(JSON.parse(JSON.stringify(stated)));
  expect(checked.ok ? [] : checked.errors).toEqual([]);
  return stated;
}

describe('numbers keep the digits they were given', () => {
  it.each([
    [0.91, 0.09],
    [0.4, 0.6],
    [1, 0],
    [-0.013, 1.013],
    [1.2, -0.2],
    [1e-7, 0.9999999],
  ])('1 − %s is %s', (value, complement) => expect(complementOf(value)).toBe(complement));
  it.each([
    [0.07, 3, 70],
    [12.5, -3, 0.0125],
    [1.1e-7, 6, 0.11],
    [0, 3, 0],
  ])('%s times 10^%s is %s', (value, exponent, shifted) =>
    expect(shiftDecimalPoint(value, exponent)).toBe(shifted),
  );
});

describe('each reading as a statement', () => {
  const gap = { value: 2.4, unit: 'kT', orientation: 'inactive-minus-active', u: 0.1 } as const;

  it('gap-orientation', () => {
    const stated = state(documentOf(seriesOf('wt', { gap })), { misreading: 'gap-orientation' });
    expect(stated.series[0]?.parameters.gap).toEqual({ ...gap, orientation: 'active-minus-inactive' });
  });
  it('gap-scope moves the statement, and back', () => {
    const document = documentOf(seriesOf('wt', { gap }));
    const perSite = state(document, { misreading: 'gap-scope' });
    expect(perSite.series[0]?.parameters).not.toHaveProperty('gap');
    expect(perSite.series[0]?.parameters.siteClasses[0]?.gapPerSite).toEqual(gap);
    expect(state(perSite, { misreading: 'gap-scope' })).toEqual(document);
  });
  it('gap-unit and swapped-constants', () => {
    const document = documentOf(seriesOf('wt', { gap }));
    const inUnit = state(document, { misreading: 'gap-unit', unit: 'kJ/mol' });
    expect(inUnit.series[0]?.parameters.gap).toEqual({ ...gap, unit: 'kJ/mol' });
    const before = document.series[0]?.parameters.siteClasses[0]?.binding[0];
    const after = state(document, { misreading: 'swapped-constants' }).series[0]?.parameters.siteClasses[0]
      ?.binding[0];
    expect(after).toEqual({ ...before, inactive: before?.active, active: before?.inactive });
  });
  it('association-constants and log-ratio, with their uncertainties', () => {
    const ratio = { value: 2, unit: 'ratio', orientation: 'inactive-over-active', u: 0.1 } as const;
    const document = documentOf(seriesOf('wt', { gap: ratio }));
    const powered = state(document, { misreading: 'log-ratio', base: '10' }).series[0]?.parameters.gap;
    expect(powered).toMatchObject({ value: 100, orientation: 'inactive-over-active' });
    expectClose(powered?.u ?? null, 10 * Math.LN10, 1e-14);
    const binding = state(document, { misreading: 'association-constants' }).series[0]?.parameters
      .siteClasses[0]?.binding[0];
    // 18 ± 1.2 µM
    expectClose(binding?.inactive?.value ?? null, 1 / 18, 1e-15, 'K', 1e-300);
    expectClose(binding?.inactive?.u ?? null, 1.2 / 324, 1e-15, 'u', 1e-300);
  });
  it('inverted-activity, in tidy numbers', () => {
    const [first, second] =
      state(documentOf(seriesOf('wt')), { misreading: 'inverted-activity' }).series[0]?.points ?? [];
    expect(first?.activity).toBe(0.09);
    expect(second?.replicates).toEqual([0.59, 0.56, 0.6]);
  });
});

describe('concentration-scale', () => {
  const scale = (factor: number): Misreading => ({ misreading: 'concentration-scale', factor });
  it('for every series: the ligand’s unit, the numbers as they are', () => {
    const document = documentOf(seriesOf('wt'), seriesOf('other'));
    const stated = state(document, scale(1e-3));
    expect(stated.ligands[0]?.unit).toBe('nM');
    expect(stated.series).toEqual(document.series);
    expect(state(document, scale(1e6)).ligands[0]?.unit).toBe('M');
  });
  it('for some series only: their numbers', () => {
    const document = documentOf(seriesOf('wt'), seriesOf('other'));
    const stated = state(document, scale(1e-3), ['other']);
    expect(stated.ligands).toEqual(document.ligands);
    expect(stated.series[0]).toEqual(document.series[0]);
    expect(stated.series[1]?.points.map(({ ligands }) => ligands.velline)).toEqual([0, 0.0125]);
  });
  it('where there is no such unit: the numbers', () => {
    const pressure = documentOf(
      seriesOf('wt', {
        siteClasses: [
          {
            id: 'main',
            sites: { value: 4 },
            binding: [{ ligand: 'velline', inactive: { value: 30, unit: 'Torr' }, active: null }],
          },
        ],
      }),
    );
    pressure.ligands = pressure.ligands.map((ligand) => ({ ...ligand, unit: 'Torr' }));
    const stated = state(pressure, scale(1e3));
    expect(stated.ligands[0]?.unit).toBe('Torr');
    expect(stated.series[0]?.points[1]?.ligands.velline).toBe(12500);
  });
});

describe('shared labels', () => {
  const shared = {
    value: 2.4,
    unit: 'kT',
    orientation: 'inactive-minus-active',
    u: 0.1,
    sharedAs: 'g',
  } as const;
  const labels = ({ series }: DatasetDocument) => series.map(({ parameters }) => parameters.gap?.sharedAs);
  const three = documentOf(...['a', 'b', 'c'].map((id) => seriesOf(id, { gap: shared })));

  it('stay where all series change alike', () => {
    expect(labels(state(three, { misreading: 'gap-orientation' }))).toEqual(['g', 'g', 'g']);
  });
  it('part where some do not change, those that do staying together', () => {
    const stated = state(three, { misreading: 'gap-orientation' }, ['a', 'c']);
    expect(labels(stated)).toEqual(['g (2)', 'g', 'g (2)']);
  });
  it('part from what becomes a quantity of another kind', () => {
    const stated = state(three, { misreading: 'gap-scope' }, ['b']);
    expect(labels(stated)).toEqual(['g', undefined, 'g']);
    expect(stated.series[1]?.parameters.siteClasses[0]?.gapPerSite?.sharedAs).toBe('g (2)');
  });
  it('part from a constant of 1 that is now a reciprocal, whose correlation has turned', () => {
    const K = { value: 1, unit: 'uM', u: 0.1, sharedAs: 'k' } as const;
    const of = (id: string) =>
      seriesOf(id, {
        gap: shared,
        siteClasses: [
          {
            id: 'main',
            sites: { value: 6 },
            binding: [{ ligand: 'velline', inactive: K, active: { value: 0.5, unit: 'mM' } }],
          },
        ],
        correlations: [{ a: 'gap', b: 'main/velline/inactive', r: 0.5 }],
      });
    const stated = state(documentOf(of('a'), of('b')), { misreading: 'association-constants' }, ['a']);
    expect(stated.series[0]?.parameters.siteClasses[0]?.binding[0]?.inactive?.sharedAs).toBe('k (2)');
    expect(stated.series[0]?.parameters.correlations?.[0]?.r).toBe(-0.5);
  });
});

/** A dataset of the engine as a whole document, as it would travel. */
function asDocument(dataset: DatasetInput): DatasetDocument {
  return JSON.parse(
    JSON.stringify({
      ...contractDocument(),
      ...dataset,
      ligands: dataset.ligands.map((ligand) => ({ name: ligand.id, ...ligand })),
      modulators: [{ id: 'V', name: 'membrane potential', unit: 'mV' }],
      series: dataset.series.map((series) => ({ label: series.id, variant: series.id, ...series })),
    }),
  );
}

function tableOf(dataset: DatasetInput, series: SeriesInput) {
  return computePointTable(dataset, series, buildSeriesModel(dataset, series));
}

describe('of any document', () => {
  it('the document stated so is valid and is assessed as the misreading tried', () => {
    let compared = 0;
    fc.assert(
      fc.property(
        arbitraryDataset.map(asDocument).filter((document) => checkDocument(document).ok),
        fc.constantFrom(...MISREADINGS),
        fc.boolean(),
        (document, misreading, whole) => {
          const chosen = whole ? document.series : document.series.slice(0, 1);
          const ids = chosen.map(({ id }) => id);
          const stated = state(document, misreading, ids);
          document.series.forEach((series, s) => {
            const reread = ids.includes(series.id) ? rereadSeries(document, series, misreading) : null;
            if (reread !== null) compared++;
            const tried = tableOf(document, reread ?? series);
            const said = tableOf(stated, stated.series[s] ?? series);
            tried.z.forEach((z, i) => {
              expectClose(said.energy[i], tried.energy[i], 1e-12, 'energy', 100);
              expectClose(said.expected[i], tried.expected[i], 1e-12, 'expected');
              expectClose(said.expectedU[i], tried.expectedU[i], 1e-12, 'expectedU', 100);
              expectClose(said.activity[i], tried.activity[i], 1e-12, 'activity');
              expectClose(said.z[i], z, 1e-10, 'z');
            });
          });
        },
      ),
      { numRuns: 300 },
    );
    expect(compared).toBeGreaterThan(100);
  });
});
