'use server';

import { cookies } from 'next/headers';
import { redirect } from 'next/navigation';
import { actorOfPage } from '@/lib/auth/current-actor';
import { sessionCookieName } from '@/lib/auth/session';
import { signOut } from '@/lib/auth/sign-out';

/** Ends the session here and in the database, and goes to the first page. */
export async function signOutAction(): Promise<void> {
  const jar = await cookies();
  const held = jar.get(sessionCookieName())?.value ?? null;
  const { name, value, attributes } = await signOut(await actorOfPage(), held);
  jar.set(name, value, attributes);
  redirect('/');
}
