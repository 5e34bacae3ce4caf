/** Lists the files of a deposit and opens one for reading. */
import type { Readable } from 'node:stream';
import { readDatabase } from '@/db/client';
import { type FileRow, selectFile, selectFiles } from '@/db/queries/files';
import type { Actor } from '@/lib/auth/actor';
import { failed, type Outcome } from '@/lib/errors';
import { getObject } from '@/storage/objects';
import { auditingRefusals, auditSubject, reachDeposit } from './reach-deposit';

/** The files of a deposit, in the order in which they came. */
export function listFiles({
  actor,
  id,
}: {
  actor: Actor;
  id: string;
}): Promise<Outcome<{ files: FileRow[] }>> {
  return auditingRefusals({ actor, action: 'read-file', subject: auditSubject(id) }, async () => {
    const database = await readDatabase();
    const reached = await reachDeposit(database, actor, 'read-file', id);
    return reached.ok ? { ok: true, files: await selectFiles(database, id) } : reached;
  });
}

export interface OpenableFile {
  file: FileRow;
  /** its bytes from the store; nothing is fetched before this is called */
  open: () => Promise<Readable>;
}

/** One file of a deposit. */
export function openFile(call: { actor: Actor; id: string; fileId: string }): Promise<Outcome<OpenableFile>> {
  const { actor, id, fileId } = call;
  return auditingRefusals({ actor, action: 'read-file', subject: auditSubject(id) }, async () => {
    const database = await readDatabase();
    const reached = await reachDeposit(database, actor, 'read-file', id);
    if (!reached.ok) return reached;
    const file = await selectFile(database, id, fileId);
    if (file === undefined) return failed('not-found');
    return { ok: true, file, open: () => getObject(file.objectKey) };
  });
}
