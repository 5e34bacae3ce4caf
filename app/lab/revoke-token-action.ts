'use server';

import { revalidatePath } from 'next/cache';
import { actorOfPage } from '@/lib/auth/current-actor';
import { revokeToken } from '@/lib/labs/revoke-token';

/** Revokes a token. Whatever the outcome, the page then shows how things stand. */
export async function revokeTokenAction(form: FormData): Promise<void> {
  await revokeToken(await actorOfPage(), String(form.get('labId') ?? ''), String(form.get('tokenId') ?? ''));
  revalidatePath('/lab');
}
