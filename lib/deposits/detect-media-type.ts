/** What a file is, judged by its first bytes and never by what its sender says. */

/** As many first bytes as are looked at. */
export const HEAD_BYTES = 4096;

/** First bytes that give a format away. */
const SIGNATURES: readonly (readonly [mediaType: string, bytes: string])[] = [
  ['application/pdf', '%PDF-'],
  ['application/zip', 'PK\x03\x04'],
  ['application/gzip', '\x1f\x8b'],
  ['application/x-hdf5', '\x89HDF\r\n\x1a\n'],
  ['image/png', '\x89PNG\r\n\x1a\n'],
  ['image/jpeg', '\xff\xd8\xff'],
  ['image/tiff', 'II*\x00'],
  ['image/tiff', 'MM\x00*'],
];

const OTHER = 'application/octet-stream';

/**
 * Media type of a file. Text is text whatever stands in it: nothing here is ever shown as a page.
 *
 * @param head its first bytes, at most HEAD_BYTES of them
 */
export function detectMediaType(head: Buffer): string {
  const start = head.subarray(0, 16).toString('latin1');
  const known = SIGNATURES.find(([, bytes]) => start.startsWith(bytes));
  if (known) return known[0];
  return head.length > 0 && isText(head) ? 'text/plain; charset=utf-8' : OTHER;
}

function isText(head: Buffer): boolean {
  if (head.some((byte) => byte < 0x20 && ![0x09, 0x0a, 0x0c, 0x0d].includes(byte))) return false;
  try {
    // `stream`: a character may be cut in two where the head ends.
    new TextDecoder('utf-8', { fatal: true }).decode(head, { stream: true });
    return true;
  } catch {
    return false;
  }
}
