/** Lists the files of a deposit and opens one for reading. */
import type { Readable } from 'node:stream';
import { readDatabase } from '@/db/client';
import type { DepositHead, Reader } from '@/db/queries/deposits';
import { type FileRow, selectFile, selectFiles } from '@/db/queries/files';
import { selectNewestHead, selectNewestPublished } from '@/db/queries/revisions';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import { failed, type Outcome } from '@/lib/errors';
import { getObject } from '@/storage/objects';
import { seesWorkingDocument } from './load-deposit';
import { auditSubject, reachDeposit } from './reach-deposit';

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
    if (!reached.ok) return reached;
    const isShown = await shownFiles(database, actor, reached.deposit);
    return { ok: true, files: (await selectFiles(database, id)).filter(isShown) };
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
    const isShown = await shownFiles(database, actor, reached.deposit);
    if (file === undefined || !isShown(file)) return failed('not-found');
    return { ok: true, file, open: () => getObject(file.objectKey) };
  });
}

/**
 * Which files the actor is shown: its laboratory all of what it is working on; others those that came with the
 * revision that they see, or before it.
 */
async function shownFiles(
  reader: Reader,
  actor: Actor,
  deposit: DepositHead,
): Promise<(file: FileRow) => boolean> {
  const { id, labId, state } = deposit;
  if (seesWorkingDocument(actor, deposit)) return () => true;
  const revision = may(actor, 'read-deposit', { labId, state })
    ? await selectNewestHead(reader, id)
    : await selectNewestPublished(reader, id);
  return ({ uploadedAt }) => revision !== undefined && uploadedAt <= revision.submittedAt;
}
