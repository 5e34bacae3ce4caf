/** Takes a job that this process holds to its end: done, to be tried again later, or given up. */
import { write } from '@/db/client';
import { deleteHeldJob, extendLease, type HeldJob, letGoOfJob } from '@/db/queries/jobs';
import { log } from '@/lib/log';
import { type Finish, type JobHandler, NoRoom } from './job-kinds';
import { type StopReason, whileUnderWay } from './jobs-under-way';
import { HEARTBEAT_MS, LEASE_MS, NO_ROOM_PAUSE_MS, pauseAfter } from './lease';

/** Of an error, as much is kept as helps to understand it. */
const MOST_ERROR_LENGTH = 2_000;

/**
 * Carries out one attempt. Never throws: what goes wrong is kept with the job and in the log.
 *
 * @param run the work, where it is under way already; the handler's own where left out
 */
export function carryOut(
  job: HeldJob,
  handler: JobHandler,
  run?: (signal: AbortSignal) => Promise<Finish>,
): Promise<void> {
  return whileUnderWay(job.id, run ? 'call' : 'runner', async (stop) => {
    const heart = beat(job, handler, stop);
    try {
      if (job.attempts > handler.mostAttempts) throw new Error('The process that was at work on it ended.');
      const payload = JSON.parse(job.payload);
      const finish = await (run ? run(stop.signal) : handler.run(payload, stop.signal));
      await write('acknowledged', async (tx) => {
        if (await deleteHeldJob(tx, job)) await finish(tx);
      });
    } catch (error) {
      await noteFailure(job, handler, stop.signal, error).catch((failure: unknown) => {
        // Its lease runs out, and it is begun anew.
        log().error({ err: failure, job: job.id }, 'the end of a job was not noted');
      });
    } finally {
      clearInterval(heart);
    }
  });
}

/** Signs of life while the work goes on; where the job is no longer held, the work is stopped. */
function beat(job: HeldJob, handler: JobHandler, stop: AbortController): NodeJS.Timeout {
  const once = async () => {
    const held = await extendLease(job, Date.now() + LEASE_MS);
    if (held) await handler.onBeat?.(JSON.parse(job.payload));
    else stop.abort('lost' satisfies StopReason);
  };
  const heart = setInterval(() => {
    once().catch((error: unknown) => log().error({ err: error, job: job.id }, 'a job gave no sign of life'));
  }, HEARTBEAT_MS);
  return heart.unref();
}

async function noteFailure(
  job: HeldJob,
  handler: JobHandler,
  signal: AbortSignal,
  error: unknown,
): Promise<void> {
  if (signal.reason === ('lost' satisfies StopReason)) return;
  if (signal.reason === ('process-ends' satisfies StopReason)) return handBack(job, 0);
  if (error instanceof NoRoom) return handBack(job, NO_ROOM_PAUSE_MS);
  const lastError = String(error instanceof Error ? error.stack : error).slice(0, MOST_ERROR_LENGTH);
  const givenUp = job.attempts >= handler.mostAttempts;
  const { id, kind, attempts } = job;
  log()[givenUp ? 'error' : 'warn']({ err: error, job: id, kind, attempts, givenUp }, 'a job failed');
  const now = Date.now();
  await write('acknowledged', async (tx) => {
    const change = givenUp ? { givenUpAt: now } : { runAt: now + pauseAfter(attempts) };
    const held = await letGoOfJob(tx, job, { lastError, ...change });
    if (held && givenUp) await handler.giveUp?.(JSON.parse(job.payload))(tx);
  });
}

/** Not the job's fault: the attempt does not count, and whoever is free begins it after the pause. */
async function handBack(job: HeldJob, pauseMs: number): Promise<void> {
  await write('acknowledged', async (tx) => {
    await letGoOfJob(tx, job, { attempts: job.attempts - 1, runAt: Date.now() + pauseMs });
  });
}
