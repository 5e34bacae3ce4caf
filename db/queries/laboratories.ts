/** The SQL of laboratories and their members. */
import { asc, eq } from 'drizzle-orm';
import { readDatabase, type Transaction } from '@/db/client';
import { laboratories, memberships } from '@/db/tables/laboratories';
import { people } from '@/db/tables/people';

export type LaboratoryRow = typeof laboratories.$inferSelect;

export interface MemberRow {
  personId: string;
  name: string;
  email: string;
  role: 'member' | 'manager';
}

/** All laboratories, by name. */
export async function selectLaboratories(): Promise<LaboratoryRow[]> {
  const database = await readDatabase();
  return database.select().from(laboratories).orderBy(asc(laboratories.name));
}

/** A laboratory, or undefined. */
export async function selectLaboratory(id: string): Promise<LaboratoryRow | undefined> {
  const database = await readDatabase();
  const [row] = await database.select().from(laboratories).where(eq(laboratories.id, id));
  return row;
}

/** The laboratory of a slug, or undefined. */
export async function selectLaboratoryBySlug(slug: string): Promise<LaboratoryRow | undefined> {
  const database = await readDatabase();
  const [row] = await database.select().from(laboratories).where(eq(laboratories.slug, slug));
  return row;
}

/** Who belongs to a laboratory: managers first, then by name. */
export async function selectMembers(labId: string): Promise<MemberRow[]> {
  const database = await readDatabase();
  return (
    database
      .select({ personId: people.id, name: people.name, email: people.email, role: memberships.role })
      .from(memberships)
      .innerJoin(people, eq(people.id, memberships.personId))
      .where(eq(memberships.labId, labId))
      // 'manager' sorts before 'member'.
      .orderBy(asc(memberships.role), asc(people.name))
  );
}

/** Adds a laboratory, or gives the one of that slug the stated name and institution. Returns its id. */
export async function upsertLaboratory(
  tx: Transaction,
  row: typeof laboratories.$inferInsert,
): Promise<string> {
  const { name, institution } = row;
  const [kept] = await tx
    .insert(laboratories)
    .values(row)
    .onConflictDoUpdate({ target: laboratories.slug, set: { name, institution } })
    .returning({ id: laboratories.id });
  return kept?.id ?? row.id;
}

/** Makes a person a member or manager of a laboratory. */
export async function upsertMembership(tx: Transaction, row: typeof memberships.$inferInsert): Promise<void> {
  await tx
    .insert(memberships)
    .values(row)
    .onConflictDoUpdate({ target: [memberships.personId, memberships.labId], set: { role: row.role } });
}
