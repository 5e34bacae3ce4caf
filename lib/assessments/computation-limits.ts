/**
 * How much one address may compute: a number of calls and of points within any sixty seconds, and a number of calls
 * at a time. Pure: what was used comes in, the decision goes out.
 */
export interface ComputationLimits {
  callsPerMinute: number;
  pointsPerMinute: number;
  atOnce: number;
}

export interface SecondOfUse {
  /** Unix time, s */
  second: number;
  calls: number;
  points: number;
}

export interface Use {
  /** within the window, oldest first */
  seconds: SecondOfUse[];
  /** computations under way */
  underWay: number;
  /** points set aside for those */
  reservedPoints: number;
}

/** What is left of one limit; `resetSeconds` is when some of it comes back. */
export interface Allowance {
  left: number;
  resetSeconds: number;
}

export interface Quota {
  limits: ComputationLimits;
  calls: Allowance;
  points: Allowance;
  atOnceLeft: number;
}

export type Refusal = 'too-many-calls' | 'too-many-points' | 'too-many-at-once';

export const WINDOW_SECONDS = 60;

const PUBLIC_LIMITS: ComputationLimits = { callsPerMinute: 120, pointsPerMinute: 200_000, atOnce: 2 };

/** The limits in force: those of the contract, ten times higher in the demonstration. */
export function computationLimits(demo: boolean): ComputationLimits {
  const times = demo ? 10 : 1;
  return {
    callsPerMinute: PUBLIC_LIMITS.callsPerMinute * times,
    pointsPerMinute: PUBLIC_LIMITS.pointsPerMinute * times,
    atOnce: PUBLIC_LIMITS.atOnce * times,
  };
}

/** What is left after `use`, at Unix time `now` (s). */
export function quotaAfter(use: Use, limits: ComputationLimits, now: number): Quota {
  const resetSeconds = secondsUntilLeft(use.seconds[0]?.second ?? now, now);
  const pointsUsed = total(use.seconds, 'points') + use.reservedPoints;
  return {
    limits,
    calls: { left: Math.max(0, limits.callsPerMinute - total(use.seconds, 'calls')), resetSeconds },
    points: { left: Math.max(0, limits.pointsPerMinute - pointsUsed), resetSeconds },
    atOnceLeft: Math.max(0, limits.atOnce - use.underWay),
  };
}

/** Why a further call is refused, or null where it is not. */
export function refusalOf(quota: Quota): Refusal | null {
  if (quota.calls.left === 0) return 'too-many-calls';
  if (quota.atOnceLeft === 0) return 'too-many-at-once';
  return quota.points.left === 0 ? 'too-many-points' : null;
}

/**
 * After how many seconds a refused call would be let in.
 *
 * @param neededPoints how many points it brings, at least 1
 * @returns whole seconds, 1 to 61
 */
export function retryAfterSeconds(
  refusal: Refusal,
  use: Use,
  limits: ComputationLimits,
  now: number,
  neededPoints = 1,
): number {
  if (refusal === 'too-many-at-once') return 1;
  const [quantity, most] =
    refusal === 'too-many-calls'
      ? (['calls', limits.callsPerMinute - 1] as const)
      : (['points', limits.pointsPerMinute - neededPoints] as const);
  let used = total(use.seconds, quantity);
  for (const entry of use.seconds) {
    if (used <= most) break;
    used -= entry[quantity];
    if (used <= most) return secondsUntilLeft(entry.second, now);
  }
  // What stands in the way is set aside for calls under way, which end soon.
  return 1;
}

function total(seconds: SecondOfUse[], quantity: 'calls' | 'points'): number {
  return seconds.reduce((sum, entry) => sum + entry[quantity], 0);
}

function secondsUntilLeft(second: number, now: number): number {
  return Math.max(1, second + WINDOW_SECONDS - now);
}
