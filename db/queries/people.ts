/** The SQL of accounts and of who belongs to which laboratory. */
import { asc, eq } from 'drizzle-orm';
import { readDatabase, type Transaction } from '@/db/client';
import { laboratories, memberships } from '@/db/tables/laboratories';
import { people } from '@/db/tables/people';

export type PersonRow = typeof people.$inferSelect;

export interface MembershipRow {
  labId: string;
  labSlug: string;
  labName: string;
  role: 'member' | 'manager';
}

/** The account of an e-mail address (lower case, trimmed), or undefined. */
export async function selectPersonByEmail(email: string): Promise<PersonRow | undefined> {
  const database = await readDatabase();
  const [row] = await database.select().from(people).where(eq(people.email, email));
  return row;
}

/** An account, or undefined. */
export async function selectPerson(id: string): Promise<PersonRow | undefined> {
  const database = await readDatabase();
  const [row] = await database.select().from(people).where(eq(people.id, id));
  return row;
}

/** The laboratories of a person, by name. */
export async function selectMemberships(personId: string): Promise<MembershipRow[]> {
  const database = await readDatabase();
  return database
    .select({
      labId: memberships.labId,
      labSlug: laboratories.slug,
      labName: laboratories.name,
      role: memberships.role,
    })
    .from(memberships)
    .innerJoin(laboratories, eq(laboratories.id, memberships.labId))
    .where(eq(memberships.personId, personId))
    .orderBy(asc(laboratories.name));
}

/** Adds an account, or gives the one of that address the stated name, role and password. Returns its id. */
export async function upsertPerson(tx: Transaction, row: typeof people.$inferInsert): Promise<string> {
  const { name, role, passwordHash } = row;
  const [kept] = await tx
    .insert(people)
    .values(row)
    .onConflictDoUpdate({ target: people.email, set: { name, role, passwordHash } })
    .returning({ id: people.id });
  return kept?.id ?? row.id;
}
