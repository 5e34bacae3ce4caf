/** The verb behind the sign-in form: an address and a password in, a session out. */
import { setTimeout as sleep } from 'node:timers/promises';
import { write } from '@/db/client';
import { type PersonRow, selectPersonByEmail } from '@/db/queries/people';
import { deleteSignInAttempts, upsertSignInPlace } from '@/db/queries/sign-in-attempts';
import { noteLimited } from '@/lib/audit/audit-refusals';
import { admitNote } from '@/lib/audit/bounded-notes';
import { recordAudit } from '@/lib/audit/record';
import type { Failure } from '@/lib/errors';
import { isOpenHere } from '@/lib/people/demonstration-only';
import { signInSchema } from '@/schemas/sign-in';
import { type Actor, VISITOR } from './actor';
import { admitSignIn, type SignInPlace, signInPlace } from './admit-sign-in';
import { invalidInput } from './input-errors';
import { isPassword } from './password';
import { endSession, type SessionCookie, startSession } from './session';
import { KNOWN_MS } from './sign-in-limits';

export type SignInOutcome =
  | { ok: true; cookie: SessionCookie }
  | { ok: false; failure: Failure; retryAfterSeconds?: number };

export interface SignInCall {
  /** what the form sent */
  input: unknown;
  /** network address of the caller */
  peer: string;
  /** session id that the browser held before, which ends here */
  heldSessionId: string | null;
}

/**
 * Signs a person in. An unknown address, a wrong password and a disabled account get the same answer after the same
 * work.
 */
export async function signIn({ input, peer, heldSessionId }: SignInCall): Promise<SignInOutcome> {
  const parsed = signInSchema.safeParse(input);
  if (!parsed.success) return { ok: false, failure: invalidInput(parsed.error) };
  const { email, password } = parsed.data;
  const place = await signInPlace(email, peer);
  const { waitMs, holdMs } = await admitSignIn(place);
  if (waitMs > 0) {
    await noteLimited(VISITOR, 'sign-in');
    return askToWait(Math.ceil(waitMs / 1000));
  }
  if (holdMs > 0) await sleep(holdMs);
  const person = isOpenHere(email) ? await selectPersonByEmail(email) : undefined;
  const matches = await isPassword(password, person?.passwordHash);
  if (!person || !matches || person.disabledAt !== null) return noteFailure(person, place);
  return admit(person, place, heldSessionId);
}

async function admit(
  { id, name, email, role }: PersonRow,
  { accountKey, addressKey }: SignInPlace,
  heldSessionId: string | null,
): Promise<SignInOutcome> {
  const actor: Actor = { kind: 'person', id, name, email, role, memberships: [] };
  return write('acknowledged', async (tx) => {
    await deleteSignInAttempts(tx, accountKey, addressKey);
    const at = Date.now();
    await upsertSignInPlace(tx, { accountKey, addressKey, at }, at - KNOWN_MS);
    if (heldSessionId !== null) await endSession(tx, heldSessionId);
    const cookie = await startSession(tx, id);
    await recordAudit(tx, { actor, action: 'signed-in', subject: `person:${id}` });
    return { ok: true, cookie };
  });
}

async function noteFailure(person: PersonRow | undefined, place: SignInPlace): Promise<SignInOutcome> {
  // Never the address that was typed: people type passwords there.
  const subject = person ? `person:${person.id}` : `unknown-account:${place.accountKey}`;
  const more = admitNote('sign-in-failed');
  if (more !== null) {
    const entry = { actor: VISITOR, action: 'sign-in-failed', subject, detail: more };
    await write('acknowledged', (tx) => recordAudit(tx, entry));
  }
  const detail = 'There is no account with this e-mail address and this password.';
  return { ok: false, failure: { code: 'unauthenticated', detail } };
}

function askToWait(seconds: number): SignInOutcome {
  const wait =
    seconds === 1 ? 'a second' : seconds < 120 ? `${seconds} seconds` : `${Math.ceil(seconds / 60)} minutes`;
  const detail = `Too many failed sign-ins from here. Try again in ${wait}.`;
  return { ok: false, failure: { code: 'too-many-calls', detail }, retryAfterSeconds: seconds };
}
