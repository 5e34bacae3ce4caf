import { describe, expect, it } from 'vitest';
import { etagOf, readIfMatch, versionRefusal } from '@/lib/serving/if-match';

const read = (value?: string) => readIfMatch(new Headers(value === undefined ? {} : { 'If-Match': value }));

describe('If-Match', () => {
  it.each([
    [undefined, null],
    ['*', 'any'],
    ['"3"', [3]],
    ['"3", "12"', [3, 12]],
    ['"3-w-x_Y-z"', [3]],
    ['"12-r2-abc", "3"', [12, 3]],
    ['"3-w x"', []],
    ['W/"3"', []],
    ['3', []],
    ['"0"', []],
    ['"3x"', []],
    ['"99999999999999999999"', []],
  ])('%j means %j', (header, meaning) => {
    expect(read(header)).toEqual(meaning);
  });

  it('takes back the ETag that was given out', () => {
    expect(read(etagOf(41))).toEqual([41]);
  });

  it('is needed, and refuses another version', () => {
    expect(versionRefusal(null, 3)).toBe('precondition-required');
    expect(versionRefusal([2], 3)).toBe('stale');
    expect(versionRefusal([], 3)).toBe('stale');
    expect(versionRefusal([2, 3], 3)).toBeNull();
    expect(versionRefusal('any', 3)).toBeNull();
  });
});
