/**
 * Who is asking, found anew at every request, so that a role that was taken away or an account that was disabled
 * counts from the next one on. Not to be called inside a write, since it may write itself.
 */
import { cookies } from 'next/headers';
import { cache } from 'react';
import { write } from '@/db/client';
import { selectLiveToken, updateTokenUsed } from '@/db/queries/lab-tokens';
import { selectMemberships, selectPerson } from '@/db/queries/people';
import { isOpenHere } from '@/lib/people/demonstration-only';
import { type Actor, LAB_TOKEN_SCOPES, type LabToken, type Person, VISITOR } from './actor';
import { hashToken } from './hash-token';
import { personOfSession, sessionCookieName, sessionIdOf } from './session';

/** How exactly it is kept when a token was last used. */
const LAST_USE_STEP_MS = 60_000;

/**
 * The actor of a call: of its lab token where it brings an Authorization header, else of its session's cookie. A
 * token that does not hold makes a visitor, whatever cookie comes with it.
 */
export async function actorOfRequest(request: Request): Promise<Actor> {
  const authorization = request.headers.get('authorization');
  if (authorization !== null) return (await tokenOf(authorization)) ?? VISITOR;
  return actorOfSession(sessionIdOf(request.headers.get('cookie')));
}

/** The actor of a page or server action. Within one page it is looked for once. */
export const actorOfPage = cache(async (): Promise<Actor> => {
  return actorOfSession((await cookies()).get(sessionCookieName())?.value ?? null);
});

async function actorOfSession(sessionId: string | null): Promise<Actor> {
  if (!sessionId) return VISITOR;
  const personId = await personOfSession(sessionId);
  return (personId === null ? null : await personOf(personId)) ?? VISITOR;
}

async function personOf(id: string): Promise<Person | null> {
  const [row, memberships] = await Promise.all([selectPerson(id), selectMemberships(id)]);
  if (!row || row.disabledAt !== null || !isOpenHere(row.email)) return null;
  const { name, email, role } = row;
  return { kind: 'person', id, name, email, role, memberships };
}

async function tokenOf(authorization: string): Promise<LabToken | null> {
  const token = /^Bearer +(\S+) *$/i.exec(authorization)?.[1];
  const now = Date.now();
  const row = token === undefined ? undefined : await selectLiveToken(hashToken(token), now);
  if (!row || (row.createdByEmail !== null && !isOpenHere(row.createdByEmail))) return null;
  if (now - (row.lastUsedAt ?? 0) >= LAST_USE_STEP_MS) {
    await write('counter', (tx) => updateTokenUsed(tx, row.id, now));
  }
  const scopes = LAB_TOKEN_SCOPES.filter((scope) => row.scopes.includes(scope));
  return { kind: 'token', id: row.id, labId: row.labId, scopes };
}
