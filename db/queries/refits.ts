/** The SQL behind refits that are kept for an hour. */
import { and, eq, gt, inArray, lte } from 'drizzle-orm';
import { readDatabase, type Transaction, write } from '@/db/client';
import { computationLeases } from '@/db/tables/computation-limits';
import { refits } from '@/db/tables/refits';

export type RefitRow = typeof refits.$inferSelect;

/** Adds a refit. */
export async function insertRefit(tx: Transaction, refit: typeof refits.$inferInsert): Promise<void> {
  await tx.insert(refits).values(refit);
}

/** Removes the refits that are past their time. */
export async function deleteExpiredRefits(nowMs: number): Promise<void> {
  await write('counter', async (tx) => {
    await tx.delete(refits).where(lte(refits.expiresAt, nowMs));
  });
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

/** Keeps the place of a refit within the limits for longer, while it is computed. */
export async function renewLeaseOfRefit(id: string, expiresAt: number): Promise<void> {
  await write('counter', async (tx) => {
    const lease = tx.select({ id: refits.leaseId }).from(refits).where(eq(refits.id, id));
    await tx.update(computationLeases).set({ expiresAt }).where(inArray(computationLeases.id, lease));
  });
}

/** Keeps the answer of a refit; what was sent is dropped. Its place within the limits, or null where it is gone. */
export async function updateRefitAnswer(
  tx: Transaction,
  id: string,
  answer: { status: number; body: Uint8Array },
): Promise<string | null> {
  const [updated] = await tx
    .update(refits)
    .set({ answerStatus: answer.status, answer: Buffer.from(answer.body), body: null, progress: 1 })
    .where(eq(refits.id, id))
    .returning({ leaseId: refits.leaseId });
  return updated?.leaseId ?? null;
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
