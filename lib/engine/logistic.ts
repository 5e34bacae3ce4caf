/**
 * The master curve p(f) = 1/(1 + e^(−f)): the activity expected at a free-energy coordinate f, in kT.
 * No argument overflows: the exponential is only ever taken of a number ≤ 0.
 */
export function logistic(energyKT: number): number {
  if (energyKT >= 0) return 1 / (1 + Math.exp(-energyKT));
  const e = Math.exp(energyKT);
  return e / (1 + e);
}

/** The slope of the master curve, dp/df = p(1 − p), in activity per kT; even in f, accurate in both tails. */
export function logisticSlope(energyKT: number): number {
  const e = Math.exp(-Math.abs(energyKT));
  return e / ((1 + e) * (1 + e));
}
