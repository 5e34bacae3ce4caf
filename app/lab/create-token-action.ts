'use server';

import { revalidatePath } from 'next/cache';
import { type CreateTokenState, FIRST_TOKEN_STATE } from '@/components/lab/token-state';
import { actorOfPage } from '@/lib/auth/current-actor';
import { problemOf } from '@/lib/errors';
import { createToken } from '@/lib/labs/create-token';

/** Makes a token of a laboratory, or says what to correct. */
export async function createTokenAction(
  { answer }: CreateTokenState,
  form: FormData,
): Promise<CreateTokenState> {
  const typed = {
    name: String(form.get('name') ?? ''),
    scopes: form.getAll('scopes').map(String),
    days: String(form.get('days') ?? ''),
  };
  const outcome = await createToken(await actorOfPage(), String(form.get('labId') ?? ''), typed);
  if (outcome.ok) {
    revalidatePath('/lab');
    return { ...FIRST_TOKEN_STATE, answer: answer + 1, token: outcome.token };
  }
  const { detail, errors = [] } = problemOf(outcome.failure);
  const at = (pointer: string) => errors.find((error) => error.pointer.startsWith(pointer))?.detail;
  return {
    answer: answer + 1,
    token: null,
    message: errors.length > 0 ? null : detail,
    errors: { name: at('/name'), scopes: at('/scopes'), days: at('/days') },
    typed,
  };
}
