import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  isFiltered,
  NO_FILTERS,
  readBrowseAddress,
  toggled,
  windowSlip,
  wordsOf,
  writeBrowseAddress,
} from '@/components/datasets/browse-address';
import { datasetFiltersSchema, readDatasetFilters } from '@/schemas/dataset-query';

const read = (search: string) => readBrowseAddress(new URLSearchParams(search));

describe('the address of a browsing page', () => {
  it('holds every filter and the window, each choice once', () => {
    expect(
      read('system=a&system=b&system=a&lab=c&ligand=d&variant=e&flag=off-curve&from=-2.5&to=3&q=two+words'),
    ).toEqual({
      system: ['a', 'b'],
      lab: ['c'],
      ligand: ['d'],
      variant: ['e'],
      flag: ['off-curve'],
      from: -2.5,
      to: 3,
      q: ['two', 'words'],
    });
  });

  it('leaves out what cannot be read', () => {
    expect(read('flag=purple&from=left&to=&q=&system=&nothing=1&lab=%20')).toEqual(NO_FILTERS);
    expect(read('from=3&to=-3')).toEqual(NO_FILTERS);
    expect(read('from=1e9&to=Infinity')).toEqual(NO_FILTERS);
  });

  it('takes a true minus sign, as people copy it from the page', () => {
    expect(read('from=\u22124').from).toBe(-4);
  });

  it('says the same again after it was written', () => {
    const text = fc.string({ minLength: 1, maxLength: 30 }).filter((value) => value.trim() === value);
    const names = fc.uniqueArray(text, { maxLength: 5 });
    const energy = fc.integer({ min: -400, max: 400 }).map((tenths) => tenths / 10);
    fc.assert(
      fc.property(names, names, energy, energy, (system, lab, a, b) => {
        fc.pre(a < b);
        const filters = { ...NO_FILTERS, system, lab, from: a, to: b, q: ['x'] };
        expect(readBrowseAddress(writeBrowseAddress(filters))).toEqual(filters);
      }),
    );
  });

  it('asks the API for nothing that it refuses', () => {
    const many = Array.from({ length: 40 }, (_, i) => `system=s${i}&q=w${i}`).join('&');
    const long = 'x'.repeat(300);
    for (const search of [many, `q=${'w '.repeat(90)}`, `lab=${long}&q=${long}`, 'from=5&to=5', 'flag=x']) {
      const parameters = writeBrowseAddress(read(search));
      expect(readDatasetFilters(parameters)).toMatchObject({ ok: true });
    }
    expect(datasetFiltersSchema.parse({})).toEqual(NO_FILTERS);
  });
});

describe('choices', () => {
  it('are taken and given back one by one', () => {
    const one = toggled(NO_FILTERS, 'system', 'a');
    const two = toggled(one, 'system', 'b');
    expect(two.system).toEqual(['a', 'b']);
    expect(toggled(two, 'system', 'a').system).toEqual(['b']);
    expect(isFiltered(NO_FILTERS)).toBe(false);
    expect(isFiltered({ ...NO_FILTERS, from: 1, to: 2 })).toBe(false);
    expect(isFiltered(one)).toBe(true);
  });

  it('a search is its words', () => {
    expect(wordsOf('  hinge   R41\tS ')).toEqual(['hinge', 'R41', 'S']);
    expect(wordsOf('')).toEqual([]);
    expect(wordsOf('a b c d e f g h i j k l')).toHaveLength(10);
  });
});

it.each([
  ['from=abc', /“from=abc” in the address is no energy in kT/],
  ['to=1e9', /“to=1e9”/],
  ['from=5&to=-5', /ends before it begins/],
])('%s: says what cannot be meant', (query, words) => {
  expect(windowSlip(new URLSearchParams(query))).toMatch(words);
});

it('a window that can be meant is no slip', () => {
  for (const query of ['', 'from=-1&to=2', 'from=−3', 'to='])
    expect(windowSlip(new URLSearchParams(query))).toBeNull();
});
