/** The SQL of what curators decided. */
import { desc, eq } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import type { Reader } from '@/db/queries/deposits';
import { decisions } from '@/db/tables/deposits';

export type DecisionRow = typeof decisions.$inferSelect;

/** All decisions about a deposit, newest first. */
export async function selectDecisions(reader: Reader, depositId: string): Promise<DecisionRow[]> {
  return reader
    .select()
    .from(decisions)
    .where(eq(decisions.depositId, depositId))
    .orderBy(desc(decisions.id));
}

/** Adds a decision. */
export async function insertDecision(tx: Transaction, row: typeof decisions.$inferInsert): Promise<void> {
  await tx.insert(decisions).values(row);
}
