/** The SQL of deposits: the working document, its state and its version. */
import { and, desc, eq, getTableColumns, inArray, lt, max, or, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { deposits } from '@/db/tables/deposits';
import { laboratories, labTokens, memberships } from '@/db/tables/laboratories';
import { people } from '@/db/tables/people';
import { systems } from '@/db/tables/systems';

/** Whatever can select: the database, or a transaction. */
export type Reader = Pick<Database | Transaction, 'select'>;

type State = typeof deposits.$inferSelect.state;

const { document: _document, errors: _errors, ...headColumns } = getTableColumns(deposits);
// Whoever curates is not named to a laboratory; its own people and tokens are.
const SAVED_BY = sql<string | null>`coalesce(
  (select ${people.name} from ${people} where ${deposits.updatedBy} = 'person:' || ${people.id}
    and (${people.role} = 'depositor' or exists (select 1 from ${memberships}
      where ${memberships.personId} = ${people.id} and ${memberships.labId} = ${deposits.labId}))),
  (select 'the token “' || ${labTokens.name} || '”' from ${labTokens}
    where ${deposits.updatedBy} = 'token:' || ${labTokens.id}))`;
/** Whether a draft names no listed system and that is not among its errors already; 1 or 0. */
const NAMES_UNLISTED = sql<number>`(${deposits.state} in ('draft', 'changes-requested')
  and not exists (select 1 from ${systems} where ${systems.slug} = ${deposits.system} and ${systems.status} = 'listed')
  and instr(${deposits.errors}, '"pointer":"/system"') = 0)`;
const HEAD = {
  ...headColumns,
  errorCount: sql<number>`${deposits.errorCount} + ${NAMES_UNLISTED}`,
  labSlug: laboratories.slug,
  labName: laboratories.name,
  savedBy: SAVED_BY,
};

/** A deposit without its document. */
export type DepositHead = Omit<typeof deposits.$inferSelect, 'document' | 'errors'> & {
  /** what stands in the way of submitting it; a system that is not listed counts */
  errorCount: number;
  labSlug: string;
  labName: string;
  /** who of the laboratory made the last change; null: a curator, or the application */
  savedBy: string | null;
};

/** A deposit without its document, or undefined. */
export async function selectDeposit(reader: Reader, id: string): Promise<DepositHead | undefined> {
  const [row] = await reader
    .select(HEAD)
    .from(deposits)
    .innerJoin(laboratories, eq(laboratories.id, deposits.labId))
    .where(eq(deposits.id, id));
  return row;
}

/** The working document with what is wrong with it, and the version that this is. */
export async function selectDraft(
  reader: Reader,
  id: string,
): Promise<{ document: string; errors: string; version: number } | undefined> {
  const [row] = await reader
    .select({ document: deposits.document, errors: deposits.errors, version: deposits.version })
    .from(deposits)
    .where(eq(deposits.id, id));
  return row;
}

/** Where a page of a list begins: after this row. */
export interface ListPlace {
  updatedAt: number;
  id: string;
}

/** Deposits of some laboratories, the last changed first. */
export async function selectDepositsOf(
  reader: Reader,
  { labIds, state, after, limit }: { labIds: string[]; state?: State; after?: ListPlace; limit: number },
): Promise<DepositHead[]> {
  const behind = after
    ? or(
        lt(deposits.updatedAt, after.updatedAt),
        and(eq(deposits.updatedAt, after.updatedAt), lt(deposits.id, after.id)),
      )
    : undefined;
  return reader
    .select(HEAD)
    .from(deposits)
    .innerJoin(laboratories, eq(laboratories.id, deposits.labId))
    .where(and(inArray(deposits.labId, labIds), state ? eq(deposits.state, state) : undefined, behind))
    .orderBy(desc(deposits.updatedAt), desc(deposits.id))
    .limit(limit);
}

/** Adds a deposit. */
export async function insertDeposit(tx: Transaction, row: typeof deposits.$inferInsert): Promise<void> {
  await tx.insert(deposits).values(row);
}

/** What is kept of a working document. */
export interface DraftContent {
  document: string;
  title: string;
  system: string;
  errors: string;
  errorCount: number;
}

/** Which row an update means: what it was when the decision was made. Where it is no more, nothing is changed. */
export interface Expected {
  id: string;
  version: number;
  from: State;
}

/** When and by whom a deposit is changed. */
interface ChangedBy {
  updatedAt: number;
  /** as the audit trail writes actors */
  updatedBy: string;
}

/** Puts another document in the place of the working one. Returns whether the row was still the expected one. */
export async function updateDocument(
  tx: Transaction,
  expected: Expected,
  content: DraftContent & ChangedBy,
): Promise<boolean> {
  const changed = await tx
    .update(deposits)
    .set({ ...content, version: expected.version + 1 })
    .where(matching(expected))
    .returning({ id: deposits.id });
  return changed.length === 1;
}

/** Moves a deposit to another state. Returns whether the row was still the expected one. */
export async function updateState(
  tx: Transaction,
  expected: Expected,
  to: ChangedBy & {
    state: State;
    accession?: number;
    publishOn?: string | null;
    publishZone?: string | null;
  },
): Promise<boolean> {
  const changed = await tx
    .update(deposits)
    .set({ ...to, version: expected.version + 1 })
    .where(matching(expected))
    .returning({ id: deposits.id });
  return changed.length === 1;
}

/** Removes a deposit whose revisions and files are gone already. Returns whether the row was still the expected one. */
export async function removeDeposit(tx: Transaction, expected: Expected): Promise<boolean> {
  const removed = await tx.delete(deposits).where(matching(expected)).returning({ id: deposits.id });
  return removed.length === 1;
}

/** The accession that follows the highest ever given. Deposits that have one are never removed. */
export async function nextAccession(tx: Transaction): Promise<number> {
  const [row] = await tx.select({ highest: max(deposits.accession) }).from(deposits);
  return (row?.highest ?? 0) + 1;
}

/** The accepted deposits that wait for a day. */
export async function selectAwaitingDay(
  reader: Reader,
): Promise<{ id: string; publishOn: string | null; publishZone: string | null }[]> {
  return reader
    .select({ id: deposits.id, publishOn: deposits.publishOn, publishZone: deposits.publishZone })
    .from(deposits)
    .where(eq(deposits.state, 'accepted'));
}

/** Whether a system of that slug is listed. */
export async function isListedSystem(reader: Reader, slug: string): Promise<boolean> {
  const rows = await reader
    .select({ slug: systems.slug })
    .from(systems)
    .where(and(eq(systems.slug, slug), eq(systems.status, 'listed')));
  return rows.length > 0;
}

function matching({ id, version, from }: Expected) {
  return and(eq(deposits.id, id), eq(deposits.version, version), eq(deposits.state, from));
}
