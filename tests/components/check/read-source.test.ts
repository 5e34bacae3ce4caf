import { describe, expect, it } from 'vitest';
import { kindOf, LARGEST_SOURCE, readFile } from '@/components/check/read-source';

describe('what a source is', () => {
  it.each([
    ['{"format": 1}', 'document'],
    ['  \n [1]', 'document'],
    ['\uFEFF{}', 'document'],
    ['', 'document'],
    ['series,velline (uM),activity', 'table'],
    ['series;activity\nwt;{', 'table'],
  ])('%j is a %s', (text, kind) => {
    expect(kindOf({ text, name: null })).toBe(kind);
  });
});

describe('a file', () => {
  it('gives its text and its name', async () => {
    const file = new File(['series,activity\n'], 'points.csv');
    expect(await readFile(file)).toEqual({ text: 'series,activity\n', name: 'points.csv' });
  });

  it('is refused in words when it is too large, just beyond the limit', async () => {
    const bytes = new Uint8Array(LARGEST_SOURCE + 1).fill(32);
    expect(await readFile(new File([bytes], 'big.json'))).toEqual({
      refused: 'big.json is larger than 8 MiB, the most that is taken.',
    });
    expect(await readFile(new File([bytes.subarray(1)], 'fits.json'))).toMatchObject({ name: 'fits.json' });
  });

  it('is refused in words when it is no text', async () => {
    const file = new File([new Uint8Array([80, 75, 3, 4, 0, 0])], 'sheet.xlsx');
    expect(await readFile(file)).toEqual({
      refused: 'sheet.xlsx is not a text file. Save the sheet as CSV, or give the document as JSON.',
    });
  });
});
