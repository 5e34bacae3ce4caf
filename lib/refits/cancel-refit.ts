/** The verb behind `DELETE /api/v1/refits/{id}`: ends a refit, or forgets its answer. */
import { write } from '@/db/client';
import { deleteLease } from '@/db/queries/computation-limits';
import { deleteJob } from '@/db/queries/jobs';
import { deleteRefit } from '@/db/queries/refits';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import { failed, type Outcome } from '@/lib/errors';
import { stopRemovedJob } from '@/lib/jobs/jobs-under-way';

/** Forgets the refit under that id; where another process computes it, it finds its job gone within seconds. */
export async function cancelRefit({ actor, id }: { actor: Actor; id: string }): Promise<Outcome<object>> {
  if (!may(actor, 'refit-document')) return failed('forbidden');
  const cancelled = await write('acknowledged', async (tx) => {
    const deleted = await deleteRefit(tx, id);
    if (deleted === null) return null;
    await deleteJob(tx, deleted.jobId);
    await deleteLease(tx, deleted.leaseId);
    return deleted;
  });
  if (cancelled === null) return failed('not-found');
  stopRemovedJob(cancelled.jobId);
  return { ok: true };
}
