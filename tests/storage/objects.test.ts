import { createHash, randomBytes } from 'node:crypto';
import { readdir } from 'node:fs/promises';
import path from 'node:path';
import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startLocalStorage, stopLocalStorage } from '@/storage/local-server';
import { deleteObject, getObject, ObjectTooLarge, probeObjects, putObject } from '@/storage/objects';
import { temporaryDatabase } from '@/tests/support/temporary-database';

const MIB = 2 ** 20;
const { dataDir } = temporaryDatabase();
beforeAll(startLocalStorage);
afterAll(stopLocalStorage);

async function storedFiles(): Promise<string[]> {
  const entries = await readdir(path.join(dataDir(), 'objects'), { recursive: true, withFileTypes: true });
  return entries.filter((entry) => entry.isFile()).map((entry) => entry.name);
}

/** Bytes in pieces of uneven length, as a network brings them. */
async function* pieces(bytes: Buffer): AsyncGenerator<Buffer> {
  for (let at = 0, length = 1; at < bytes.length; at += length, length = (length * 7) % 65_521) {
    yield bytes.subarray(at, at + length);
  }
}

describe('objects', () => {
  it.each([0, 1, 1000, 5 * MIB, 12 * MIB + 17])('%d bytes come back as they were', async (size) => {
    const bytes = randomBytes(size);
    const stored = await putObject(`size-${size}`, Readable.from(pieces(bytes)), 20 * MIB);
    expect(stored).toEqual({ size, sha256: createHash('sha256').update(bytes).digest('hex') });
    const back = await buffer(await getObject(`size-${size}`));
    expect(back.equals(bytes)).toBe(true);
  });

  it.each([3 * MIB, 17 * MIB])(
    'a stream of more than %d bytes is refused, and nothing of it stays',
    async (most) => {
      const before = await storedFiles();
      const storing = putObject('too-large', Readable.from(pieces(randomBytes(most + 1))), most);
      await expect(storing).rejects.toThrow(ObjectTooLarge);
      await expect(getObject('too-large')).rejects.toThrow();
      expect(await storedFiles()).toEqual(before);
    },
  );

  it('a stream that breaks off leaves nothing', async () => {
    const before = await storedFiles();
    async function* breaking() {
      yield randomBytes(11 * MIB);
      throw new Error('the line went dead');
    }
    await expect(putObject('broken', Readable.from(breaking()), 20 * MIB)).rejects.toThrow(
      'the line went dead',
    );
    await expect(getObject('broken')).rejects.toThrow();
    expect(await storedFiles()).toEqual(before);
  });

  it('a removed object is gone, and removing it again is no error', async () => {
    await putObject('gone', Readable.from([Buffer.from('x')]), 10);
    await deleteObject('gone');
    await expect(getObject('gone')).rejects.toThrow();
    await deleteObject('gone');
  });

  it('many at once keep apart', async () => {
    const all = Array.from({ length: 20 }, (_, i) => randomBytes(1000 * i + 1));
    await Promise.all(all.map((bytes, i) => putObject(`many-${i}`, Readable.from([bytes]), MIB)));
    for (const [i, bytes] of all.entries()) {
      expect((await buffer(await getObject(`many-${i}`))).equals(bytes)).toBe(true);
    }
  });

  it('the local store answers, stops, keeps what it has and starts again', async () => {
    await putObject('kept', Readable.from([Buffer.from('kept')]), 10);
    await probeObjects();
    await stopLocalStorage();
    await expect(async () => probeObjects()).rejects.toThrow();
    await startLocalStorage();
    expect((await buffer(await getObject('kept'))).toString()).toBe('kept');
  });
});
