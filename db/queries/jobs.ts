/** The SQL behind the queue of jobs; the rules of retries are in lib/jobs. */
import { and, eq, inArray, isNull, lt, lte, or, sql } from 'drizzle-orm';
import { readDatabase, type Transaction, write } from '@/db/client';
import { jobs } from '@/db/tables/jobs';

/** A job that somebody is at work on, with the token that says so. */
export interface HeldJob {
  id: string;
  kind: string;
  /** JSON */
  payload: string;
  /** this one included */
  attempts: number;
  leaseToken: string;
}

/** Adds a job. */
export async function insertJob(tx: Transaction, job: typeof jobs.$inferInsert): Promise<void> {
  await tx.insert(jobs).values(job);
}

const isDue = (kinds: readonly string[], nowMs: number) =>
  and(
    inArray(jobs.kind, kinds),
    isNull(jobs.givenUpAt),
    lte(jobs.runAt, nowMs),
    or(isNull(jobs.leaseToken), lte(jobs.leaseUntil, nowMs)),
  );

/** Whether a job of one of the kinds waits to be begun. */
export async function hasDueJob(kinds: readonly string[], nowMs: number): Promise<boolean> {
  const database = await readDatabase();
  const found = await database.select({ id: jobs.id }).from(jobs).where(isDue(kinds, nowMs)).limit(1);
  return found.length > 0;
}

/** Takes the job of those kinds that has waited longest, if there is one; of two that ask at once, each gets another. */
export async function claimDueJob(
  kinds: readonly string[],
  leaseToken: string,
  nowMs: number,
  leaseUntil: number,
): Promise<HeldJob | null> {
  return write('acknowledged', async (tx) => {
    const oldest = tx
      .select({ id: jobs.id })
      .from(jobs)
      .where(isDue(kinds, nowMs))
      .orderBy(jobs.runAt)
      .limit(1);
    const [claimed] = await tx
      .update(jobs)
      .set({ leaseToken, leaseUntil, attempts: sql`${jobs.attempts} + 1` })
      .where(eq(jobs.id, oldest))
      .returning({ id: jobs.id, kind: jobs.kind, payload: jobs.payload, attempts: jobs.attempts });
    return claimed ? { ...claimed, leaseToken } : null;
  });
}

const isHeld = ({ id, leaseToken }: HeldJob) => and(eq(jobs.id, id), eq(jobs.leaseToken, leaseToken));

/** Holds a job for longer; false where it is no longer held, since it was taken over or removed. */
export async function extendLease(job: HeldJob, leaseUntil: number): Promise<boolean> {
  return write('counter', async (tx) => {
    const extended = await tx.update(jobs).set({ leaseUntil }).where(isHeld(job)).returning({ id: jobs.id });
    return extended.length > 0;
  });
}

/** Removes a job that is held; false where it no longer is. */
export async function deleteHeldJob(tx: Transaction, job: HeldJob): Promise<boolean> {
  const deleted = await tx.delete(jobs).where(isHeld(job)).returning({ id: jobs.id });
  return deleted.length > 0;
}

/** Removes a job whether or not somebody is at work on it. */
export async function deleteJob(tx: Transaction, id: string): Promise<void> {
  await tx.delete(jobs).where(eq(jobs.id, id));
}

/** Removes the jobs that were given up before then. */
export async function deleteGivenUpJobs(beforeMs: number): Promise<void> {
  await write('counter', async (tx) => {
    await tx.delete(jobs).where(lt(jobs.givenUpAt, beforeMs));
  });
}

/** Lets go of a job that is held, with what is to become of it; false where it is no longer held. */
export async function letGoOfJob(
  tx: Transaction,
  job: HeldJob,
  change: Partial<Pick<typeof jobs.$inferInsert, 'runAt' | 'attempts' | 'lastError' | 'givenUpAt'>>,
): Promise<boolean> {
  const changed = await tx
    .update(jobs)
    .set({ ...change, leaseToken: null, leaseUntil: null })
    .where(isHeld(job))
    .returning({ id: jobs.id });
  return changed.length > 0;
}
