import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkDocument } from '@/lib/documents/check-document';
import { membersOf } from '@/lib/documents/json-pointer';
import { changedDocument, errorsOf, REMOVED } from '../../support/change-document';
import { contractDocument } from '../../support/contract-document';

const PARAMETERS = '/series/0/parameters';
const BINDING = `${PARAMETERS}/siteClasses/0/binding/0`;

const pointersOf = (changes: Record<string, unknown>) => errorsOf(changes).map(({ pointer }) => pointer);

describe('all errors come at once', () => {
  it('of schema and of meaning, in one series too', () => {
    const changes = {
      '/title': REMOVED,
      '/licence': 'MIT',
      '/contributors/0/orcid': '0000-0002-1825-0098',
      '/temperature/value': 500,
      [`${PARAMETERS}/gap/u`]: -1,
      [`${BINDING}/inactive/unit`]: 'kPa',
      [`${BINDING}/active/u`]: '0,1',
      '/series/0/points/0/activity': '0,41',
      '/series/0/points/0/ligands/vellin': 2,
      '/series/0/points/1/replicates': [0.4],
    };
    expect(pointersOf(changes).sort()).toEqual(
      [
        ...Object.keys(changes).filter((pointer) => pointer !== '/temperature/value'),
        '/temperature/value',
      ].sort(),
    );
  });

  it('of correlations beside a broken gap', () => {
    const changes = {
      [`${PARAMETERS}/gap/value`]: '2,4',
      [`${PARAMETERS}/correlations`]: [{ a: 'gap', b: 'main/site', r: 0.5 }],
    };
    expect(pointersOf(changes)).toEqual([`${PARAMETERS}/gap/value`, `${PARAMETERS}/correlations/0/b`]);
  });

  it('and nothing is said that only follows from another error', () => {
    expect(pointersOf({ [`${BINDING}/ligand`]: 7 })).toEqual([`${BINDING}/ligand`]);
    expect(pointersOf({ '/ligands': 'velline' })).toEqual(['/ligands']);
    expect(pointersOf({ '/ligands/0/unit': 'µM' })).toEqual(['/ligands/0/unit']);
    expect(pointersOf({ [`${PARAMETERS}/siteClasses/0/id`]: 'a/b' })).toEqual([
      `${PARAMETERS}/siteClasses/0/id`,
    ]);
    expect(pointersOf({ [`${PARAMETERS}/siteClasses/0/sites`]: REMOVED })).toEqual([
      `${PARAMETERS}/siteClasses/0/sites`,
    ]);
    expect(pointersOf({ '/series/0/points': [5] })).toEqual(['/series/0/points/0']);
    expect(pointersOf({ [PARAMETERS]: REMOVED })).toEqual([PARAMETERS]);
    expect(pointersOf({ '/contributors': REMOVED, '/temperature': REMOVED })).toEqual([
      '/contributors',
      '/temperature',
    ]);
  });

  it('and the document itself stays as it was', () => {
    const document = changedDocument({ [`${PARAMETERS}/gap/u`]: -1, '/series/0/points/0': 3 });
    const before = structuredClone(document);
    checkDocument(document);
    expect(document).toEqual(before);
  });
});

/** Pointers of every place in the small complete document, the outermost first. */
function placesOf(value: unknown, base = ''): string[] {
  if (typeof value !== 'object' || value === null) return [base];
  return [base, ...Object.entries(value).flatMap(([key, member]) => placesOf(member, `${base}/${key}`))];
}

describe('whatever stands in a document', () => {
  const places = placesOf(contractDocument()).slice(1);
  const rubbish = fc.oneof(
    fc.constant(REMOVED),
    fc.jsonValue({ maxDepth: 2 }),
    fc.constantFrom(null, [], {}, '', -1, 0, 1e308, Number.POSITIVE_INFINITY, 'gap', [null], { id: 'wt' }, [
      {},
    ]),
  );

  it('it is judged without failing, and every error has a place and a sentence', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.constantFrom(...places), rubbish), { minLength: 1, maxLength: 4 }),
        (changes) => {
          const deepestFirst = changes.sort(([a], [b]) => membersOf(b).length - membersOf(a).length);
          const checked = checkDocument(changedDocument(Object.fromEntries(deepestFirst)));
          if (checked.ok) return;
          expect(checked.errors.length).toBeGreaterThan(0);
          for (const { pointer, detail } of checked.errors) {
            expect(pointer).toMatch(/^(\/.*)?$/s);
            expect(detail).not.toMatch(/undefined|\[object|NaN/);
          }
          expect(new Set(checked.errors.map((error) => JSON.stringify(error))).size).toBe(
            checked.errors.length,
          );
        },
      ),
      { numRuns: 2000, seed: 7 },
    );
  });
});
