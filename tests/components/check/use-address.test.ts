import { describe, expect, it } from 'vitest';
import { readAddress, writeAddress } from '@/components/check/use-address';

const NOTHING = { example: null, window: null, byLigand: null };

describe('the address', () => {
  it.each([
    NOTHING,
    { example: 'collapse' as const, window: null, byLigand: null },
    { example: 'mixed-classes' as const, window: { from: -3.25, to: 4 }, byLigand: 'ocarate' },
    { example: 'thousand-fold' as const, window: { from: 0.1, to: 0.3 }, byLigand: null },
    { example: null, window: null, byLigand: 'a&b=c #d' },
  ])('leads back to what it was made of: %j', (address) => {
    expect(readAddress(writeAddress(address))).toEqual(address);
  });

  it('says that one’s own data are shown, and nothing of them', () => {
    expect(writeAddress(NOTHING)).toBe('?result=own');
  });

  it.each([
    '?example=../etc/passwd',
    '?example=toString',
    '?from=-3',
    '?from=a&to=b',
    '?from=&to=5',
    '?from=1&to=1.1',
    '?from=-Infinity&to=4',
    '?from=0x1&to=0x9',
    '?unknown=1',
  ])('%s asks for nothing', (search) => {
    expect(readAddress(search)).toEqual(NOTHING);
  });

  it('puts the edges of a window in order', () => {
    expect(readAddress('?from=4&to=-4').window).toEqual({ from: -4, to: 4 });
  });
});
