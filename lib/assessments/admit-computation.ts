/**
 * Lets a computation in, or says why not, and notes its end. The counts live in the database, so that several
 * processes keep one set of limits; each step is one short write transaction.
 */
import { randomUUID } from 'node:crypto';
import { type Transaction, write } from '@/db/client';
import {
  addComputationUse,
  deleteLease,
  insertLease,
  purgeComputationUse,
  selectComputationUse,
  selectLeases,
} from '@/db/queries/computation-limits';
import {
  type ComputationLimits,
  type Quota,
  quotaAfter,
  type Refusal,
  refusalOf,
  retryAfterSeconds,
  type Use,
  WINDOW_SECONDS,
} from './computation-limits';

/**
 * Longer than any assessment can take (a minute for its body, half a minute to compute): after it a lease is a dead
 * process's.
 */
const LEASE_MS = 120_000;

export interface Lease {
  id: string;
  addressKey: string;
  /** points that this computation may have */
  pointsBudget: number;
}

export type Admission =
  | { admitted: true; lease: Lease; quota: Quota }
  | { admitted: false; refusal: Refusal; retryAfterSeconds: number; quota: Quota };

/**
 * Counts a call of an address and takes a place for it.
 *
 * @param mostPoints how many points the call can have at most; set aside until `endComputation`
 * @param leaseMs after which the place is free again whatever happens
 */
export async function admitComputation(
  addressKey: string,
  limits: ComputationLimits,
  mostPoints: number,
  nowMs = Date.now(),
  leaseMs = LEASE_MS,
): Promise<Admission> {
  const now = Math.floor(nowMs / 1000);
  return write('counter', async (tx) => {
    await purgeComputationUse(tx, now - WINDOW_SECONDS, nowMs);
    const use = await readUse(tx, addressKey, now);
    const before = quotaAfter(use, limits, now);
    const refusal = refusalOf(before);
    if (refusal) {
      const wait = retryAfterSeconds(refusal, use, limits, now);
      return { admitted: false, refusal, retryAfterSeconds: wait, quota: before } as const;
    }
    const pointsBudget = Math.min(mostPoints, before.points.left);
    const lease: Lease = { id: randomUUID(), addressKey, pointsBudget };
    await addComputationUse(tx, addressKey, { second: now, calls: 1, points: 0 });
    await insertLease(tx, {
      id: lease.id,
      addressKey,
      reservedPoints: pointsBudget,
      expiresAt: nowMs + leaseMs,
    });
    return {
      admitted: true,
      lease,
      quota: quotaAfter(await readUse(tx, addressKey, now), limits, now),
    } as const;
  });
}

/**
 * Gives the place back and counts the points that were computed.
 *
 * @param neededPoints of a computation refused for its points: how many it had
 * @returns what is left now, and when a computation of `neededPoints` would be let in
 */
export async function endComputation(
  lease: Lease,
  limits: ComputationLimits,
  { computedPoints = 0, neededPoints = 1 }: { computedPoints?: number; neededPoints?: number },
  nowMs = Date.now(),
): Promise<{ quota: Quota; retryAfterSeconds: number }> {
  const now = Math.floor(nowMs / 1000);
  return write('counter', async (tx) => {
    await deleteLease(tx, lease.id);
    if (computedPoints > 0) {
      await addComputationUse(tx, lease.addressKey, { second: now, calls: 0, points: computedPoints });
    }
    const use = await readUse(tx, lease.addressKey, now);
    return {
      quota: quotaAfter(use, limits, now),
      retryAfterSeconds: retryAfterSeconds('too-many-points', use, limits, now, neededPoints),
    };
  });
}

async function readUse(tx: Transaction, addressKey: string, now: number): Promise<Use> {
  const seconds = await selectComputationUse(tx, addressKey, now - WINDOW_SECONDS);
  const { count, reservedPoints } = await selectLeases(tx, addressKey);
  return { seconds, underWay: count, reservedPoints };
}
