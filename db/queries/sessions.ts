/** The SQL of sessions, which are known here by the SHA-256 of their id alone. */
import { and, eq, inArray, isNull, lte, or } from 'drizzle-orm';
import { readDatabase, type Transaction } from '@/db/client';
import { people, sessions } from '@/db/tables/people';

export type SessionRow = typeof sessions.$inferSelect;

/** A session, and whether its account is in use; undefined where there is no such session. */
export async function selectSession(
  idHash: string,
): Promise<(SessionRow & { accountInUse: boolean }) | undefined> {
  const database = await readDatabase();
  const [row] = await database
    .select({ session: sessions, person: people.id })
    .from(sessions)
    .leftJoin(people, and(eq(people.id, sessions.personId), isNull(people.disabledAt)))
    .where(eq(sessions.idHash, idHash));
  return row && { ...row.session, accountInUse: row.person !== null };
}

/** All sessions of a person. */
export async function selectSessionsOf(personId: string): Promise<SessionRow[]> {
  const database = await readDatabase();
  return database.select().from(sessions).where(eq(sessions.personId, personId));
}

/** Adds a session. */
export async function insertSession(tx: Transaction, row: SessionRow): Promise<void> {
  await tx.insert(sessions).values(row);
}

/** Moves the end of a session. */
export async function updateSessionEnd(tx: Transaction, idHash: string, expiresAt: number): Promise<void> {
  await tx.update(sessions).set({ expiresAt }).where(eq(sessions.idHash, idHash));
}

/** Removes a session; where there is none, nothing. */
export async function deleteSession(tx: Transaction, idHash: string): Promise<void> {
  await tx.delete(sessions).where(eq(sessions.idHash, idHash));
}

/** Removes all sessions of a person. */
export async function deleteSessionsOf(tx: Transaction, personId: string): Promise<void> {
  await tx.delete(sessions).where(eq(sessions.personId, personId));
}

/** Removes all sessions of the accounts of some e-mail addresses. */
export async function deleteSessionsOfAddresses(tx: Transaction, emails: readonly string[]): Promise<void> {
  const owners = tx
    .select({ id: people.id })
    .from(people)
    .where(inArray(people.email, [...emails]));
  await tx.delete(sessions).where(inArray(sessions.personId, owners));
}

/** Removes the sessions that ended at or before `nowMs`, or began at or before `begunMs`. */
export async function deleteEndedSessions(tx: Transaction, nowMs: number, begunMs: number): Promise<void> {
  await tx.delete(sessions).where(or(lte(sessions.expiresAt, nowMs), lte(sessions.createdAt, begunMs)));
}
