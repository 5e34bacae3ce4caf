/** Invented laboratories, people, systems and deposits, made in the database of the test. */
import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { readDatabase, write } from '@/db/client';
import { auditTrail, deposits } from '@/db/tables/deposits';
import { laboratories, memberships } from '@/db/tables/laboratories';
import { people } from '@/db/tables/people';
import { systems } from '@/db/tables/systems';
import type { LabToken, LabTokenScope, Membership, Person, PersonRole } from '@/lib/auth/actor';
import { acceptDeposit } from '@/lib/curation/accept-deposit';
import { askForChanges } from '@/lib/curation/ask-for-changes';
import { createDeposit } from '@/lib/deposits/create-deposit';
import type { DepositState } from '@/lib/deposits/states';
import { submitDeposit } from '@/lib/deposits/submit-deposit';
import type { Failed, Outcome } from '@/lib/errors';
import { exampleDocument } from './example-document';

/** A laboratory of that slug. */
export async function makeLab(slug: string): Promise<Membership> {
  const labId = randomUUID();
  const labName = `Laboratory ${slug} (invented)`;
  await write('acknowledged', async (tx) => {
    await tx
      .insert(laboratories)
      .values({ id: labId, slug, name: labName, institution: 'Invented Institute', createdAt: Date.now() });
  });
  return { labId, labSlug: slug, labName, role: 'member' };
}

/** A person of that role who belongs to those laboratories. Nobody can sign in as them. */
export async function makePerson(role: PersonRole, ...labs: Membership[]): Promise<Person> {
  const id = randomUUID();
  const name = `Invented ${role}`;
  const email = `${id}@test.example`;
  const createdAt = Date.now();
  await write('acknowledged', async (tx) => {
    await tx.insert(people).values({ id, email, name, role, passwordHash: '-', createdAt });
    for (const { labId, role: inLab } of labs) {
      await tx.insert(memberships).values({ personId: id, labId, role: inLab, createdAt });
    }
  });
  return { kind: 'person', id, name, email, role, memberships: labs };
}

/** A token of a laboratory as an actor. */
export function tokenOf({ labId }: Membership, ...scopes: LabTokenScope[]): LabToken {
  return { kind: 'token', id: randomUUID(), labId, scopes };
}

/** A listed system, the one that the example document names. */
export async function listSystem(slug = 'alrq-velline'): Promise<void> {
  const row = { slug, name: 'AlrQ with velline (invented)', protein: 'AlrQ', ligands: ['velline'] };
  await write('acknowledged', async (tx) => {
    await tx
      .insert(systems)
      .values({ ...row, status: 'listed', createdAt: Date.now() })
      .onConflictDoNothing();
  });
}

/** Reads a body of that text, or of that value as JSON. */
export function bodyOf(value: unknown) {
  const text = typeof value === 'string' ? value : JSON.stringify(value);
  return async () => ({ ok: true as const, bytes: new TextEncoder().encode(text) });
}

/** What a verb that must have worked came to. */
export function worked<T>(outcome: Outcome<T>): T {
  if (!outcome.ok) throw new Error(`The verb failed: ${JSON.stringify(outcome.failure)}`);
  return outcome;
}

/** The code with which a verb must have failed. */
export function codeOf(outcome: { ok: true } | Failed): string {
  if (outcome.ok) throw new Error('The verb should have failed.');
  return outcome.failure.code;
}

/** The actors of most tests: one laboratory with its depositor and token, another one, curators of neither and of one. */
export async function makeCollection() {
  await listSystem();
  const [lab, otherLab] = [await makeLab(`lab-${randomUUID()}`), await makeLab(`lab-${randomUUID()}`)];
  return {
    lab,
    otherLab,
    depositor: await makePerson('depositor', lab),
    outsider: await makePerson('depositor', otherLab),
    token: tokenOf(lab, 'read-drafts', 'write-drafts', 'submit'),
    curator: await makePerson('curator'),
    ownCurator: await makePerson('curator', lab),
    administrator: await makePerson('administrator'),
  };
}

type Collection = Pick<Awaited<ReturnType<typeof makeCollection>>, 'depositor' | 'curator'>;

/** A deposit of the depositor's laboratory, brought to a state by the verbs where there are some. */
export async function makeDeposit(
  { depositor, curator }: Collection,
  state: DepositState = 'draft',
  document: unknown = exampleDocument(),
): Promise<string> {
  const created = worked(await createDeposit({ actor: depositor, lab: null, readBody: bodyOf(document) }));
  const { id } = created.deposit;
  if (state === 'draft') return id;
  worked(await submitDeposit({ actor: depositor, id }));
  if (state === 'changes-requested')
    worked(await askForChanges({ actor: curator, id, letter: 'Please add.' }));
  else if (state === 'published') worked(await acceptDeposit({ actor: curator, id }));
  else if (state !== 'submitted') await forceState(id, state);
  return id;
}

/** Puts a deposit into a state for which there is no verb yet. */
export async function forceState(id: string, state: DepositState): Promise<void> {
  await write('acknowledged', async (tx) => {
    await tx.update(deposits).set({ state }).where(eq(deposits.id, id));
  });
}

/** State and version of a deposit as they stand in the database; undefined where it is gone. */
export async function stored(id: string) {
  const database = await readDatabase();
  const [row] = await database.select().from(deposits).where(eq(deposits.id, id));
  return row;
}

/** What the audit trail says of a deposit, oldest first: actions with their detail. */
export async function auditOf(id: string): Promise<string[]> {
  const database = await readDatabase();
  const rows = await database
    .select()
    .from(auditTrail)
    .where(eq(auditTrail.subject, `deposit:${id}`))
    .orderBy(auditTrail.id);
  return rows.map(({ action, detail }) => `${action}: ${detail}`);
}
