/** Gives some datasets of the demonstration original files: bytes through the store, rows as the verb writes them. */
import { Readable } from 'node:stream';
import { and, eq } from 'drizzle-orm';
import { readDatabase, write } from '@/db/client';
import { insertFile, selectFiles } from '@/db/queries/files';
import { deposits } from '@/db/tables/deposits';
import { newId } from '@/lib/auth/hash-token';
import { forgetObjects, keepObject, newObjectKey } from '@/lib/deposits/loose-objects';
import { storeUpload } from '@/lib/deposits/store-upload';
import { makeDocuments } from './make-documents';
import { type RawFile, rawFilesOf } from './raw-files';

const MINUTE_MS = 60_000;

interface Owner {
  id: string;
  createdBy: string;
  createdAt: number;
}

/** Attaches them where they are not yet; what a start that is cut off leaves out the next one adds. */
export async function attachDemonstrationFiles(): Promise<void> {
  for (const { document } of makeDocuments()) {
    const files = rawFilesOf(document);
    const owner = files.length > 0 ? await findOwner(document.title) : undefined;
    if (owner === undefined) continue;
    const there = (await selectFiles(await readDatabase(), owner.id)).map(({ name }) => name);
    for (const [i, file] of files.entries()) {
      // While it was a draft, so that they belong to every revision.
      const uploadedAt = owner.createdAt + (i + 1) * MINUTE_MS;
      if (!there.includes(file.name)) await attach(owner, file, uploadedAt);
    }
  }
}

async function findOwner(title: string): Promise<Owner | undefined> {
  const database = await readDatabase();
  const [row] = await database
    .select({ id: deposits.id, createdBy: deposits.createdBy, createdAt: deposits.createdAt })
    .from(deposits)
    .where(and(eq(deposits.title, title), eq(deposits.state, 'published')));
  return row;
}

async function attach({ id, createdBy }: Owner, { name, text }: RawFile, uploadedAt: number): Promise<void> {
  const objectKey = await newObjectKey();
  const stored = await storeUpload({ stream: Readable.from([Buffer.from(text)]) }, objectKey);
  const kept = await write('acknowledged', async (tx) => {
    if (!stored.ok || !(await keepObject(tx, objectKey))) return false;
    const { size, sha256, mediaType } = stored;
    await insertFile(tx, {
      ...{ id: newId(), depositId: id, name, objectKey, size, sha256, mediaType },
      ...{ uploadedBy: createdBy, uploadedAt },
    });
    return true;
  });
  if (!kept) await forgetObjects([objectKey]);
}
