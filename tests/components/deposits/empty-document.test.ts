import { expect, it } from 'vitest';
import { CREDIT_ROLES } from '@/components/deposits/credit-roles';
import { withValueAt } from '@/components/deposits/draft-value';
import { emptyDocument } from '@/components/deposits/empty-document';
import { checkDocument } from '@/lib/documents/check-document';
import schema from '@/schemas/dataset-1.schema.json';

const FILLED: [string, unknown][] = [
  ['/title', 'A title'],
  ['/system', 'alrq-velline'],
  ['/contributors/0/roles', ['Investigation']],
  ['/assay', { readout: 'FRET', conditions: 'pH 7.4' }],
  ['/ligands/0/name', 'velline'],
  ['/series/0/label', 'wild type'],
  ['/series/0/variant', 'wild type'],
  ['/series/0/parameters/gap/value', 2.4],
  ['/series/0/parameters/siteClasses/0/sites/value', 6],
  ['/series/0/parameters/siteClasses/0/binding/0/inactive/value', 18],
  ['/series/0/parameters/siteClasses/0/binding/0/active/value', 900],
  ['/series/0/points', [{ ligands: { ligand: 1 }, activity: 0.9, u: 0.02 }]],
];

it('a new draft is wrong only where it is still empty: filled in, it is valid', () => {
  const empty = emptyDocument('R. Example');
  const checked = checkDocument(empty);
  expect(checked.ok).toBe(false);
  const places = FILLED.map(([pointer]) => pointer);
  const elsewhere = checked.ok
    ? []
    : checked.errors.filter(({ pointer }) => !places.some((place) => pointer.startsWith(place)));
  expect(elsewhere).toEqual([]);
  const filled = FILLED.reduce((draft, [pointer, value]) => withValueAt(draft, pointer, value), empty);
  expect(checkDocument(filled)).toEqual({ ok: true, document: filled });
});

it('offers the roles of the format', () => {
  const { roles } = schema.$defs.contributor.properties;
  expect(CREDIT_ROLES).toEqual(roles.items.enum);
});
