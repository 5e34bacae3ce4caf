import { describe, expect, it } from 'vitest';
import { emptyDocument } from '@/components/deposits/empty-document';
import { formPlace, inFormWords } from '@/components/deposits/form-words';
import { parseDocument } from '@/lib/documents/parse-document';

const DOCUMENT = {
  ligands: [{ id: 'velline', name: 'Velline', unit: 'uM' }],
  series: [
    {
      label: 'wild type',
      parameters: { siteClasses: [{ id: 'main', binding: [{ ligand: 'velline' }] }] },
    },
  ],
};

describe('a place of the document, as the form has it', () => {
  it.each([
    ['/series/0/points/2/activity', 'Activity', 'point 3 of wild type'],
    ['/series/0/points/0/ligands/velline', 'Velline', 'point 1 of wild type'],
    ['/series/0/parameters/siteClasses/0/binding/0/inactive/value', 'K inactive of Velline', 'wild type'],
    ['/series/0/parameters/gap/orientation', 'Orientation of energy gap', 'wild type'],
    ['/series/0/label', 'Name of the series', 'series 1'],
    ['/series/4/variant', 'Variant', 'series 5'],
    ['/ligands/0/relativeU', 'Uncertainty of each dispensing of Velline', ''],
    ['/contributors/1/name', 'Name of contributor 2', ''],
  ])('%s is %s, %s', (pointer, label, where) => {
    expect(formPlace(pointer, DOCUMENT)).toEqual({ label, where });
  });

  it('has no name where the form has no field', () => {
    expect(formPlace('/funding/0/funder', DOCUMENT)).toBeNull();
    const error = { pointer: '/mine', detail: 'unknown property “mine”' };
    expect(inFormWords(error, DOCUMENT)).toBe(error);
  });
});

it('what an empty draft lacks is said in the words of the form alone', () => {
  const draft = { ...emptyDocument('A. Person'), temperature: { value: 'warm', unit: 'degC' } };
  const report = parseDocument(new TextEncoder().encode(JSON.stringify(draft)));
  if (report.ok || report.reason !== 'invalid') throw new Error('an empty draft is not valid');
  const sentences = report.errors.map((error) => inFormWords(error, draft).detail);
  expect(sentences).toContain('Name of the series must not be empty');
  expect(sentences).toContain('K inactive of ligand is missing: a number, such as 18');
  expect(sentences).toContain('Temperature must be a number, such as 25; found the text “warm”');
  for (const sentence of sentences) expect(sentence).not.toMatch(/relativeU|fittedCount|^label| needs \w+:/);
});
