/** The SQL of revisions: immutable snapshots of a deposit's document, each with its assessment. */
import { and, desc, eq, getTableColumns, inArray, isNotNull, max, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import type { Reader } from '@/db/queries/deposits';
import { deposits, revisions } from '@/db/tables/deposits';
import { laboratories } from '@/db/tables/laboratories';

export type RevisionRow = typeof revisions.$inferSelect;

const { document: _document, assessment: _assessment, ...headColumns } = getTableColumns(revisions);

/** A revision without document and assessment. */
export type RevisionHead = Omit<RevisionRow, 'document' | 'assessment'>;

/** All revisions of a deposit, newest first. */
export async function selectRevisions(reader: Reader, depositId: string): Promise<RevisionHead[]> {
  return reader
    .select(headColumns)
    .from(revisions)
    .where(eq(revisions.depositId, depositId))
    .orderBy(desc(revisions.number));
}

/** The newest revision whole, or undefined. */
export async function selectNewestRevision(
  reader: Reader,
  depositId: string,
): Promise<RevisionRow | undefined> {
  const [row] = await reader
    .select()
    .from(revisions)
    .where(eq(revisions.depositId, depositId))
    .orderBy(desc(revisions.number))
    .limit(1);
  return row;
}

/** The newest revision without document and assessment, or undefined. */
export async function selectNewestHead(reader: Reader, depositId: string): Promise<RevisionHead | undefined> {
  const [row] = await reader
    .select(headColumns)
    .from(revisions)
    .where(eq(revisions.depositId, depositId))
    .orderBy(desc(revisions.number))
    .limit(1);
  return row;
}

/** The newest revision that is published, without document and assessment, or undefined. */
export async function selectNewestPublished(
  reader: Reader,
  depositId: string,
): Promise<RevisionHead | undefined> {
  const [row] = await reader
    .select(headColumns)
    .from(revisions)
    .where(and(eq(revisions.depositId, depositId), isNotNull(revisions.publishedAt)))
    .orderBy(desc(revisions.number))
    .limit(1);
  return row;
}

/** Summaries of the newest revisions of some deposits, as JSON, by the deposit's id. */
export async function selectNewestSummaries(
  reader: Reader,
  depositIds: string[],
): Promise<Map<string, string>> {
  const newer = sql`(select max(newer.number) from revisions newer where newer.deposit_id = ${revisions.depositId})`;
  const rows = await reader
    .select({ depositId: revisions.depositId, summary: revisions.summary })
    .from(revisions)
    .where(and(inArray(revisions.depositId, depositIds), eq(revisions.number, newer)));
  return new Map(rows.map(({ depositId, summary }) => [depositId, summary]));
}

/** Number of the newest revision; 0 where there is none. */
export async function newestRevisionNumber(reader: Reader, depositId: string): Promise<number> {
  const [row] = await reader
    .select({ number: max(revisions.number) })
    .from(revisions)
    .where(eq(revisions.depositId, depositId));
  return row?.number ?? 0;
}

/** Adds a revision. */
export async function insertRevision(tx: Transaction, row: typeof revisions.$inferInsert): Promise<void> {
  await tx.insert(revisions).values(row);
}

/** Notes when a revision was published. */
export async function markPublished(
  tx: Transaction,
  depositId: string,
  number: number,
  publishedAt: number,
): Promise<void> {
  await tx
    .update(revisions)
    .set({ publishedAt })
    .where(and(eq(revisions.depositId, depositId), eq(revisions.number, number)));
}

/** Removes the revisions of a draft that is removed. */
export async function deleteRevisions(tx: Transaction, depositId: string): Promise<void> {
  await tx.delete(revisions).where(eq(revisions.depositId, depositId));
}

/** One line of the curators' queue. */
export interface QueueRow {
  id: string;
  state: typeof deposits.$inferSelect.state;
  version: number;
  title: string;
  system: string;
  labId: string;
  labSlug: string;
  labName: string;
  revision: number;
  summary: string;
  submittedBy: string;
  submittedAt: number;
}

/** Deposits in some states with their newest revision, the longest waiting first. */
export async function selectQueue(
  reader: Reader,
  states: readonly (typeof deposits.$inferSelect.state)[],
): Promise<QueueRow[]> {
  const newest = sql`(select max(newer.number) from revisions newer where newer.deposit_id = ${deposits.id})`;
  return reader
    .select({
      id: deposits.id,
      state: deposits.state,
      version: deposits.version,
      title: deposits.title,
      system: deposits.system,
      labId: deposits.labId,
      labSlug: laboratories.slug,
      labName: laboratories.name,
      revision: revisions.number,
      summary: revisions.summary,
      submittedBy: revisions.submittedBy,
      submittedAt: revisions.submittedAt,
    })
    .from(deposits)
    .innerJoin(laboratories, eq(laboratories.id, deposits.labId))
    .innerJoin(revisions, and(eq(revisions.depositId, deposits.id), eq(revisions.number, newest)))
    .where(inArray(deposits.state, [...states]))
    .orderBy(revisions.submittedAt, deposits.id);
}
