import type { SyntaxProblem } from './find-syntax-error';

const BYTE_ORDER_MARK = '\uFEFF';

export type ReadText = { ok: true; text: string } | ({ ok: false } & SyntaxProblem);

/** A text from itself or from its bytes in UTF-8, without its byte order mark. */
export function readText(source: string | Uint8Array): ReadText {
  if (typeof source === 'string')
    return { ok: true, text: source.startsWith(BYTE_ORDER_MARK) ? source.slice(1) : source };
  try {
    return { ok: true, text: new TextDecoder('utf-8', { fatal: true }).decode(source) };
  } catch {
    return { ok: false, ...placeOfBadByte(source) };
  }
}

/** Halves the bytes until the longest readable beginning is found. */
function placeOfBadByte(bytes: Uint8Array): SyntaxProblem {
  let [readable, unreadable] = [0, bytes.length + 1];
  while (unreadable - readable > 1) {
    const middle = Math.floor((readable + unreadable) / 2);
    if (canRead(bytes.subarray(0, middle))) readable = middle;
    else unreadable = middle;
  }
  const before = new TextDecoder('utf-8').decode(bytes.subarray(0, readable), { stream: true });
  const lines = before.split('\n');
  return {
    line: lines.length,
    column: (lines.at(-1) ?? '').length + 1,
    detail: 'the file must be saved as UTF-8; a character here is not',
  };
}

/** A character cut off at the end still counts as readable. */
function canRead(bytes: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes, { stream: true });
    return true;
  } catch {
    return false;
  }
}
