import { describe, expect, it } from 'vitest';
import { checkSchema } from '@/lib/documents/check-schema';
import { MOST_ERRORS } from '@/lib/documents/error-list';
import { changedDocument, errorsOf, REMOVED } from '../../support/change-document';
import { contractDocument } from '../../support/contract-document';

const SERIES = '/series/0';
const PARAMETERS = `${SERIES}/parameters`;
const CLASS = `${PARAMETERS}/siteClasses/0`;
const BINDING = `${CLASS}/binding/0`;
const POINT = `${SERIES}/points/0`;
const ENERGY = { value: 2, unit: 'kT', orientation: 'inactive-minus-active' };
const RATIO = { value: 11, unit: 'ratio', orientation: 'active-over-inactive' };

describe('a document that fits', () => {
  it('is the one by which the format is explained', () => {
    expect(checkSchema(contractDocument())).toEqual([]);
  });

  it.each<[string, Record<string, unknown>]>([
    ['a gap as a ratio', { [`${PARAMETERS}/gap`]: RATIO }],
    [
      'a shared label on every stated quantity',
      {
        '/temperature/sharedAs': 'a',
        [`${PARAMETERS}/gap/sharedAs`]: 'b',
        [`${CLASS}/sites/sharedAs`]: 'c',
        [`${CLASS}/gapPerSite`]: { ...ENERGY, sharedAs: 'd' },
        [`${BINDING}/inactive/sharedAs`]: 'e',
        [`${BINDING}/active/sharedAs`]: 'f',
        [`${PARAMETERS}/modulation/0/slope/sharedAs`]: 'g',
      },
    ],
    ['a ligand that binds one state only', { [`${BINDING}/active`]: null }],
    [
      'a count of fitted parameters',
      { [`${PARAMETERS}/origin`]: 'fitted-here', [`${PARAMETERS}/fittedCount`]: 3 },
    ],
    [
      'noise below 0 and above 1',
      { [`${POINT}/activity`]: -0.5, [`${SERIES}/points/1/replicates`]: [1.5, 1] },
    ],
    [
      'funding and related works',
      {
        '/funding': [{ funder: 'Invented fund', award: '7' }],
        '/related': [
          { identifier: '10.5072/a', relation: 'IsSupplementTo' },
          { identifier: 'https://lab.example/x', relation: 'Cites' },
        ],
      },
    ],
    ['a protein concentration', { '/assay/proteinConcentration': { value: 0.2, unit: 'uM' } }],
  ])('may hold %s', (_, changes) => {
    expect(errorsOf(changes)).toEqual([]);
  });
});

