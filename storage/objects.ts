/** Objects: bytes under a key. What the application calls; that they lie in S3 is nobody else's affair. */
import { createHash } from 'node:crypto';
import { type Readable, Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { getStream, probe, putStream, remove } from './s3';

/** What was stored. */
export interface StoredObject {
  /** bytes */
  size: number;
  /** of all bytes, hex */
  sha256: string;
}

/** The stream had more bytes than it may have; nothing of it was kept. */
export class ObjectTooLarge extends Error {}

/**
 * Stores a stream under a key without ever holding the whole of it, and computes its SHA-256 on the way.
 *
 * @param key letters, digits and hyphens; never made from a name that somebody chose
 * @param mostBytes most bytes that it may have
 * @throws {ObjectTooLarge} where it has more
 */
export async function putObject(key: string, source: Readable, mostBytes: number): Promise<StoredObject> {
  const measured = measuring(mostBytes);
  // Both ends are awaited together: an error of the source ends the upload, an error of the upload ends the source.
  const passing = pipeline(source, measured.stream);
  const storing = putStream(key, measured.stream).catch((error: unknown) => {
    measured.stream.destroy(error instanceof Error ? error : new Error(String(error)));
    throw error;
  });
  const [passed, stored] = await Promise.allSettled([passing, storing]);
  // The upload names the cause; the source only hears that it was given up.
  if (stored.status === 'rejected') throw stored.reason;
  if (passed.status === 'rejected') throw passed.reason;
  return measured.result();
}

/** The bytes of an object as a stream. Throws where there is none. */
export function getObject(key: string): Promise<Readable> {
  return getStream(key);
}

/** Removes an object; one that is not there is no error. */
export function deleteObject(key: string): Promise<void> {
  return remove(key);
}

/** Throws where the store does not answer. */
export function probeObjects(): Promise<void> {
  return probe();
}

function measuring(mostBytes: number): { stream: Transform; result: () => StoredObject } {
  const hash = createHash('sha256');
  let size = 0;
  const stream = new Transform({
    transform(chunk: Buffer, _encoding, done) {
      size += chunk.byteLength;
      if (size > mostBytes) {
        done(new ObjectTooLarge(`more than ${mostBytes} bytes`));
        return;
      }
      hash.update(chunk);
      done(null, chunk);
    },
  });
  return { stream, result: () => ({ size, sha256: hash.digest('hex') }) };
}
