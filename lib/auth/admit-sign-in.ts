/**
 * Lets a sign-in be tried, or says how long to wait. It is noted as an attempt before the password is looked at, in
 * one write, so that many at once count as many.
 */
import { createHmac } from 'node:crypto';
import { write } from '@/db/client';
import { installKey } from '@/db/queries/computation-limits';
import {
  insertSignInAttempt,
  purgeSignInAttempts,
  selectIsKnownPlace,
  selectSignInAttempts,
} from '@/db/queries/sign-in-attempts';
import { addressKey } from '@/lib/assessments/address-key';
import { newId } from './hash-token';
import { KNOWN_MS, type Slowing, slowingOf, WINDOW_MS } from './sign-in-limits';

export interface SignInPlace {
  /** keyed hash of the e-mail address that was typed */
  accountKey: string;
  /** keyed hash of the network address */
  addressKey: string;
}

/** Where a sign-in is counted; the database holds neither address as it is. */
export async function signInPlace(email: string, peer: string): Promise<SignInPlace> {
  const key = await installKey('account');
  const accountKey = createHmac('sha256', key).update(email).digest('base64url').slice(0, 22);
  return { accountKey, addressKey: await addressKey(peer) };
}

/** What the attempt meets; where it need not wait, it is noted. */
export async function admitSignIn(place: SignInPlace, nowMs = Date.now()): Promise<Slowing> {
  return write('counter', async (tx) => {
    await purgeSignInAttempts(tx, nowMs - WINDOW_MS);
    const attempt = { ...place, at: nowMs };
    const { accountKey, addressKey } = place;
    const isKnown = await selectIsKnownPlace(tx, accountKey, addressKey, nowMs - KNOWN_MS);
    const slowing = slowingOf(await selectSignInAttempts(tx, accountKey, addressKey), attempt, isKnown);
    if (slowing.waitMs === 0) await insertSignInAttempt(tx, { id: newId(), ...attempt });
    return slowing;
  });
}
