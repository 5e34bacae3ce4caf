/** Makes the people and laboratories of the demonstration. Made twice, they are still there once. */
import { write } from '@/db/client';
import { upsertLaboratory, upsertMembership } from '@/db/queries/laboratories';
import { selectPersonByEmail, upsertPerson } from '@/db/queries/people';
import type { PersonRole } from '@/lib/auth/actor';
import { newId } from '@/lib/auth/hash-token';
import { hashPassword, isPassword } from '@/lib/auth/password';
import { emailSchema, newPasswordSchema } from '@/schemas/sign-in';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from './demo-accounts';

export interface NewPerson {
  email: string;
  name: string;
  password: string;
  role: PersonRole;
}

export interface NewLaboratory {
  slug: string;
  name: string;
  institution: string;
}

/** A demonstration account's place in a laboratory. */
export interface DemoMembership {
  email: string;
  labId: string;
  role: 'member' | 'manager';
}

/**
 * The id of the account of that address, which then has the stated name, password and role.
 *
 * @throws {ZodError} where the address or the password cannot be one
 */
export async function ensurePerson({ email, name, role, ...given }: NewPerson): Promise<string> {
  const password = newPasswordSchema.parse(given.password);
  const address = emailSchema.parse(email);
  const kept = (await selectPersonByEmail(address))?.passwordHash;
  const unchanged = kept !== undefined && (await isPassword(password, kept));
  const passwordHash = unchanged ? kept : await hashPassword(password);
  return write('acknowledged', (tx) =>
    upsertPerson(tx, { id: newId(), email: address, name, passwordHash, role, createdAt: Date.now() }),
  );
}

/** The id of the laboratory of that slug, which then has the stated name and institution. */
export async function ensureLaboratory(laboratory: NewLaboratory): Promise<string> {
  return write('acknowledged', (tx) =>
    upsertLaboratory(tx, { id: newId(), ...laboratory, createdAt: Date.now() }),
  );
}

/** Has a person belong to a laboratory in that role. */
export async function ensureMembership(
  personId: string,
  labId: string,
  role: 'member' | 'manager',
): Promise<void> {
  await write('acknowledged', (tx) => upsertMembership(tx, { personId, labId, role, createdAt: Date.now() }));
}

/** The four accounts of the demonstration with their laboratories. Returns their ids by e-mail address. */
export async function ensureDemoAccounts(
  memberships: readonly DemoMembership[],
): Promise<Record<string, string>> {
  const ids: Record<string, string> = {};
  for (const { email, name, role } of DEMO_ACCOUNTS) {
    ids[email] = await ensurePerson({ email, name, role, password: DEMO_PASSWORD });
  }
  for (const { email, labId, role } of memberships) {
    const personId = ids[email];
    if (personId === undefined) throw new Error(`${email} is none of the demonstration accounts.`);
    await ensureMembership(personId, labId, role);
  }
  return ids;
}
