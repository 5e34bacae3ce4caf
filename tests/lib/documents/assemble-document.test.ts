import { describe, expect, it } from 'vitest';
import { assembleDocument } from '@/lib/documents/assemble-document';
import { checkDocument } from '@/lib/documents/check-document';
import { EXAMPLE_TABLE } from '@/lib/documents/examples/examples';
import { readCsvPoints } from '@/lib/documents/read-csv-points';
import { type CsvParametersInput, csvParametersSchema } from '@/schemas/csv-parameters';

const GAP = { value: 2.4, unit: 'kT' as const, orientation: 'inactive-minus-active' as const, u: 0.06 };
const PARAMETERS: CsvParametersInput['parameters'] = {
  origin: 'independent',
  gap: GAP,
  sites: { value: 6 },
  binding: { velline: { inactive: { value: 18, unit: 'uM', u: 0.4 }, active: { value: 0.9, unit: 'mM' } } },
};
const FORM: CsvParametersInput = {
  title: 'Invented',
  licence: 'CC0-1.0',
  system: 'alrq-velline',
  assay: { readout: 'invented', conditions: 'invented' },
  temperature: { value: 25, unit: 'degC' },
  normalisation: { method: 'two-reference' },
  parameters: PARAMETERS,
};

describe('a document from a table and the form beside it', () => {
  it('is valid and holds the table’s points', () => {
    const table = readCsvPoints(EXAMPLE_TABLE);
    const document = assembleDocument(table, csvParametersSchema.parse(FORM));
    expect(checkDocument(document)).toEqual({ ok: true, document });
    expect(document.series.map(({ points }) => points)).toEqual(table.series.map(({ points }) => points));
    expect(document.series[0]?.parameters).toEqual({
      origin: 'independent',
      gap: GAP,
      siteClasses: [
        { id: 'main', sites: { value: 6 }, binding: [{ ligand: 'velline', ...PARAMETERS.binding.velline }] },
      ],
    });
    expect(document.ligands).toEqual([{ id: 'velline', name: 'velline', unit: 'uM', concentration: 'free' }]);
  });

  it('takes parameters, variant and temperature of single series, and a gap per site', () => {
    const ratio = { value: 0.4, unit: 'ratio' as const, orientation: 'inactive-over-active' as const };
    const form = csvParametersSchema.parse({
      ...FORM,
      ligands: { velline: { concentration: 'total', stockRelativeU: 0.02 } },
      series: {
        S88N: {
          variant: 'S88N/T61A',
          temperature: { value: 300, unit: 'K' },
          parameters: { ...PARAMETERS, origin: 'fitted-here', fittedCount: 2, gap: ratio, gapScope: 'site' },
        },
      },
    } satisfies CsvParametersInput);
    const document = assembleDocument(readCsvPoints(EXAMPLE_TABLE), form);
    expect(checkDocument(document).ok).toBe(true);
    expect(document.ligands[0]).toMatchObject({ concentration: 'total', stockRelativeU: 0.02 });
    expect(document.series.find(({ id }) => id === 'S88N')).toMatchObject({
      variant: 'S88N/T61A',
      temperature: { value: 300, unit: 'K' },
      parameters: { origin: 'fitted-here', fittedCount: 2, siteClasses: [{ gapPerSite: ratio }] },
    });
    expect(document.series.find(({ id }) => id === 'S88N')?.parameters.gap).toBeUndefined();
    expect(document.series.find(({ id }) => id === 'T61A')?.parameters.gap).toEqual(GAP);
  });

  it('states the slopes of the table’s modulators', () => {
    const table = readCsvPoints('series,velline (uM),V (mV),activity\nwt,1,-40,0.5');
    const modulation = { V: { slope: { ...GAP, value: 0.02 }, reference: 0 } };
    const document = assembleDocument(
      table,
      csvParametersSchema.parse({ ...FORM, parameters: { ...PARAMETERS, modulation } }),
    );
    expect(checkDocument(document).ok).toBe(true);
    expect(document.series[0]?.parameters.modulation).toEqual([{ modulator: 'V', ...modulation.V }]);
  });
});

describe('the form', () => {
  it('says where it is wrong and what would be right', () => {
    const parsed = csvParametersSchema.safeParse({
      ...FORM,
      title: ' ',
      parameters: {
        ...PARAMETERS,
        gap: { value: 2, unit: 'ratio', orientation: 'inactive-minus-active' },
        binding: { velline: { inactive: null, active: null } },
      },
    });
    expect(parsed.error?.issues.map(({ path, message }) => [path.join('.'), message])).toEqual([
      ['title', 'a title must stand here'],
      ['parameters.gap.orientation', 'must be inactive-over-active or active-over-inactive'],
      [
        'parameters.binding.velline',
        'state at least one of the two constants; leave out a ligand that binds neither state',
      ],
    ]);
  });
});
