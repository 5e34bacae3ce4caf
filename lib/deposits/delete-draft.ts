/** The verb that removes a draft for good, with its files. */
import { write } from '@/db/client';
import { removeDeposit } from '@/db/queries/deposits';
import { deleteFiles, selectFiles } from '@/db/queries/files';
import { deleteRevisions } from '@/db/queries/revisions';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import type { Actor } from '@/lib/auth/actor';
import { failed, type Outcome } from '@/lib/errors';
import { type ExpectedVersions, versionRefusal } from '@/lib/serving/if-match';
import { forgetObjects, loosenObjects } from './loose-objects';
import { auditSubject, reachDeposit, signInFirst } from './reach-deposit';
import { stateWords } from './states';
import { versionFailure } from './version-failure';

/** Removes a draft. One that a curator has answered is none any more and stays. */
export async function deleteDraft(call: {
  actor: Actor;
  id: string;
  expected: ExpectedVersions;
}): Promise<Outcome<object>> {
  const { actor, id } = call;
  const removed = await auditingRefusals(
    { actor, action: 'delete-draft', subject: auditSubject(id) },
    async () => signInFirst(actor, 'delete-draft') ?? removeRows(call),
  );
  if (!removed.ok) return removed;
  await forgetObjects(removed.objectKeys);
  return { ok: true };
}

function removeRows({
  actor,
  id,
  expected,
}: {
  actor: Actor;
  id: string;
  expected: ExpectedVersions;
}): Promise<Outcome<{ objectKeys: string[] }>> {
  return write('acknowledged', async (tx) => {
    const reached = await reachDeposit(tx, actor, 'delete-draft', id);
    if (!reached.ok) return reached;
    const { version, state: from } = reached.deposit;
    if (from !== 'draft') {
      return failed('conflict', `The deposit is ${stateWords(from)}; only a draft can be deleted.`);
    }
    const refusal = versionRefusal(expected, version);
    if (refusal !== null) return versionFailure(refusal, reached.deposit);
    const objectKeys = (await selectFiles(tx, id)).map((file) => file.objectKey);
    await deleteFiles(tx, id);
    await loosenObjects(tx, objectKeys);
    await deleteRevisions(tx, id);
    if (!(await removeDeposit(tx, { id, version, from })))
      throw new Error('The draft changed under a write.');
    await recordAudit(tx, { actor, action: 'deleted', subject: auditSubject(id), detail: 'draft' });
    return { ok: true, objectKeys };
  });
}
