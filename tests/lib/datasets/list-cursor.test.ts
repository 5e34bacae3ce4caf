import { describe, expect, it } from 'vitest';
import { decodeCursor, encodeCursor } from '@/lib/datasets/list-cursor';

const raw = (text: string) => Buffer.from(text).toString('base64url');

describe('a cursor', () => {
  it('gives back the place that it was made of', () => {
    expect(decodeCursor(encodeCursor([1_800_000_000_000, 123]), ['number', 'number'])).toEqual([
      1_800_000_000_000, 123,
    ]);
    expect(decodeCursor(encodeCursor(['a', 'b']), ['string', 'string'])).toEqual(['a', 'b']);
  });

  it.each(['[1e999,1]', '[-1e999,1]', '[1.5,1]', '[1e20,1]', '["1",1]', '[1]', '[1,1,1]', '{}', 'null', '['])(
    'of %s is none of a list of numbers',
    (text) => {
      expect(decodeCursor(raw(text), ['number', 'number'])).toBeNull();
    },
  );
});
