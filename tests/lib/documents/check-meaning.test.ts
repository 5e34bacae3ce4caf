import { describe, expect, it } from 'vitest';
import { orcidCheckCharacter } from '@/lib/documents/check-orcid';
import orcids from '../../reference/orcid.json';
import { errorsOf, REMOVED } from '../../support/change-document';
import { contractDocument } from '../../support/contract-document';

const SERIES = '/series/0';
const PARAMETERS = `${SERIES}/parameters`;
const CLASS = `${PARAMETERS}/siteClasses/0`;
const BINDING = `${CLASS}/binding/0`;
const POINT = `${SERIES}/points/0`;
const CORRELATIONS = `${PARAMETERS}/correlations`;
const IMPOSSIBLE =
  'these correlations cannot all hold at once (their matrix is not positive semi-definite); some must be nearer to 0';

describe('what is wrong', () => {
  it.each<[string, unknown, string, string]>([
    [
      '/contributors/0/orcid',
      '0000-0002-1825-0098',
      '/contributors/0/orcid',
      'the check character of orcid 0000-0002-1825-0098 should be 7; please look for a mistyped digit',
    ],
    [
      `${BINDING}/inactive/unit`,
      'Pa',
      `${BINDING}/inactive/unit`,
      'ligand “velline” is given in uM, so its constant must be a concentration (M, mM, uM, nM or pM); found Pa',
    ],
    [
      `${POINT}/ligands`,
      { vellin: 3 },
      `${POINT}/ligands/vellin`,
      'ligand “vellin” must be declared in ligands; did you mean “velline”?',
    ],
    [
      `${POINT}/modulators`,
      { pH: 7 },
      `${POINT}/modulators/pH`,
      'modulator “pH” must be declared in modulators; the declared ones are V',
    ],
    [
      '/temperature/value',
      177,
      '/temperature/value',
      'temperature must be -73.15 to 176.85 degC (200 to 450 K); found 177 degC',
    ],
    [
      `${SERIES}/temperature`,
      { value: 199, unit: 'K' },
      `${SERIES}/temperature/value`,
      'temperature must be 200 to 450 K; found 199 K',
    ],
    [
      `${PARAMETERS}/gap/value`,
      -201,
      `${PARAMETERS}/gap/value`,
      'a gap may be at most 200 kT either way; -201 kT is 201.0 kT',
    ],
    [
      `${PARAMETERS}/gap`,
      { value: 500, unit: 'kJ/mol', orientation: 'inactive-minus-active' },
      `${PARAMETERS}/gap/value`,
      'a gap may be at most 200 kT either way; 500 kJ/mol is 201.7 kT',
    ],
    [
      `${CLASS}/gapPerSite`,
      { value: 1e-90, unit: 'ratio', orientation: 'active-over-inactive' },
      `${CLASS}/gapPerSite/value`,
      'a gap may be at most 200 kT either way; 1e-90 ratio is 207.2 kT',
    ],
    [
      `${BINDING}/active/value`,
      1.1e6,
      `${BINDING}/active/value`,
      'a dissociation constant must be 1e-15 to 1e3 M; found 1100000 mM',
    ],
    [
      `${POINT}/ligands/velline`,
      1e-10,
      `${POINT}/ligands/velline`,
      'concentration of velline must be 0 or 1e-15 to 1e3 M; found 1e-10 uM',
    ],
    [
      `${POINT}/modulators/V`,
      -10_001,
      `${POINT}/modulators/V`,
      'V may shift the gap by at most 200 kT; -10001 shifts it by 200.0 kT',
    ],
    [
      CORRELATIONS,
      [{ a: 'gap', b: 'gap', r: 1 }],
      `${CORRELATIONS}/0/b`,
      'a correlation is between two different quantities',
    ],
    [
      CORRELATIONS,
      [{ a: 'gap', b: 'main/velline/inactiv', r: 1 }],
      `${CORRELATIONS}/0/b`,
      '“main/velline/inactiv” is no quantity that this series states; did you mean “main/velline/inactive”?',
    ],
    [
      CORRELATIONS,
      [
        { a: 'gap', b: 'V/slope', r: 0.1 },
        { a: 'V/slope', b: 'gap', r: 0.1 },
      ],
      `${CORRELATIONS}/1`,
      `V/slope and gap already stand at ${CORRELATIONS}/0; state each pair once`,
    ],
  ])('%s = %j', (place, value, pointer, detail) => {
    expect(errorsOf({ [place]: value })).toEqual([{ pointer, detail }]);
  });

  it('names a ligand that a binding names and nobody declares', () => {
    expect(errorsOf({ [`${BINDING}/ligand`]: 'ocarate', [CORRELATIONS]: [] })).toEqual([
      {
        pointer: `${BINDING}/ligand`,
        detail: 'ligand “ocarate” must be declared in ligands; the declared ones are velline',
      },
    ]);
  });

  it('names a modulator that nobody declares, wherever it is used', () => {
    expect(errorsOf({ '/modulators': REMOVED })).toEqual([
      {
        pointer: `${PARAMETERS}/modulation/0/modulator`,
        detail: 'modulator “V” must be declared in modulators; none is declared',
      },
      {
        pointer: `${POINT}/modulators/V`,
        detail: 'modulator “V” must be declared in modulators; none is declared',
      },
    ]);
  });

  it('names a series without any gap', () => {
    expect(errorsOf({ [`${PARAMETERS}/gap`]: REMOVED, [CORRELATIONS]: REMOVED })).toEqual([
      {
        pointer: `${PARAMETERS}/gap`,
        detail: 'a series needs gap (of the whole complex) or gapPerSite (of a site class)',
      },
    ]);
  });

  it('names ids and statements that stand twice', () => {
    const { ligands, modulators, series } = contractDocument();
    const parameters = series[0]?.parameters;
    const changes = {
      '/ligands': [...ligands, ...ligands],
      '/modulators': [...(modulators ?? []), ...(modulators ?? [])],
      [`${PARAMETERS}/siteClasses`]: [
        ...(parameters?.siteClasses ?? []),
        { id: 'main', sites: { value: 1 }, binding: [] },
      ],
      [`${PARAMETERS}/modulation`]: [...(parameters?.modulation ?? []), ...(parameters?.modulation ?? [])],
      [`${PARAMETERS}/correlations`]: [],
    };
    expect(errorsOf(changes)).toEqual([
      {
        pointer: '/ligands/1/id',
        detail: '“velline” already stands at /ligands/0; each ligand needs an id of its own',
      },
      {
        pointer: '/modulators/1/id',
        detail: '“V” already stands at /modulators/0; each modulator needs an id of its own',
      },
      {
        pointer: `${PARAMETERS}/siteClasses/1/id`,
        detail: `“main” already stands at ${CLASS}; each site class needs an id of its own`,
      },
      {
        pointer: `${PARAMETERS}/modulation/1/modulator`,
        detail: `“V” already stands at ${PARAMETERS}/modulation/0; a series states the slope of a modulator once`,
      },
    ]);
    expect(errorsOf({ '/series': [series[0], series[0]] })).toEqual([
      {
        pointer: '/series/1/id',
        detail: '“wt” already stands at /series/0; each series needs an id of its own',
      },
    ]);
    const binding = parameters?.siteClasses[0]?.binding ?? [];
    expect(errorsOf({ [`${CLASS}/binding`]: [...binding, ...binding] })).toEqual([
      {
        pointer: `${CLASS}/binding/1/ligand`,
        detail: `“velline” already stands at ${BINDING}; a site class states the binding of a ligand once`,
      },
    ]);
  });

  it('names a series without points, and one with too many over all series', () => {
    expect(errorsOf({ [`${SERIES}/points`]: [] })).toEqual([
      { pointer: `${SERIES}/points`, detail: 'a series needs at least one point' },
    ]);
    const [one] = contractDocument().series;
    const many = ['a', 'b'].map((id) => ({
      ...one,
      id,
      points: Array.from({ length: 10_001 }, () => one?.points[0]),
    }));
    expect(errorsOf({ '/series': many })).toEqual([
      { pointer: '/series', detail: 'a dataset has at most 20,000 points; here are 20,002' },
    ]);
  });
});

