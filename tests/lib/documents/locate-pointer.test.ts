import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { membersOf, pointerTo } from '@/lib/documents/json-pointer';
import { locatePointer, locatePointers } from '@/lib/documents/locate-pointer';

const text = `{
  "title": "x",
  "series": [
    { "id": "wt", "points": [1, { "u": -1 }] },
    { "a/b": { "m~n": [ [], {} ] } }
  ]
}`;

describe('the place of a pointer', () => {
  it.each<[string, number, number]>([
    ['', 1, 1],
    ['/title', 2, 3],
    ['/series', 3, 3],
    ['/series/0', 4, 5],
    ['/series/0/points/0', 4, 30],
    ['/series/0/points/1', 4, 33],
    ['/series/0/points/1/u', 4, 35],
    ['/series/1/a~1b/m~0n/1', 5, 29],
  ])('%s is line %i, column %i', (pointer, line, column) => {
    expect(locatePointer(text, pointer)).toEqual({ line, column });
  });

  it.each<[string, number, number]>([
    ['/abstract', 1, 1],
    ['/series/0/label', 4, 5],
    ['/series/0/points/7', 4, 19],
    ['/series/0/points/1/activity', 4, 33],
    ['/title/x/y', 2, 3],
  ])('%s is missing: the place of what is around it', (pointer, line, column) => {
    expect(locatePointer(text, pointer)).toEqual({ line, column });
  });

  it('is found for many pointers in one reading, and within deep nesting', () => {
    const many = locatePointers(text, ['/title', '/series/1']);
    expect([...many]).toEqual([
      ['/title', { line: 2, column: 3 }],
      ['/series/1', { line: 5, column: 5 }],
    ]);
    const deep = '['.repeat(20_000) + ']'.repeat(20_000);
    expect(locatePointer(deep, '/0'.repeat(10_000))).toEqual({ line: 1, column: 10_001 });
  });

  it('passes over a byte order mark', () => {
    expect(locatePointer(`\uFEFF${text}`, '/title')).toEqual({ line: 2, column: 3 });
  });
});

describe('a pointer', () => {
  it('keeps any member name', () => {
    fc.assert(
      fc.property(fc.array(fc.string(), { maxLength: 5 }), (members) => {
        expect(membersOf(pointerTo('', ...members))).toEqual(members);
      }),
    );
  });

  it('is written as the standard’s examples', () => {
    // RFC 6901, section 5
    expect(pointerTo('', 'foo', 0)).toBe('/foo/0');
    expect(pointerTo('', 'a/b')).toBe('/a~1b');
    expect(pointerTo('', 'm~n')).toBe('/m~0n');
    expect(pointerTo('', '')).toBe('/');
  });
});
