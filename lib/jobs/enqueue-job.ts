/** Adds jobs, in the transaction of what they follow: the job exists exactly where that was written. */
import { randomUUID } from 'node:crypto';
import type { Transaction } from '@/db/client';
import { type HeldJob, insertJob } from '@/db/queries/jobs';
import type { JobKind, JobPayloads } from './job-kinds';
import { LEASE_MS } from './lease';

/**
 * Adds a job whose work is under way already in this process, which goes on with `carryOut` and takes it to its end.
 * Where this process dies first, another begins it anew.
 */
export async function enqueueStartedJob<K extends JobKind>(
  tx: Transaction,
  kind: K,
  payload: JobPayloads[K],
): Promise<HeldJob> {
  const now = Date.now();
  const held = {
    id: randomUUID(),
    kind,
    payload: JSON.stringify(payload),
    attempts: 1,
    leaseToken: randomUUID(),
  };
  await insertJob(tx, { ...held, runAt: now, leaseUntil: now + LEASE_MS, createdAt: now });
  return held;
}

/**
 * Adds a job to be begun by whichever process is free.
 *
 * @param runAt Unix time, ms, before which it is not begun
 */
export async function enqueueJob<K extends JobKind>(
  tx: Transaction,
  kind: K,
  payload: JobPayloads[K],
  runAt = Date.now(),
): Promise<string> {
  const id = randomUUID();
  await insertJob(tx, { id, kind, payload: JSON.stringify(payload), runAt, createdAt: Date.now() });
  return id;
}