describe('ranges', () => {
  it('include their ends in spite of rounding', () => {
    expect(
      errorsOf({
        '/temperature': { value: -73.15, unit: 'degC' },
        [`${POINT}/ligands/velline`]: 1e-9,
        [`${SERIES}/points/1/ligands/velline`]: 1e9,
        [`${BINDING}/inactive`]: { value: 0.001, unit: 'pM' },
        [`${BINDING}/active`]: { value: 1000, unit: 'M' },
        [`${PARAMETERS}/gap/value`]: 200,
        [`${POINT}/modulators/V`]: 10_000,
      }),
    ).toEqual([]);
  });
});

describe('correlations', () => {
  const trio = (r: number) => [
    { a: 'gap', b: 'main/velline/inactive', r: 0.9 },
    { a: 'gap', b: 'main/velline/active', r: 0.9 },
    { a: 'main/velline/inactive', b: 'main/velline/active', r },
  ];

  it('must be able to hold at once', () => {
    // With two correlations of 0.9 the third must be at least 2·0.81 − 1 = 0.62.
    expect(errorsOf({ [CORRELATIONS]: trio(0.61) })).toEqual([{ pointer: CORRELATIONS, detail: IMPOSSIBLE }]);
    expect(errorsOf({ [CORRELATIONS]: trio(0.63) })).toEqual([]);
  });

  it('may be complete', () => {
    const [first, second, third] = trio(-1);
    const complete = [{ ...first, r: 1 }, { ...second, r: -1 }, third];
    expect(errorsOf({ [CORRELATIONS]: complete })).toEqual([]);
    expect(errorsOf({ [CORRELATIONS]: [{ ...first, r: 1 }, { ...second, r: 1 }, third] })).toEqual([
      { pointer: CORRELATIONS, detail: IMPOSSIBLE },
    ]);
  });
});

