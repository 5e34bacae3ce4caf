import { describe, expect, it } from 'vitest';
import { entryText, readDraft, readEntry, valueAt, withValueAt } from '@/components/deposits/draft-value';

const DRAFT = {
  title: 'a',
  odd: 'kept',
  series: [
    { id: 's1', points: [{ u: 1 }, { u: 2 }] },
    { id: 's2', points: [] },
  ],
};

describe('what stands at a pointer', () => {
  it.each([
    ['/title', 'a'],
    ['/series/0/points/1/u', 2],
    ['/series/7/points', undefined],
    ['/title/length', undefined],
    ['/constructor', undefined],
    ['', DRAFT],
  ])('%s', (pointer, expected) => {
    expect(valueAt(DRAFT, pointer)).toBe(expected);
  });

  it('follows escaped names', () => {
    expect(valueAt({ 'a/b': { 'c~d': 1 } }, '/a~1b/c~0d')).toBe(1);
  });
});

describe('another value at a pointer', () => {
  it('changes that place, and leaves what is beside the way the very same', () => {
    const next = withValueAt(DRAFT, '/series/0/points/1/u', 'x');
    expect(valueAt(next, '/series/0/points/1/u')).toBe('x');
    expect(valueAt(next, '/series/0/points/0')).toBe(DRAFT.series[0].points[0]);
    expect(valueAt(next, '/series/1')).toBe(DRAFT.series[1]);
    expect(DRAFT.series[0].points[1].u).toBe(2);
  });

  it('keeps the order of members and what it knows nothing of', () => {
    expect(Object.keys(withValueAt(DRAFT, '/title', 'b'))).toEqual(['title', 'odd', 'series']);
    expect(valueAt(withValueAt(DRAFT, '/title', 'b'), '/odd')).toBe('kept');
  });

  it('takes a member or an entry away, and adds one at the end', () => {
    expect(withValueAt(DRAFT, '/odd', undefined)).not.toHaveProperty('odd');
    expect(valueAt(withValueAt(DRAFT, '/series/0', undefined), '/series')).toEqual([DRAFT.series[1]]);
    expect(valueAt(withValueAt(DRAFT, '/series/2', { id: 's3' }), '/series/2/id')).toBe('s3');
  });

  it('makes what is missing on the way', () => {
    expect(withValueAt({}, '/assay/readout', 'FRET')).toEqual({ assay: { readout: 'FRET' } });
  });

  it('has a member called __proto__ like any other', () => {
    const next = withValueAt({}, '/__proto__', { a: 1 });
    expect(Object.keys(next)).toEqual(['__proto__']);
    expect(({} as { a?: number }).a).toBeUndefined();
  });
});

it.each([
  ['2.5', 2.5],
  ['−2,5', -2.5],
  ['', undefined],
  ['  ', undefined],
  ['0,4l', '0,4l'],
])('typed %j is %j in the draft', (text, expected) => {
  expect(readEntry(text)).toBe(expected);
});

it.each([
  [0.5, '0.5'],
  ['0,4l', '0,4l'],
  [undefined, ''],
  [[1, 2], '[1,2]'],
])('%j stands in a field as %j', (value, expected) => {
  expect(entryText(value)).toBe(expected);
});

it.each([
  ['\uFEFF{"a": 1}', { a: 1 }],
  ['[1]', null],
  ['null', null],
  ['{"a" 1}', null],
])('the text %j is the draft %j', (text, expected) => {
  expect(readDraft(text)).toEqual(expected);
});
