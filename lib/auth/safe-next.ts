/** Where to go after signing in: only ever to a page of this site. */

/** A base that no address can name by accident. */
const BASE = 'http://site.invalid';

/** The wanted path with its query, or `/` where it leads elsewhere, is no path or is the sign-in page itself. */
export function safeNext(wanted: unknown): string {
  if (typeof wanted !== 'string' || !wanted.startsWith('/') || !URL.canParse(wanted, BASE)) return '/';
  const url = new URL(wanted, BASE);
  // `//host` and `/\host` lead to another site; the parser sees through both.
  if (url.origin !== BASE || url.pathname.startsWith('//') || /^\/sign-in(\/|$)/.test(url.pathname))
    return '/';
  return `${url.pathname}${url.search}${url.hash}`;
}
