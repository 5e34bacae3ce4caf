/** The SQL of the audit trail: rows are added and read, never changed. */
import { desc, eq } from 'drizzle-orm';
import { readDatabase, type Transaction } from '@/db/client';
import { auditTrail } from '@/db/tables/deposits';

export type AuditRow = typeof auditTrail.$inferSelect;

/** Adds one row. */
export async function insertAuditEntry(tx: Transaction, row: typeof auditTrail.$inferInsert): Promise<void> {
  await tx.insert(auditTrail).values(row);
}

/** All rows about one subject, newest first. */
export async function selectAuditOf(subject: string): Promise<AuditRow[]> {
  const database = await readDatabase();
  return database
    .select()
    .from(auditTrail)
    .where(eq(auditTrail.subject, subject))
    .orderBy(desc(auditTrail.id));
}