describe('shared quantities', () => {
  const [one] = contractDocument().series;
  const shared = (id: string, u: number | undefined, correlation: { a: string; b: string; r: number }) => ({
    ...one,
    id,
    parameters: {
      ...one?.parameters,
      gap: { value: 2.4, unit: 'kT', orientation: 'inactive-minus-active', u, sharedAs: 'gap' },
      siteClasses: [
        {
          id: 'main',
          sites: { value: 6, u: 0.1, sharedAs: 'sites' },
          binding: [
            {
              ligand: 'velline',
              inactive: { value: 18, unit: 'uM', u: 1, sharedAs: 'KI' },
              active: { value: 900, unit: 'uM', u: 9 },
            },
          ],
        },
      ],
      correlations: [correlation],
    },
  });
  const A = { a: 'gap', b: 'main/sites', r: 0.9 };

  it('are stated alike; an uncertainty left out is 0', () => {
    expect(errorsOf({ '/series': [shared('a', 0, A), shared('b', undefined, A)] })).toEqual([]);
    expect(errorsOf({ '/series': [shared('a', 0.1, A), shared('b', 0.2, A)] })).toEqual([
      {
        pointer: '/series/1/parameters/gap',
        detail:
          'what is shared as “gap” must be stated as at /series/0/parameters/gap; otherwise give it another label',
      },
    ]);
  });

  it('are of one kind', () => {
    expect(errorsOf({ '/temperature/sharedAs': 'x', [`${CLASS}/sites/sharedAs`]: 'x' })).toEqual([
      {
        pointer: `${CLASS}/sites/sharedAs`,
        detail: '“x” is the label of a temperature at /temperature; a number of sites needs another label',
      },
    ]);
  });

  it('are correlated alike in every series', () => {
    expect(errorsOf({ '/series': [shared('a', 0.1, A), shared('b', 0.1, { ...A, r: 0.8 })] })).toEqual([
      {
        pointer: '/series/1/parameters/correlations/0/r',
        detail:
          'the shared quantity “gap” and the shared quantity “sites” have r = 0.9 at /series/0/parameters/correlations/0; it must be the same here',
      },
    ]);
  });

  it('have correlations that can hold at once in the whole dataset', () => {
    const B = { a: 'gap', b: 'main/velline/inactive', r: 0.6 };
    const C = { a: 'main/sites', b: 'main/velline/inactive', r: -0.9 };
    const series = [shared('a', 0.1, { ...A, r: 0.6 }), shared('b', 0.1, B), shared('c', 0.1, C)];
    expect(errorsOf({ '/series': series.slice(0, 2) })).toEqual([]);
    expect(errorsOf({ '/series': series })).toEqual([
      { pointer: '/series', detail: `with what is shared between series, ${IMPOSSIBLE}` },
    ]);
  });

  it('may each be strongly correlated with what is the own of many series, as in a global fit', () => {
    const own = ['a', 'b', 'c'].map((id) => {
      const series = shared(id, 0.1, A);
      const { sharedAs: _, ...gap } = series.parameters.gap;
      return { ...series, parameters: { ...series.parameters, gap } };
    });
    expect(errorsOf({ '/series': own })).toEqual([]);
  });
});

describe('the check character of an ORCID iD', () => {
  it.each(orcids.valid)('is right in %s', (orcid) => {
    expect(orcidCheckCharacter(orcid.replaceAll('-', '').slice(0, -1))).toBe(orcid.at(-1));
    expect(errorsOf({ '/contributors/0/orcid': orcid })).toEqual([]);
  });

  it.each(orcids.invalid)('is wrong in %s', (orcid) => {
    expect(errorsOf({ '/contributors/0/orcid': orcid })).toHaveLength(1);
  });
});
