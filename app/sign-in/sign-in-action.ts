'use server';

import type { Route } from 'next';
import { cookies, headers } from 'next/headers';
import { redirect } from 'next/navigation';
import type { SignInState } from '@/components/people/sign-in-state';
import { safeNext } from '@/lib/auth/safe-next';
import { sessionCookieName } from '@/lib/auth/session';
import { signIn } from '@/lib/auth/sign-in';
import { problemOf } from '@/lib/errors';
import { PEER_HEADER } from '@/lib/serving/peer';

/** Signs in and goes on to where the person wanted to be, or says what to correct. */
export async function signInAction(_: SignInState, form: FormData): Promise<SignInState> {
  const [jar, sent] = await Promise.all([cookies(), headers()]);
  const outcome = await signIn({
    input: { email: form.get('email'), password: form.get('password') },
    peer: sent.get(PEER_HEADER) ?? '',
    heldSessionId: jar.get(sessionCookieName())?.value ?? null,
  });
  if (outcome.ok) {
    const { name, value, attributes } = outcome.cookie;
    jar.set(name, value, attributes);
    const next = safeNext(form.get('next'));
    // The sign-in page knows by then who it is, and where their work waits.
    redirect((next === '/' ? '/sign-in' : next) as Route);
  }
  const { detail, errors = [] } = problemOf(outcome.failure);
  const at = (pointer: string) => errors.find((error) => error.pointer === pointer)?.detail;
  return {
    email: String(form.get('email') ?? ''),
    message: errors.length > 0 ? null : detail,
    errors: { email: at('/email'), password: at('/password') },
  };
}