describe('what is wrong', () => {
  it.each<[string, unknown, string, string]>([
    [
      `${POINT}/activity`,
      '0,41',
      `${POINT}/activity`,
      'activity must be a number, such as 0.42; found the text “0,41”',
    ],
    [`${POINT}/activity`, 1.51, `${POINT}/activity`, 'activity must be at most 1.5; found the number 1.51'],
    [
      `${POINT}/activity`,
      Number.POSITIVE_INFINITY,
      `${POINT}/activity`,
      'activity must be a finite number; found a number too large to be held',
    ],
    [
      `${POINT}/activity`,
      REMOVED,
      `${POINT}/activity`,
      'a point needs activity, such as 0.42, or replicates, such as [0.41, 0.44]',
    ],
    [`${POINT}/u`, 0, `${POINT}/u`, 'u must be greater than 0; found the number 0'],
    [
      `${POINT}/ligands/velline`,
      -1,
      `${POINT}/ligands/velline`,
      'concentration of velline must be 0 or more; found the number -1',
    ],
    [
      `${POINT}/ligands/a b`,
      1,
      `${POINT}/ligands/a b`,
      '“a b” cannot be the id of a ligand. An id holds letters, digits, dot, underscore and hyphen, beginning with a letter or digit.',
    ],
    [
      `${SERIES}/points/1/activity`,
      0.4,
      `${SERIES}/points/1/activity`,
      'a point takes activity or replicates, not both',
    ],
    [
      `${SERIES}/points/1/replicates`,
      [0.4],
      `${SERIES}/points/1/replicates`,
      'replicates must hold two or more measurements; a single one is stated as activity',
    ],
    [
      `${SERIES}/points/1/u`,
      0.1,
      `${SERIES}/points/1/u`,
      'u belongs to activity; the uncertainty of replicates comes from their spread',
    ],
    [`${PARAMETERS}/gap/u`, -0.1, `${PARAMETERS}/gap/u`, 'u of gap must be 0 or more; found the number -0.1'],
    [
      `${PARAMETERS}/gap/unit`,
      'kt',
      `${PARAMETERS}/gap/unit`,
      'unit of gap must be kT, kJ/mol, kcal/mol, meV or ratio; found the text “kt”; did you mean “kT”?',
    ],
    [
      `${PARAMETERS}/gap`,
      { ...RATIO, value: 0 },
      `${PARAMETERS}/gap/value`,
      'value of gap must be greater than 0; found the number 0',
    ],
    [
      `${PARAMETERS}/gap/orientation`,
      'inactive-over-active',
      `${PARAMETERS}/gap/orientation`,
      'gap in a unit of energy takes the orientation inactive-minus-active or active-minus-inactive; found the text “inactive-over-active”; did you mean “inactive-minus-active”?',
    ],
    [
      `${PARAMETERS}/gap/orientation`,
      REMOVED,
      `${PARAMETERS}/gap/orientation`,
      'gap needs orientation: inactive-minus-active or active-minus-inactive',
    ],
    [
      `${PARAMETERS}/fittedCount`,
      2,
      `${PARAMETERS}/fittedCount`,
      'fittedCount is stated only with origin fitted-here',
    ],
    [
      `${PARAMETERS}/origin`,
      'fitted-here',
      `${PARAMETERS}/fittedCount`,
      'with origin fitted-here, fittedCount must say how many parameters were fitted to these points',
    ],
    [
      `${CLASS}/sites/value`,
      1001,
      `${CLASS}/sites/value`,
      'value of sites must be at most 1000; found the number 1001',
    ],
    [
      `${CLASS}/sites/value`,
      0,
      `${CLASS}/sites/value`,
      'value of sites must be greater than 0; found the number 0',
    ],
    [
      `${BINDING}/inactive`,
      18,
      `${BINDING}/inactive`,
      'inactive must be an object with value and unit, or null; found the number 18',
    ],
    [
      `${BINDING}/inactive/value`,
      0,
      `${BINDING}/inactive/value`,
      'value of inactive must be greater than 0; found the number 0',
    ],
    [
      `${PARAMETERS}/modulation/0/slope/unit`,
      'ratio',
      `${PARAMETERS}/modulation/0/slope/unit`,
      'unit of slope must be kT, kJ/mol, kcal/mol or meV; found the text “ratio”',
    ],
    [
      `${PARAMETERS}/correlations/0/r`,
      -1.1,
      `${PARAMETERS}/correlations/0/r`,
      'r must be -1 or more; found the number -1.1',
    ],
    [
      `${SERIES}/id`,
      'a/b',
      `${SERIES}/id`,
      'id must be like “wt”; found the text “a/b”. An id holds letters, digits, dot, underscore and hyphen, beginning with a letter or digit.',
    ],
    [
      `${SERIES}/id`,
      'constructor',
      `${SERIES}/id`,
      'id must not be a word that programs reserve; found the text “constructor”',
    ],
    ['/licence', 'MIT', '/licence', 'licence must be CC0-1.0 or CC-BY-4.0; found the text “MIT”'],
    ['/titel', 'x', '/titel', 'unknown property “titel”; did you mean “title”?'],
    [
      `${POINT}/colour`,
      'red',
      `${POINT}/colour`,
      'unknown property “colour”; a point takes ligands, modulators, activity, u and replicates',
    ],
    [
      '/title',
      REMOVED,
      '/title',
      'the document needs title: text, such as “Velline response of AlrQ, wild type”',
    ],
    [
      '/ligands/0/unit',
      'µM',
      '/ligands/0/unit',
      'unit must be M, mM, uM, nM, pM, Pa, kPa, mmHg or Torr; found the text “µM”; did you mean “uM”?',
    ],
    [
      '/assay/proteinConcentration',
      { value: 1, unit: 'Pa' },
      '/assay/proteinConcentration/unit',
      'unit of proteinConcentration must be M, mM, uM, nM or pM; found the text “Pa”',
    ],
    [
      '/related',
      [{ identifier: 'http://a.example', relation: 'Cites' }],
      '/related/0/identifier',
      'identifier must be like “10.5072/example”; found the text “http://a.example”. A DOI such as 10.5072/example, or an https address.',
    ],
    ['/series', [], '/series', 'series must hold at least 1'],
  ])('%s = %j', (place, value, pointer, detail) => {
    expect(errorsOf({ [place]: value })).toEqual([{ pointer, detail }]);
  });

  it('names a ratio with the orientation of an energy', () => {
    expect(errorsOf({ [`${PARAMETERS}/gap`]: { ...ENERGY, unit: 'ratio' } })).toEqual([
      {
        pointer: `${PARAMETERS}/gap/orientation`,
        detail:
          'gap with unit ratio takes the orientation inactive-over-active or active-over-inactive; found the text “inactive-minus-active”; did you mean “inactive-over-active”?',
      },
    ]);
  });

  it('names the entry in which both constants are null', () => {
    expect(
      errorsOf({
        [`${BINDING}/inactive`]: null,
        [`${BINDING}/active`]: null,
        [`${PARAMETERS}/correlations`]: [],
      }),
    ).toEqual([
      {
        pointer: BINDING,
        detail:
          'inactive and active must not both be null: a ligand that binds neither state is left out of binding',
      },
    ]);
  });

  it('names a role that is written otherwise', () => {
    const [error] = errorsOf({ '/contributors/0/roles': ['Writing - original draft'] });
    expect(error?.pointer).toBe('/contributors/0/roles/0');
    expect(error?.detail).toContain('did you mean “Writing – original draft”?');
  });

  it.each([[null], [[]], ['x'], [5], [true]])('%j is no document', (value) => {
    const [error, ...others] = checkSchema(value);
    expect(others).toEqual([]);
    expect(error?.pointer).toBe('');
    expect(error?.detail).toMatch(/^the document must be an object with format, title/);
  });

  it('does not take a key that would reach the prototype', () => {
    const document = changedDocument({});
    (document as { series: { points: unknown[] }[] }).series[0]?.points.push(
      JSON.parse('{"ligands":{"__proto__":1,"toString":2},"activity":0.1}'),
    );
    expect(checkSchema(document).map(({ pointer }) => pointer)).toEqual([
      `${SERIES}/points/2/ligands/__proto__`,
      `${SERIES}/points/2/ligands/toString`,
    ]);
  });
});

