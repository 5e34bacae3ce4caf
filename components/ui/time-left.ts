/**
 * How long something will still take, in words whose precision an estimate can keep.
 *
 * @param seconds ≥ 0
 */
export function describeTimeLeft(seconds: number): string {
  if (seconds < 2) return 'almost done';
  if (seconds < 10) return `about ${Math.round(seconds)} s left`;
  if (seconds < 55) return `about ${Math.round(seconds / 5) * 5} s left`;
  const minutes = Math.max(1, Math.round(seconds / 60));
  return `about ${minutes} min left`;
}
