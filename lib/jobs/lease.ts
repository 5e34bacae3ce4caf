/** How long a job is held without a sign of life, and how often there is one. Both ms. */
export const LEASE_MS = 20_000;
export const HEARTBEAT_MS = 2_000;

/** Pause after an attempt that found no room, ms. */
export const NO_ROOM_PAUSE_MS = 2_000;

/** How long a job that was given up is kept, so that its error can be looked at, ms. */
export const GIVEN_UP_KEPT_MS = 30 * 24 * 60 * 60_000;

/** The longest pause before another attempt, ms. */
const LONGEST_PAUSE_MS = 60 * 60_000;

/** Pause after an attempt that failed: 2 s, 8 s, 32 s … up to an hour. */
export function pauseAfter(attempts: number): number {
  return Math.min(LONGEST_PAUSE_MS, 2_000 * 4 ** (attempts - 1));
}
