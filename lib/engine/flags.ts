/**
 * Policy 1: when a point is said to lie on the curve, to be a warning, or to lie off it. An assessment
 * records the policy's number and never changes afterwards.
 *
 * The limits are the two-sided normal tails beyond two and three standard uncertainties, which ISO 13528
 * uses as warning and action limits for scores.
 */
import type { Flag } from './assessment';

export const POLICY = {
  number: 1,
  /** u_0: no two-state description is trusted beyond this, in activity */
  modelFloor: 0.01,
  /** u_a where a point states neither an uncertainty nor replicates */
  assumedActivityU: 0.02,
  /** P(|Z| > 2) */
  warningBelow: 0.0455002638963584,
  /** P(|Z| > 3) */
  offCurveBelow: 0.00269979606326019,
} as const;

/** The flag of a point whose two-sided p is `pValue`. */
export function flagOf(pValue: number): Flag {
  if (pValue < POLICY.offCurveBelow) return 'off-curve';
  return pValue < POLICY.warningBelow ? 'warning' : 'on-curve';
}

/** How many of `points` correct points chance alone would flag. */
export function expectedByChance(points: number): { warning: number; offCurve: number } {
  return {
    warning: points * (POLICY.warningBelow - POLICY.offCurveBelow),
    offCurve: points * POLICY.offCurveBelow,
  };
}
