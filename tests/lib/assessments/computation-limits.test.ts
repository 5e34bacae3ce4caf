import { describe, expect, it } from 'vitest';
import {
  computationLimits,
  quotaAfter,
  refusalOf,
  retryAfterSeconds,
  type Use,
} from '@/lib/assessments/computation-limits';
import { limitHeaders } from '@/lib/assessments/limit-headers';

const limits = computationLimits(false);
const NOW = 1_800_000_000;

function use(overrides: Partial<Use> = {}): Use {
  return { seconds: [], underWay: 0, reservedPoints: 0, ...overrides };
}

describe('limits on open computation', () => {
  it('are those of the contract, ten times higher in the demonstration', () => {
    expect(limits).toEqual({ callsPerMinute: 120, pointsPerMinute: 200_000, atOnce: 2 });
    expect(computationLimits(true)).toEqual({ callsPerMinute: 1200, pointsPerMinute: 2_000_000, atOnce: 20 });
  });

  it('let a first call in', () => {
    expect(refusalOf(quotaAfter(use(), limits, NOW))).toBeNull();
  });

  it.each([
    ['too-many-calls', use({ seconds: [{ second: NOW - 1, calls: 120, points: 0 }] })],
    ['too-many-points', use({ seconds: [{ second: NOW - 1, calls: 1, points: 200_000 }] })],
    ['too-many-points', use({ reservedPoints: 200_000, underWay: 1 })],
    ['too-many-at-once', use({ underWay: 2 })],
  ] as const)('refuse with %s', (refusal, used) => {
    expect(refusalOf(quotaAfter(used, limits, NOW))).toBe(refusal);
  });

  it('say when a call is let in again: when enough of the oldest use has left the window', () => {
    const seconds = [
      { second: NOW - 50, calls: 10, points: 150_000 },
      { second: NOW - 20, calls: 110, points: 50_000 },
    ];
    expect(retryAfterSeconds('too-many-calls', use({ seconds }), limits, NOW)).toBe(10);
    expect(retryAfterSeconds('too-many-points', use({ seconds }), limits, NOW, 20_000)).toBe(10);
    expect(retryAfterSeconds('too-many-points', use({ seconds }), limits, NOW, 160_000)).toBe(40);
    expect(retryAfterSeconds('too-many-at-once', use({ underWay: 2 }), limits, NOW)).toBe(1);
  });

  it('are told in structured fields', () => {
    const quota = quotaAfter(
      use({ seconds: [{ second: NOW - 20, calls: 20, points: 5_000 }], underWay: 1 }),
      limits,
      NOW,
    );
    expect(limitHeaders(quota)).toEqual({
      'RateLimit-Policy':
        '"calls";q=120;w=60, "points";q=200000;w=60;qu="points", "at-once";q=2;qu="concurrent-requests"',
      RateLimit: '"calls";r=100;t=40, "points";r=195000;t=40, "at-once";r=1',
    });
  });
});
