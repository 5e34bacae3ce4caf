/** Streams an upload to the store: measured, its SHA-256 checked and its type judged on the way. */
import { Readable } from 'node:stream';
import { failed, type Outcome } from '@/lib/errors';
import { log } from '@/lib/log';
import { MOST_FILE_BYTES } from '@/lib/serving/body-bounds';
import { ObjectTooLarge, putObject } from '@/storage/objects';
import { detectMediaType, HEAD_BYTES } from './detect-media-type';

interface Upload {
  stream: Readable;
  /** SHA-256 that the sender declares, hex; null or left out where none */
  sha256?: string | null;
}

/** What is known of an upload once it is stored. */
export interface StoredUpload {
  /** bytes */
  size: number;
  /** hex */
  sha256: string;
  /** judged by its first bytes */
  mediaType: string;
}

/** Stores a stream under a key; where it fails, what became of the object is for the caller to forget. */
export async function storeUpload(
  { stream, sha256: declared = null }: Upload,
  objectKey: string,
): Promise<Outcome<StoredUpload>> {
  const head = headOf(stream);
  try {
    const stored = await putObject(objectKey, Readable.from(head.passing()), MOST_FILE_BYTES);
    if (stored.size === 0) return failed('empty-file');
    if (declared === null || declared === stored.sha256) {
      return { ok: true, ...stored, mediaType: detectMediaType(head.bytes()) };
    }
    return failed('digest-mismatch');
  } catch (error) {
    if (error instanceof ObjectTooLarge) return failed('file-too-large');
    if (head.brokeOff()) return failed('incomplete-body');
    log().error({ err: error }, 'a file could not be stored');
    return failed('unavailable');
  }
}

/** Hands a stream on and keeps its first bytes, and whether it was the stream itself that broke. */
function headOf(stream: Readable) {
  const pieces: Buffer[] = [];
  let length = 0;
  let broke = false;
  async function* passing(): AsyncGenerator<Buffer> {
    try {
      for await (const chunk of stream as AsyncIterable<Buffer>) {
        if (length < HEAD_BYTES) pieces.push(Buffer.from(chunk.subarray(0, HEAD_BYTES - length)));
        length += chunk.byteLength;
        yield chunk;
      }
    } catch (error) {
      broke = true;
      throw error;
    }
  }
  return { passing, bytes: () => Buffer.concat(pieces), brokeOff: () => broke };
}
