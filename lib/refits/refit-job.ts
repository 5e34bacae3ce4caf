/** A refit that another process began and did not end: it is begun anew from what was sent. */
import { deleteLease } from '@/db/queries/computation-limits';
import { renewLeaseOfRefit, selectRefit, updateRefitAnswer } from '@/db/queries/refits';
import type { Finish, JobHandler } from '@/lib/jobs/job-kinds';
import { finishOf, keepingProgress } from './kept-refit';
import { problemAnswer } from './refit-body';
import { REFIT_PLACE_MS } from './refit-limits';
import { refitInPool } from './refit-pool';

const nothing: Finish = async () => undefined;

export const refitJob: JobHandler<'refit'> = {
  mostAttempts: 3,
  run: async ({ refitId }, signal) => {
    const refit = await selectRefit(refitId, Date.now());
    // Past its time, or answered: nobody waits for it.
    if (refit === null || refit.body === null) return nothing;
    let progress = refit.progress;
    const computing = refitInPool(
      Uint8Array.from(refit.body),
      (now) => {
        progress = Math.max(progress, now);
      },
      signal,
    );
    return finishOf(refit, await keepingProgress(refitId, () => progress, computing));
  },
  onBeat: ({ refitId }) => renewLeaseOfRefit(refitId, Date.now() + REFIT_PLACE_MS),
  giveUp: ({ refitId }) => {
    const answer = problemAnswer({ code: 'unexpected' });
    return async (tx) => {
      const leaseId = await updateRefitAnswer(tx, refitId, answer);
      if (leaseId !== null) await deleteLease(tx, leaseId);
    };
  },
};
