/** How many refits one address may ask for. */
import type { ComputationLimits } from '@/lib/assessments/computation-limits';

/**
 * Longer than a refit may go without a sign of life (a minute for its body, and the time that another process needs to
 * take it over; one that goes on as a job renews its place with each sign): after it a place is a dead process's.
 */
export const REFIT_PLACE_MS = 240_000;

const CALLS_PER_MINUTE = 30;

/** The limits in force: those of the contract, ten times the calls in the demonstration. */
export function refitLimits(demo: boolean): ComputationLimits {
  return {
    callsPerMinute: CALLS_PER_MINUTE * (demo ? 10 : 1),
    pointsPerMinute: Number.POSITIVE_INFINITY,
    atOnce: 1,
  };
}
