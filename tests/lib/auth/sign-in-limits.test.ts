import { describe, expect, it } from 'vitest';
import { type Attempt, slowingOf } from '@/lib/auth/sign-in-limits';

const NOW = 1_800_000_000_000;
const HERE = { accountKey: 'owner', addressKey: 'here', at: NOW };

/** Attempts in one-second steps, the last one `agoMs` before now. */
function attempts(count: number, place: Partial<Attempt>, agoMs = 0): Attempt[] {
  return Array.from({ length: count }, (_, i) => ({ ...HERE, ...place, at: NOW - agoMs - 1000 * i }));
}

describe('slowing of failed sign-ins', () => {
  it('lets the first five go by, then asks for 1, 2, 4 … seconds and five minutes at most', () => {
    const waits = [4, 5, 6, 7, 10, 14, 40].map((count) => slowingOf(attempts(count, {}), HERE).waitMs);
    expect(waits).toEqual([0, 1000, 2000, 4000, 32_000, 300_000, 300_000]);
  });

  it('counts the wait from the last attempt', () => {
    expect(slowingOf(attempts(10, {}, 30_000), HERE).waitMs).toBe(2000);
    expect(slowingOf(attempts(10, {}, 33_000), HERE).waitMs).toBe(0);
  });

  it('forgets after a quarter of an hour', () => {
    expect(slowingOf(attempts(40, {}, 15 * 60_000), HERE)).toEqual({ waitMs: 0, holdMs: 0 });
  });

  it('makes an address wait that tries many accounts', () => {
    const tried = Array.from({ length: 32 }, (_, i) => ({ ...HERE, accountKey: `account ${i}` }));
    expect(slowingOf(tried.slice(0, 29), HERE).waitMs).toBe(0);
    expect(slowingOf(tried, HERE).waitMs).toBe(4000);
  });

  it('does not make an account wait for others behind an address where it is known, but for its own failures', () => {
    const others = attempts(40, { accountKey: 'somebody else' });
    expect(slowingOf(others, HERE, false).waitMs).toBe(300_000);
    expect(slowingOf(others, HERE, true).waitMs).toBe(0);
    expect(slowingOf([...others, ...attempts(6, {})], HERE, true).waitMs).toBe(2000);
  });

  it('does not lock the owner out from another address: the answer comes, three seconds late at most', () => {
    const elsewhere = attempts(500, { addressKey: 'elsewhere' });
    expect(slowingOf(elsewhere, HERE)).toEqual({ waitMs: 0, holdMs: 3000 });
    expect(slowingOf(elsewhere.slice(0, 20), HERE).holdMs).toBe(0);
    expect(slowingOf(elsewhere.slice(0, 25), HERE).holdMs).toBe(500);
  });
});
