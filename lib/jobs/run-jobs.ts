/** Looks for jobs that are due and carries them out, a few at a time, until the process ends. */
import { randomUUID } from 'node:crypto';
import { claimDueJob, hasDueJob } from '@/db/queries/jobs';
import { log } from '@/lib/log';
import { carryOut } from './carry-out';
import type { JobHandlers, JobKind } from './job-kinds';
import { countJobsOfRunner, stopJobsUnderWay } from './jobs-under-way';
import { LEASE_MS } from './lease';

/** How often it is looked, and after a failure, ms. */
const LOOK_MS = 500;
const LOOK_AFTER_FAILURE_MS = 5_000;

/** Work that a call began is not counted: however much there is, jobs that wait are begun. */
const MOST_AT_ONCE = 4;

export interface JobRunner {
  /** Takes no further job, lets go of those under way, and resolves then. */
  stop: () => Promise<void>;
}

/** Starts looking for jobs. Several processes may: each job is begun by one. */
export function runJobs(handlers: JobHandlers): JobRunner {
  let stopped = false;
  let timer: NodeJS.Timeout;
  let looking: Promise<void> = Promise.resolve();
  const look = async () => {
    let pause = LOOK_MS;
    try {
      while (!stopped && (await beginDueJob(handlers)));
    } catch (error) {
      log().error({ err: error }, 'jobs could not be looked for');
      pause = LOOK_AFTER_FAILURE_MS;
    }
    if (!stopped) lookIn(pause);
  };
  const lookIn = (pauseMs: number) => {
    timer = setTimeout(() => {
      looking = look();
    }, pauseMs).unref();
  };
  lookIn(0);
  return {
    stop: async () => {
      stopped = true;
      clearTimeout(timer);
      await looking;
      await stopJobsUnderWay();
    },
  };
}

/** Begins the job that has waited longest; false where there is none, or enough is under way. */
async function beginDueJob(handlers: JobHandlers): Promise<boolean> {
  const now = Date.now();
  // Other kinds are left to processes of a version that knows them.
  const kinds = Object.keys(handlers);
  if (countJobsOfRunner() >= MOST_AT_ONCE || !(await hasDueJob(kinds, now))) return false;
  const job = await claimDueJob(kinds, randomUUID(), now, now + LEASE_MS);
  if (job === null) return false;
  // Not awaited: it ends by itself, and never throws.
  carryOut(job, handlers[job.kind as JobKind]).catch((error: unknown) =>
    log().error({ err: error }, 'a job failed'),
  );
  return true;
}
