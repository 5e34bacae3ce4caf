import { describe, expect, it } from 'vitest';
import { NO_FILTERS } from '@/components/datasets/browse-address';
import { looserWays } from '@/components/datasets/looser-ways';
import type { Facets } from '@/schemas/dataset-answers';

const facet = (...datasets: number[]) =>
  datasets.map((n, i) => ({ value: `v${i}`, name: `V ${i}`, datasets: n }));
const NONE: Facets = { system: [], lab: [], ligand: [], flag: facet(0, 0, 0) };

describe('where nothing fits', () => {
  it('the one filter in the way is named with what is behind it, the most first', () => {
    const filters = { ...NO_FILTERS, system: ['a'], lab: ['b'] };
    const ways = looserWays(filters, { ...NONE, system: facet(2, 3), lab: facet(9) });
    expect(ways.map(({ words, datasets }) => [words, datasets])).toEqual([
      ['any laboratory', 9],
      ['any system', 5],
    ]);
    expect(ways[0].filters).toEqual({ ...filters, lab: [] });
  });

  it('a filter that alone is not in the way is not offered, nor one that the page sets', () => {
    const filters = { ...NO_FILTERS, system: ['a'], lab: ['b'], flag: ['warning' as const] };
    expect(looserWays(filters, { ...NONE, lab: facet(4) }, 'lab')).toEqual([]);
  });

  it('what no facet counts is offered without a number', () => {
    const filters = { ...NO_FILTERS, variant: ['x'], q: ['word'], from: 1, to: 2 };
    const ways = looserWays(filters, NONE);
    expect(ways.map(({ datasets }) => datasets)).toEqual([null, null, null]);
    expect(ways.find(({ words }) => words === 'all energies')?.filters).toEqual({
      ...filters,
      from: null,
      to: null,
    });
  });
});
