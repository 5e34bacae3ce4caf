/** The SQL behind `Idempotency-Key`: what a key already did. */
import { and, eq, gt, lte } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import type { Reader } from '@/db/queries/deposits';
import { idempotencyKeys } from '@/db/tables/deposits';

/** What a key did after `since` (Unix time, ms), or undefined. */
export async function selectKey(
  reader: Reader,
  keyHash: string,
  since: number,
): Promise<{ bodyHash: string; outcome: string } | undefined> {
  const [row] = await reader
    .select({ bodyHash: idempotencyKeys.bodyHash, outcome: idempotencyKeys.outcome })
    .from(idempotencyKeys)
    .where(and(eq(idempotencyKeys.keyHash, keyHash), gt(idempotencyKeys.createdAt, since)));
  return row;
}

/** Notes what a key did; in the place of what it did before, which is over by then. */
export async function upsertKey(tx: Transaction, row: typeof idempotencyKeys.$inferInsert): Promise<void> {
  const { keyHash, ...set } = row;
  await tx
    .insert(idempotencyKeys)
    .values({ keyHash, ...set })
    .onConflictDoUpdate({ target: idempotencyKeys.keyHash, set });
}

/** Forgets what was done up to a time. */
export async function purgeKeys(tx: Transaction, upTo: number): Promise<void> {
  await tx.delete(idempotencyKeys).where(lte(idempotencyKeys.createdAt, upTo));
}
