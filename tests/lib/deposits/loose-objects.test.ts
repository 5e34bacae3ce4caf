/** What a kill between storing an object and its row leaves behind, and that it is swept. */
import { randomBytes } from 'node:crypto';
import { Readable } from 'node:stream';
import { describe, expect, it, vi } from 'vitest';
import { readDatabase, write } from '@/db/client';
import { looseObjects } from '@/db/tables/deposits';
import { attachFile } from '@/lib/deposits/attach-file';
import { deleteDraft } from '@/lib/deposits/delete-draft';
import { keepObject, newObjectKey, sweepObjects } from '@/lib/deposits/loose-objects';
import { openFile } from '@/lib/deposits/open-file';
import { removeFile } from '@/lib/deposits/remove-file';
import { deleteObject, getObject, putObject } from '@/storage/objects';
import { codeOf, makeDeposit, worked } from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';

vi.mock('@/storage/objects', { spy: true });

const { cast } = collectionForTests({ storage: true });
const HOUR_MS = 3_600_000;

const loose = async () =>
  (await (await readDatabase()).select().from(looseObjects)).map(({ objectKey }) => objectKey);
const isThere = async (key: string) =>
  (await getObject(key).then(
    (bytes) => bytes.destroy(),
    () => null,
  )) !== null;

/** As an upload leaves it that is killed before its row: noted, stored, and nobody's. */
async function orphan(): Promise<string> {
  const key = await newObjectKey();
  await putObject(key, Readable.from([randomBytes(10)]), 10);
  return key;
}

const attach = (id: string) =>
  attachFile({ actor: cast.depositor, id, name: 'x.csv', stream: Readable.from([Buffer.from('x')]) });

describe('an object that is no file’s', { timeout: 60_000 }, () => {
  it('is swept once no upload can still be on its way', async () => {
    const key = await orphan();
    await sweepObjects();
    expect(await isThere(key)).toBe(true);
    expect(await sweepObjects(Date.now() + HOUR_MS)).toBe(1);
    expect(await isThere(key)).toBe(false);
    expect(await loose()).toEqual([]);
  });

  it('cannot become a file’s any more once it may be swept', async () => {
    const key = await orphan();
    vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + HOUR_MS });
    try {
      expect(await write('acknowledged', (tx) => keepObject(tx, key))).toBe(false);
    } finally {
      vi.useRealTimers();
    }
    expect(await write('acknowledged', (tx) => keepObject(tx, key))).toBe(true);
    expect(await write('acknowledged', (tx) => keepObject(tx, key))).toBe(false);
    await deleteObject(key);
  });

  it('is none of a file that was attached', async () => {
    const id = await makeDeposit(cast);
    const { file } = worked(await attach(id));
    expect(await loose()).toEqual([]);
    await sweepObjects(Date.now() + HOUR_MS);
    const opened = worked(await openFile({ actor: cast.depositor, id, fileId: file.id }));
    (await opened.open()).destroy();
  });

  it('is noted where the store fails, and swept when it works again', async () => {
    const id = await makeDeposit(cast);
    const { file } = worked(await attach(id));
    vi.mocked(deleteObject).mockRejectedValueOnce(new Error('the store does not answer'));
    worked(await removeFile({ actor: cast.depositor, id, fileId: file.id }));
    expect(await loose()).toEqual([file.objectKey]);
    await sweepObjects(Date.now() + HOUR_MS);
    expect(await loose()).toEqual([]);
    expect(await isThere(file.objectKey)).toBe(false);
  });

  it('is none after a draft was deleted, or an upload was refused', async () => {
    const id = await makeDeposit(cast);
    const { file } = worked(await attach(id));
    worked(await deleteDraft({ actor: cast.depositor, id, expected: 'any' }));
    expect(await isThere(file.objectKey)).toBe(false);
    const other = await makeDeposit(cast);
    vi.mocked(putObject).mockRejectedValueOnce(new Error('the store does not answer'));
    expect(codeOf(await attach(other))).toBe('unavailable');
    expect(await loose()).toEqual([]);
  });
});
