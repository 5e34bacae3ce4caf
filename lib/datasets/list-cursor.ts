/**
 * Cursors of lists: the place of the last row that was shown, in a form that callers pass back and do not read. A
 * place and not a number of rows, so that what is published meanwhile neither repeats nor hides a row.
 */

/** The cursor of a place. */
export function encodeCursor(place: (string | number)[]): string {
  return Buffer.from(JSON.stringify(place)).toString('base64url');
}

/**
 * The place that a cursor stands for; null where it is none of this list.
 *
 * @param kinds what the place is made of
 */
export function decodeCursor(cursor: string, kinds: ('string' | 'number')[]): (string | number)[] | null {
  try {
    const place: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    if (!Array.isArray(place) || place.length !== kinds.length) return null;
    return place.every((part, i) => isOfKind(part, kinds[i])) ? place : null;
  } catch {
    return null;
  }
}

/** Numbers of places are whole ones; 1e999 is JSON as well. */
function isOfKind(part: unknown, kind: 'string' | 'number' | undefined): boolean {
  return kind === 'number' ? Number.isSafeInteger(part) : typeof part === kind;
}

/** The sentence for a cursor that is none of this list. */
export const BAD_CURSOR = 'The parameter cursor must be the cursor of an earlier answer of this list.';

/** The address of the next page: the same parameters with the new cursor. */
export function nextAddress(path: string, parameters: URLSearchParams, cursor: string): string {
  const next = new URLSearchParams(parameters);
  next.set('cursor', cursor);
  return `${path}?${next}`;
}
