import { describe, expect, it } from 'vitest';
import { type CsvDraft, draftFor, formOf } from '@/components/check/csv-draft';
import { readCsvPoints } from '@/lib/documents/read-csv-points';
import { csvParametersSchema } from '@/schemas/csv-parameters';
import { filledDraft } from '../../support/filled-draft';

const TABLE = readCsvPoints('series,velline (uM),V (mV),activity,u\nwt,0,0,0.9,0.02\nT61A,10,0,0.5,0.02');

const formWith = (change: (draft: CsvDraft) => void) => {
  const draft = filledDraft(TABLE);
  change(draft);
  return formOf(draft, TABLE, 'A table');
};

const complaintsOf = (form: unknown) => {
  const checked = csvParametersSchema.safeParse(form);
  return checked.success
    ? {}
    : Object.fromEntries(checked.error.issues.map(({ path, message }) => [path.join('.'), message]));
};

describe('the form beside a table', () => {
  it('is taken when it is filled', () => {
    expect(complaintsOf(formWith(() => {}))).toEqual({});
  });

  it('has a field for each column, in the column’s unit', () => {
    const { parameters } = draftFor(TABLE, null);
    expect(Object.keys(parameters.binding)).toEqual(['velline']);
    expect(parameters.binding.velline.inactive).toEqual({ value: '', u: '', unit: 'uM', binds: true });
    expect(Object.keys(parameters.modulation)).toEqual(['V']);
  });

  it('understands a decimal comma and a true minus sign', () => {
    const form = formWith(({ parameters }) => {
      parameters.gap.value = '−2,4';
      parameters.gap.u = '0,1';
    });
    expect(form.parameters.gap).toMatchObject({ value: -2.4, u: 0.1 });
  });

  it('refuses what is no number, by name', () => {
    const form = formWith(({ parameters, temperature }) => {
      parameters.gap.value = 'two';
      parameters.sites.u = '?';
      parameters.binding.velline.active.value = '';
      temperature.value = 'room';
    });
    expect(Object.keys(complaintsOf(form)).sort()).toEqual([
      'parameters.binding.velline.active.value',
      'parameters.gap.value',
      'parameters.sites.u',
      'temperature.value',
    ]);
    expect(complaintsOf(form)['parameters.gap.value']).toBe('must be a number, such as 2.4');
  });

  it('leaves out an uncertainty that is not typed', () => {
    expect(formWith(({ parameters }) => Object.assign(parameters.gap, { u: ' ' })).parameters.gap.u).toBe(
      undefined,
    );
  });

  it('refuses a ratio with the orientation of an energy, and the reverse', () => {
    const ratio = formWith(({ parameters }) => {
      parameters.gap.unit = 'ratio';
    });
    expect(complaintsOf(ratio)['parameters.gap.orientation']).toBe(
      'must be inactive-over-active or active-over-inactive',
    );
    const energy = formWith(({ parameters }) => {
      parameters.gap.orientation = 'inactive-over-active';
    });
    expect(complaintsOf(energy)['parameters.gap.orientation']).toBe(
      'must be inactive-minus-active or active-minus-inactive',
    );
  });

  it('states no constant where the ligand does not bind, and asks for one of the two', () => {
    const one = formWith(({ parameters }) => {
      parameters.binding.velline.active.binds = false;
    });
    expect(one.parameters.binding.velline.active).toBeNull();
    expect(complaintsOf(one)).toEqual({});
    const none = formWith(({ parameters }) => {
      parameters.binding.velline.active.binds = false;
      parameters.binding.velline.inactive.binds = false;
    });
    expect(Object.keys(complaintsOf(none))).toEqual(['parameters.binding.velline']);
  });

  it('counts fitted parameters only where they were fitted to these points', () => {
    const form = (origin: 'independent' | 'fitted-here') =>
      formWith(({ parameters }) => {
        parameters.origin = origin;
        parameters.fittedCount = '3';
      });
    expect(form('independent').parameters.fittedCount).toBeUndefined();
    expect(form('fitted-here').parameters.fittedCount).toBe(3);
  });

  it('says which concentrations are total', () => {
    expect(formWith(() => {}).ligands).toEqual({ velline: { concentration: 'free' } });
    expect(formWith((draft) => draft.totals.push('velline')).ligands).toEqual({
      velline: { concentration: 'total' },
    });
  });

  it('gives a series its own parameters, and forgets those of a series that is gone', () => {
    const form = formWith((draft) => {
      const own = structuredClone(draft.parameters);
      own.gap.value = '1.1';
      draft.own = { T61A: own, gone: own };
    });
    expect(Object.keys(form.series ?? {})).toEqual(['T61A']);
    expect(form.series?.T61A?.parameters?.gap.value).toBe(1.1);
    expect(form.parameters.gap.value).toBe(2.4);
  });
});

describe('the form when the table changes', () => {
  it('keeps what was typed for columns that stay', () => {
    const more = readCsvPoints('series,velline (uM),ocarate (mM),activity\nwt,0,1,0.9');
    const { parameters } = draftFor(more, filledDraft(TABLE));
    expect(parameters.gap.value).toBe('2.4');
    expect(parameters.binding.velline.inactive.value).toBe('18');
    expect(parameters.binding.ocarate.inactive).toMatchObject({ value: '', unit: 'mM' });
    // The column V is gone, perhaps for a moment: what was typed waits, and is not stated.
    const form = formOf(draftFor(more, filledDraft(TABLE)), more, 'A table');
    expect(form.parameters.modulation).toEqual({});
    expect(parameters.modulation.V.value).toBe('0.02');
  });

  it('states constants in a unit of the ligand’s kind', () => {
    const pressure = readCsvPoints('series,velline (Pa),V (mV),activity\nwt,0,0,0.9');
    const { inactive } = draftFor(pressure, filledDraft(TABLE)).parameters.binding.velline;
    expect(inactive).toMatchObject({ value: '18', unit: 'Pa' });
    const millimolar = readCsvPoints('series,velline (mM),V (mV),activity\nwt,0,0,0.9');
    expect(draftFor(millimolar, filledDraft(TABLE)).parameters.binding.velline.inactive.unit).toBe('uM');
  });
});
