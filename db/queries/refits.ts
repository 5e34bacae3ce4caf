/** The SQL behind refits that are kept for an hour. */
import { and, eq, gt, lte } from 'drizzle-orm';
import { readDatabase, type Transaction, write } from '@/db/client';
import { refits } from '@/db/tables/refits';

export type RefitRow = typeof refits.$inferSelect;

/** Adds a refit and removes those that are past their time. */
export async function insertRefit(
  tx: Transaction,
  refit: typeof refits.$inferInsert,
  nowMs: number,
): Promise<void> {
  await tx.delete(refits).where(lte(refits.expiresAt, nowMs));
  await tx.insert(refits).values(refit);
}

/** A refit that is not past its time. */
export async function selectRefit(id: string, nowMs: number): Promise<RefitRow | null> {
  const database = await readDatabase();
  const [found] = await database
    .select()
    .from(refits)
    .where(and(eq(refits.id, id), gt(refits.expiresAt, nowMs)));
  return found ?? null;
}

/** Notes how far a refit is. */
export async function updateRefitProgress(id: string, progress: number): Promise<void> {
  await write('counter', async (tx) => {
    await tx.update(refits).set({ progress }).where(eq(refits.id, id));
  });
}

/** Keeps the answer of a refit; what was sent is dropped. */
export async function updateRefitAnswer(
  tx: Transaction,
  id: string,
  answer: { status: number; body: Uint8Array },
): Promise<void> {
  await tx
    .update(refits)
    .set({ answerStatus: answer.status, answer: Buffer.from(answer.body), body: null, progress: 1 })
    .where(eq(refits.id, id));
}

/** Removes a refit; its job and its place within the limits, or null where there was none. */
export async function deleteRefit(
  tx: Transaction,
  id: string,
): Promise<{ jobId: string; leaseId: string } | null> {
  const [deleted] = await tx
    .delete(refits)
    .where(eq(refits.id, id))
    .returning({ jobId: refits.jobId, leaseId: refits.leaseId });
  return deleted ?? null;
}
