/** A refit that outlives its call: how its progress and its answer come to stand where they are asked for. */
import { deleteLease } from '@/db/queries/computation-limits';
import { updateRefitAnswer, updateRefitProgress } from '@/db/queries/refits';
import { type Finish, NoRoom } from '@/lib/jobs/job-kinds';
import { log } from '@/lib/log';
import { problemAnswer, type RefitAnswer } from './refit-body';
import { MOST_REFIT_MS, type RefitComputation } from './refit-pool';

/** How often progress is written down, ms. */
const KEEP_MS = 500;

/** Writes down the progress of a refit now and then while it is computed. */
export async function keepingProgress(
  id: string,
  progress: () => number,
  computing: Promise<RefitComputation>,
): Promise<RefitComputation> {
  let kept = 0;
  const timer = setInterval(() => {
    const now = progress();
    if (now <= kept) return;
    kept = now;
    updateRefitProgress(id, now).catch((error: unknown) =>
      log().warn({ err: error }, 'progress was not kept'),
    );
  }, KEEP_MS);
  try {
    return await computing;
  } finally {
    clearInterval(timer);
  }
}

/**
 * What is written at the end of a refit.
 *
 * @throws where there is no answer, so that it is tried again
 */
export function finishOf(
  { id, leaseId }: { id: string; leaseId: string },
  computed: RefitComputation,
): Finish {
  if (computed.kind === 'busy') throw new NoRoom('Too many refits wait already.');
  if (computed.kind === 'aborted') throw new Error('The refit was stopped before it had an answer.');
  return keepAnswer(id, leaseId, computed.kind === 'answered' ? computed : tookTooLong());
}

/** Puts an answer where it is asked for, and gives the place of the caller's address back. */
export function keepAnswer(id: string, leaseId: string, answer: RefitAnswer): Finish {
  return async (tx) => {
    await updateRefitAnswer(tx, id, answer);
    await deleteLease(tx, leaseId);
  };
}

/** The answer of a refit that was stopped for its time. */
export function tookTooLong(): RefitAnswer {
  const detail = `The refit was stopped after ${MOST_REFIT_MS / 1000} seconds. Free fewer values, or refit fewer series at a time.`;
  return problemAnswer({ code: 'took-too-long', detail });
}
