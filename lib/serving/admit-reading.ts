/**
 * How often one address may read what is published: so many calls within any sixty seconds, counted beside the
 * computations in the database, so that several processes keep one limit.
 */
import { setTimeout as sleep } from 'node:timers/promises';
import { write } from '@/db/client';
import {
  addComputationUse,
  purgeComputationUse,
  selectComputationUse,
} from '@/db/queries/computation-limits';
import { addressKey } from '@/lib/assessments/address-key';
import { WINDOW_SECONDS } from '@/lib/assessments/computation-limits';
import { env } from '@/lib/env';
import { log } from '@/lib/log';

const READS_PER_MINUTE = 600;
const TIMES_IN_DEMONSTRATION = 10;

/** A read does not wait longer for its turn to be counted; the count is kept when the turn comes. */
const MOST_WAIT_MS = 200;

export interface ReadQuota {
  limit: number;
  left: number;
  /** seconds until some of it comes back */
  resetSeconds: number;
}

export type ReadAdmission = { admitted: boolean; quota: ReadQuota };

/** How many reads an address has a minute. */
export function readsPerMinute(demo: boolean): number {
  return READS_PER_MINUTE * (demo ? TIMES_IN_DEMONSTRATION : 1);
}

/** Counts a read of an address; null where that could not be done soon: then it is let in all the same. */
export async function admitReading(peer: string, nowMs = Date.now()): Promise<ReadAdmission | null> {
  const counting = count(peer, nowMs).catch((error: unknown) => {
    log().error({ err: error }, 'a read could not be counted');
    return null;
  });
  return Promise.race([counting, sleep(MOST_WAIT_MS, null, { ref: false })]);
}

async function count(peer: string, nowMs: number): Promise<ReadAdmission> {
  const limit = readsPerMinute(env().demo);
  const [key, now] = [`read ${await addressKey(peer)}`, Math.floor(nowMs / 1000)];
  return write('counter', async (tx) => {
    await purgeComputationUse(tx, now - WINDOW_SECONDS, nowMs);
    const seconds = await selectComputationUse(tx, key, now - WINDOW_SECONDS);
    const used = seconds.reduce((sum, { calls }) => sum + calls, 0);
    const admitted = used < limit;
    if (admitted) await addComputationUse(tx, key, { second: now, calls: 1, points: 0 });
    const resetSeconds = Math.max(1, (seconds[0]?.second ?? now) + WINDOW_SECONDS - now);
    return { admitted, quota: { limit, left: Math.max(0, limit - used - 1), resetSeconds } };
  });
}

/** `RateLimit-Policy` and `RateLimit` (draft-ietf-httpapi-ratelimit-headers-10). */
export function readLimitHeaders({ limit, left, resetSeconds }: ReadQuota): Record<string, string> {
  return {
    'RateLimit-Policy': `"reads";q=${limit};w=${WINDOW_SECONDS}`,
    RateLimit: `"reads";r=${left};t=${resetSeconds}`,
  };
}
