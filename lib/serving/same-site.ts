/**
 * The origin check on everything that is not a read: a browser that calls for a page of another site is refused.
 * Scripts send neither header and pass; they carry no visitor's cookies.
 */
export function isFromAnotherSite(headers: Headers, appUrl: string): boolean {
  const site = headers.get('sec-fetch-site');
  if (site !== null && site !== 'same-origin' && site !== 'none') return true;
  const origin = headers.get('origin');
  if (origin === null) return false;
  return origin !== appUrl && hostOf(origin) !== headers.get('host');
}

function hostOf(origin: string): string | null {
  return URL.canParse(origin) ? new URL(origin).host : null;
}
