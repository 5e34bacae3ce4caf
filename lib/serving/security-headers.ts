/** The headers that every answer carries, whatever it is. */

/** For whatever is not a page: nothing in it may load, run or be framed. */
export const CLOSED_POLICY =
  "default-src 'none'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'";

/** For a file that somebody uploaded: whatever a browser makes of it, it is nobody's page. */
const DOWNLOAD_POLICY = `${CLOSED_POLICY}; sandbox`;

/** For the script that a worker starts with: it loads the rest of itself from here, and reaches nothing else. */
const WORKER_POLICY = `${CLOSED_POLICY}; script-src 'self'`;

const WORKERS = /^\/_next\/static\/chunks\/turbopack-worker-[^/?#]+\.js/;

const DOWNLOADS = /^\/api\/v1\/deposits\/[^/?#]+\/files\/[^/?#]/;

/** Features of browsers that no page of this site uses. */
const PERMISSIONS_POLICY = [
  'accelerometer',
  'camera',
  'display-capture',
  'geolocation',
  'gyroscope',
  'magnetometer',
  'microphone',
  'midi',
  'payment',
  'usb',
]
  .map((feature) => `${feature}=()`)
  .join(', ');

/**
 * Headers of every answer. The content policy is the closed one; `proxy.ts` puts the policy of a page in its place.
 *
 * @param appUrl origin of the site; over https browsers are told to keep to https
 */
export function securityHeaders(appUrl: string): Record<string, string> {
  return {
    'Content-Security-Policy': CLOSED_POLICY,
    'X-Content-Type-Options': 'nosniff',
    'Referrer-Policy': 'strict-origin-when-cross-origin',
    'Permissions-Policy': PERMISSIONS_POLICY,
    'Cross-Origin-Opener-Policy': 'same-origin',
    'Cross-Origin-Resource-Policy': 'same-origin',
    'X-Frame-Options': 'DENY',
    ...(appUrl.startsWith('https:')
      ? { 'Strict-Transport-Security': 'max-age=63072000; includeSubDomains' }
      : {}),
  };
}

/** The content policy of an address before a page puts its own in the place. Next takes none of a route handler. */
export function policyOfAddress(url: string): string {
  if (WORKERS.test(url)) return WORKER_POLICY;
  return DOWNLOADS.test(url) ? DOWNLOAD_POLICY : CLOSED_POLICY;
}

/**
 * The content policy of a page.
 *
 * @param nonce new for every request, base64
 * @param development `next dev` compiles in the browser and reloads through a web socket; only there are both let in
 */
export function pagePolicy(nonce: string, development: boolean): string {
  return [
    "default-src 'none'",
    `script-src 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ''}`,
    `style-src 'self' 'nonce-${nonce}'`,
    "img-src 'self' blob: data:",
    "font-src 'self'",
    "worker-src 'self'",
    `connect-src 'self'${development ? ' ws:' : ''}`,
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}