describe('a large document', () => {
  const bad = { ligands: { velline: 'x' }, activity: '1', u: -1 };
  const withPoints = (count: number, point: unknown) =>
    changedDocument({ [`${SERIES}/points`]: Array.from({ length: count }, () => point) });

  it('gets its first errors told and the others counted', () => {
    const errors = checkSchema(withPoints(2000, bad));
    expect(errors).toHaveLength(MOST_ERRORS + 1);
    expect(errors.at(-1)).toEqual({
      pointer: '',
      detail: '5,000 more errors are not listed; mend these first',
    });
  });

  it('may have 20,000 points and no more', () => {
    const point = contractDocument().series[0]?.points[0];
    expect(checkSchema(withPoints(20_000, point))).toEqual([]);
    expect(checkSchema(withPoints(20_001, point))).toEqual([
      { pointer: `${SERIES}/points`, detail: 'a dataset has at most 20,000 points; here are 20,001' },
    ]);
  });

  it('may have 200 series and no more', () => {
    const series = Array.from({ length: 201 }, () => contractDocument().series[0]);
    expect(checkSchema(changedDocument({ '/series': series }))).toEqual([
      { pointer: '/series', detail: 'a dataset has at most 200 series; this one has 201' },
    ]);
  });

  it('is judged in bounded time and memory, however hostile', () => {
    const errors = checkSchema(withPoints(200_000, {}));
    expect(errors).toHaveLength(MOST_ERRORS + 1);
    const unknown = Object.fromEntries(Array.from({ length: 20_000 }, (_, i) => [`k${i}`, 1]));
    expect(checkSchema({ ...contractDocument(), ...unknown }).length).toBeLessThan(MOST_ERRORS);
  });
});
