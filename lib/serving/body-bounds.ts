/** How large the body of a call may be and how long it may take, by its address. */
import { MOST_BODY_BYTES } from './read-body';

/** Most bytes of a file, 100 MiB. */
export const MOST_FILE_BYTES = 100 * 1024 * 1024;

/** Milliseconds for the whole of a body; a file on a slow line takes longer than a document. */
const DOCUMENT_MS = 60_000;
const FILE_MS = 30 * 60_000;

const FILES = /^\/api\/v1\/deposits\/[^/?#]+\/files\/?(?:[?#]|$)/;

/** The bounds of a request to that address. */
export function bodyBounds(url: string): { mostBytes: number; mostMs: number } {
  return FILES.test(url)
    ? { mostBytes: MOST_FILE_BYTES, mostMs: FILE_MS }
    : { mostBytes: MOST_BODY_BYTES, mostMs: DOCUMENT_MS };
}

/** Longest time that any body may take. */
export const LONGEST_BODY_MS = FILE_MS;
