import { describe, expect, it } from 'vitest';
import { countedWindow, filterParameters } from '@/lib/datasets/dataset-filter';
import { cellWindow, energyCellOf } from '@/lib/datasets/density-grid';
import { readDatasetFilters, readDatasetQuery } from '@/schemas/dataset-query';

function filters(query: string) {
  const read = readDatasetFilters(new URLSearchParams(query));
  if (!read.ok) throw new Error(read.detail);
  return read.query;
}

describe('the filters of an address', () => {
  it('are read and written back', () => {
    const query = 'system=a&system=b&variant=wild+type&flag=off-curve&from=-2.5&to=1e1&q=hinge++AlrQ';
    expect(filters(query)).toEqual({
      system: ['a', 'b'],
      lab: [],
      ligand: [],
      variant: ['wild type'],
      flag: ['off-curve'],
      from: -2.5,
      to: 10,
      q: ['hinge', 'AlrQ'],
    });
    const written = filterParameters(filters(query));
    expect(`${written}`).toBe(
      'system=a&system=b&variant=wild+type&flag=off-curve&from=-2.5&to=10&q=hinge+AlrQ',
    );
    expect(filters(`${written}`)).toEqual(filters(query));
  });

  it.each([
    ['from=warm', 'from'],
    ['from=1&from=2', 'from'],
    ['from=2&to=2', 'to'],
    ['to=1e999', 'to'],
    ['flag=off', 'flag'],
    ['system=', 'system'],
    ['systems=a', 'systems'],
    ['limit=0', 'limit'],
    ['limit=101', 'limit'],
    ['limit=ten', 'limit'],
    ['cursor=!', 'cursor'],
    [`q=${'a '.repeat(11)}`, 'q'],
    [`q=${'a'.repeat(201)}`, 'q'],
  ])('%s: the parameter is named', (query, name) => {
    const read = readDatasetQuery(new URLSearchParams(query));
    if (read.ok) throw new Error('It should have been refused.');
    expect(read.detail).toMatch(new RegExp(`parameter “?${name}”? `));
  });
});

describe('a window', () => {
  it('is counted in whole cells, its edges moved outwards', () => {
    expect(cellWindow(null, null)).toBeNull();
    expect(cellWindow(-0.3, 0.3)).toEqual({ firstCell: -3, endCell: 3 });
    expect(cellWindow(0.31, 0.39)).toEqual({ firstCell: 3, endCell: 4 });
    expect(countedWindow({ from: 0.31, to: null }, cellWindow(0.31, null))).toEqual({ from: 0.3, to: null });
    expect(countedWindow({ from: -1.25, to: 2.01 }, cellWindow(-1.25, 2.01))).toEqual({
      from: -1.3,
      to: 2.1,
    });
  });

  it('takes a point on a cell’s lower edge into the cell', () => {
    expect(energyCellOf(-0.1)).toBe(-1);
    expect(energyCellOf(0)).toBe(0);
    expect(energyCellOf(0.05)).toBe(0);
    expect(energyCellOf(-0.05)).toBe(-1);
  });
});
