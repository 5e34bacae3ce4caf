/** Valid documents that would ask for more memory or time than the service has are refused with a sentence. */
import { expect, it } from 'vitest';
import { checkDocument } from '@/lib/documents/check-document';
import type { SiteClass } from '@/schemas/dataset-1.generated';
import { contractDocument } from '@/tests/support/contract-document';

/** A document of one series with `classes` site classes, two uncertain constants and one uncertain count each. */
function withClasses(classes: number, points: number, label?: (index: number) => string) {
  const document = contractDocument();
  const [series] = document.series;
  const siteClasses: SiteClass[] = Array.from({ length: classes }, (_, i) => ({
    id: `c${i}`,
    sites: { value: 1, u: 0.1, ...(label ? { sharedAs: label(i) } : {}) },
    binding: document.ligands.map(({ id }) => ({
      ligand: id,
      inactive: { value: 1, unit: 'uM', u: 0.1 },
      active: { value: 2, unit: 'uM', u: 0.1 },
    })),
  }));
  series.parameters = { ...series.parameters, siteClasses, correlations: [] };
  series.points = Array.from({ length: points }, () => ({ ligands: {}, activity: 0.5, u: 0.1 }));
  return document;
}

function errorsOf(document: unknown) {
  const checked = checkDocument(document);
  return checked.ok ? [] : checked.errors;
}

it('takes what laboratories state', () => {
  expect(errorsOf(withClasses(12, 2000))).toEqual([]);
});

it('refuses more derivatives than fit in memory', () => {
  const document = withClasses(50, 20_000);
  document.ligands = [
    ...document.ligands,
    ...['a', 'b', 'c', 'd'].map((id) => ({ ...document.ligands[0], id, name: id })),
  ];
  for (const siteClass of document.series[0].parameters.siteClasses) {
    siteClass.binding = document.ligands.map(({ id }) => ({ ...siteClass.binding[0], ligand: id }));
  }
  const errors = errorsOf(document);
  expect(errors).toContainEqual({
    pointer: '/series',
    detail: expect.stringContaining(
      'at most 4,000,000 derivatives (points × uncertain quantities) are computed',
    ),
  });
  expect(errors).toContainEqual({
    pointer: '/series/0/parameters',
    detail: expect.stringContaining('at most 400 uncertain quantities are computed'),
  });
});

it.each([
  ['/temperature/u', 400, 'u of a temperature may be at most 250 K; found 400'],
  ['/series/0/parameters/gap/u', 300, 'u of an energy may be at most 200 kT; 300 kT is 300.0 kT'],
  ['/series/0/parameters/siteClasses/0/sites/u', 601, 'u may be at most 100 times the value 6; found 601'],
  [
    '/series/0/parameters/siteClasses/0/binding/0/inactive/u',
    1e9,
    'u may be at most 100 times the value 18; found 1000000000',
  ],
])('refuses an uncertainty that no computation can carry: %s', (pointer, u, detail) => {
  const document = contractDocument();
  const members = pointer.split('/').slice(1, -1);
  const statement = members.reduce<unknown>(
    (at, member) => (at as Record<string, unknown>)[member],
    document,
  );
  (statement as { u: number }).u = u;
  expect(errorsOf(document)).toEqual([{ pointer, detail }]);
});

it('refuses a series without points, and an energy whose size no arithmetic can carry', () => {
  const document = contractDocument();
  document.series[0].points = [];
  expect(errorsOf(document)).toContainEqual(expect.objectContaining({ pointer: '/series/0/points' }));
  const steep = contractDocument();
  const [entry] = steep.series[0].parameters.modulation ?? [];
  entry.slope.value = 1.5e308;
  expect(errorsOf(steep)).toContainEqual(
    expect.objectContaining({ pointer: '/series/0/parameters/modulation/0/slope/value' }),
  );
});

it('refuses two correlations of a quantity with what is one and the same under two names', () => {
  const document = contractDocument();
  const { parameters } = document.series[0];
  const [main] = parameters.siteClasses;
  main.sites.u = 0.1;
  parameters.siteClasses = [
    { ...main, sites: { ...main.sites, sharedAs: 'sites' } },
    { ...main, id: 'second', sites: { ...main.sites, sharedAs: 'sites' } },
  ];
  parameters.correlations = [
    { a: 'gap', b: 'main/sites', r: 0.6 },
    { a: 'gap', b: 'second/sites', r: -0.6 },
  ];
  expect(errorsOf(document)).toEqual([
    {
      pointer: '/series/0/parameters/correlations/1/r',
      detail: expect.stringContaining(
        'have r = 0.6 at /series/0/parameters/correlations/0; it must be the same here',
      ),
    },
  ]);
});
