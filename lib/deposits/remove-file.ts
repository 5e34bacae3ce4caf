/** The verb that takes a file away from a draft again. */
import { write } from '@/db/client';
import { deleteFile, selectFile } from '@/db/queries/files';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import type { Actor } from '@/lib/auth/actor';
import { failed, type Outcome } from '@/lib/errors';
import { forgetObjects, loosenObjects } from './loose-objects';
import { auditSubject, reachDeposit, signInFirst } from './reach-deposit';
import { stateWords } from './states';

/** Removes a file. Once a curator has answered, what was submitted stays together. */
export async function removeFile(call: {
  actor: Actor;
  id: string;
  fileId: string;
}): Promise<Outcome<object>> {
  const { actor, id, fileId } = call;
  const removed = await auditingRefusals(
    { actor, action: 'attach-file', subject: auditSubject(id) },
    async () =>
      signInFirst(actor, 'attach-file') ??
      write('acknowledged', async (tx): Promise<Outcome<{ objectKey: string }>> => {
        const reached = await reachDeposit(tx, actor, 'attach-file', id);
        if (!reached.ok) return reached;
        const file = await selectFile(tx, id, fileId);
        if (file === undefined) return failed('not-found');
        const { state } = reached.deposit;
        if (state !== 'draft') {
          return failed(
            'conflict',
            `The deposit is ${stateWords(state)}; files can be removed from a draft only.`,
          );
        }
        await deleteFile(tx, id, fileId);
        await loosenObjects(tx, [file.objectKey]);
        const detail = `${fileId} sha256 ${file.sha256}`;
        await recordAudit(tx, { actor, action: 'file-removed', subject: auditSubject(id), detail });
        return { ok: true, objectKey: file.objectKey };
      }),
  );
  if (!removed.ok) return removed;
  await forgetObjects([removed.objectKey]);
  return { ok: true };
}
