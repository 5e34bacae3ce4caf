/** The calls of the depositing API as a script makes them, on an application that runs, by invented people. */
import { randomUUID } from 'node:crypto';
import { write } from '@/db/client';
import type { LabTokenScope, Membership, Person, PersonRole } from '@/lib/auth/actor';
import { startSession } from '@/lib/auth/session';
import { createToken } from '@/lib/labs/create-token';
import { listSystem, makeLab, makePerson } from './collection';
import type { RunningApp } from './start-app';

type Headers = Record<string, string>;

/** Has the test's own process use the database of the application; then makes a laboratory and a listed system in it. */
export async function settleIn(app: RunningApp): Promise<Membership> {
  process.env.CURVEKEEP_DATA_DIR = app.dataDir;
  await listSystem();
  return makeLab(`lab-${randomUUID()}`);
}

/** The Authorization header of a new token of a laboratory. */
export async function tokenHeader(
  lab: Membership,
  scopes: LabTokenScope[] = ['read-drafts', 'write-drafts', 'submit'],
): Promise<Headers> {
  const manager = await makePerson('depositor', { ...lab, role: 'manager' });
  const made = await createToken(manager, lab.labId, { name: 'test', scopes, days: 1 });
  if (!made.ok) throw new Error(JSON.stringify(made.failure));
  return { Authorization: `Bearer ${made.token}` };
}

/** The Cookie header of somebody who signed in. */
export async function sessionHeader(
  role: PersonRole,
  ...labs: Membership[]
): Promise<{ person: Person; headers: Headers }> {
  const person = await makePerson(role, ...labs);
  const { name, value } = await write('acknowledged', (tx) => startSession(tx, person.id));
  return { person, headers: { Cookie: `${name}=${value}` } };
}

/** Sends a call; a body that is no text and no bytes goes as JSON. */
export function call(
  app: RunningApp,
  method: string,
  path: string,
  headers: Headers = {},
  body?: unknown,
): Promise<Response> {
  const isRaw = body === undefined || typeof body === 'string' || body instanceof Uint8Array;
  return fetch(`${app.url}/api/v1${path}`, {
    method,
    headers: { ...(body === undefined ? {} : { 'Content-Type': 'application/json' }), ...headers },
    body: isRaw ? (body as string | Uint8Array<ArrayBuffer> | undefined) : JSON.stringify(body),
    redirect: 'manual',
  });
}
