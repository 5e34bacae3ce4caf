/** `If-Match` with the versions of a deposit: the number that its strong ETags begin with, `"3"` or `"3-w-…"`. */

/** The versions that a caller takes for the present one; `any` for `*`; null where it did not say. */
export type ExpectedVersions = readonly number[] | 'any' | null;

/** The strong ETag of an answer to a change that made this version. */
export function etagOf(version: number): string {
  return `"${version}"`;
}

/** What a request's If-Match means. Weak ETags and those of other things match nothing (RFC 9110, 13.1.1). */
export function readIfMatch(headers: Headers): ExpectedVersions {
  const header = headers.get('if-match');
  if (header === null) return null;
  const parts = header.split(',').map((part) => part.trim());
  if (parts.includes('*')) return 'any';
  return parts.flatMap((part) => {
    const digits = /^"([1-9]\d{0,14})(?:-[\w-]*)?"$/.exec(part)?.[1];
    return digits === undefined ? [] : [Number(digits)];
  });
}

/** Why a change of that version is refused, or null where it is not. */
export function versionRefusal(
  expected: ExpectedVersions,
  version: number,
): 'precondition-required' | 'stale' | null {
  if (expected === null) return 'precondition-required';
  return expected === 'any' || expected.includes(version) ? null : 'stale';
}
