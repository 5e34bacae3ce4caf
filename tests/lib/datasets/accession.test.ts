import { describe, expect, it } from 'vitest';
import { formatAccession, parseAccession } from '@/lib/datasets/accession';

describe('accessions', () => {
  it.each([
    [123, undefined, 'CK-000123'],
    [123, 2, 'CK-000123.2'],
    [1_234_567, 10, 'CK-1234567.10'],
  ])('%s, revision %s: %s and back', (accession, revision, text) => {
    expect(formatAccession(accession, revision)).toBe(text);
    expect(parseAccession(text)).toEqual({ accession, revision: revision ?? null });
  });

  it.each([
    'CK-123',
    'CK-000000',
    'ck-000123',
    'CK-000123.0',
    'CK-000123.02',
    'CK-000123.',
    'CK-0000123',
    ' CK-000123',
    'CK-000123\n',
    '',
  ])('%j is none', (text) => {
    expect(parseAccession(text)).toBeNull();
  });
});
