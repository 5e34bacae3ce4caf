/**
 * `RateLimit-Policy` and `RateLimit` as structured fields (draft-ietf-httpapi-ratelimit-headers-10): one item per
 * limit; q quota, w window in seconds, qu what is counted, r what is left, t when some of it comes back.
 */
import { type Quota, WINDOW_SECONDS } from './computation-limits';

/** The headers that tell a caller its limits; of points only where they are limited. */
export function limitHeaders(quota: Quota): Record<string, string> {
  const { limits, calls, points, atOnceLeft } = quota;
  const limited = Number.isFinite(limits.pointsPerMinute);
  return {
    'RateLimit-Policy': [
      `"calls";q=${limits.callsPerMinute};w=${WINDOW_SECONDS}`,
      ...(limited ? [`"points";q=${limits.pointsPerMinute};w=${WINDOW_SECONDS};qu="points"`] : []),
      `"at-once";q=${limits.atOnce};qu="concurrent-requests"`,
    ].join(', '),
    RateLimit: [
      `"calls";r=${calls.left};t=${calls.resetSeconds}`,
      ...(limited ? [`"points";r=${points.left};t=${points.resetSeconds}`] : []),
      `"at-once";r=${atOnceLeft}`,
    ].join(', '),
  };
}

/** The headers of an outcome: its limits where they are known, and when to try again where that helps. */
export function outcomeHeaders(outcome: {
  quota: Quota | null;
  retryAfterSeconds?: number;
}): Record<string, string> {
  const { quota, retryAfterSeconds } = outcome;
  return {
    ...(quota ? limitHeaders(quota) : {}),
    ...(retryAfterSeconds === undefined ? {} : { 'Retry-After': String(retryAfterSeconds) }),
  };
}
