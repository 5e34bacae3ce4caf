/** What a form or a small body has wrong, in the shape of every other error: a JSON Pointer and a sentence. */
import type { z } from 'zod';
import type { Failure } from '@/lib/errors';

/** The failure that lists everything a schema found. */
export function invalidInput(error: z.ZodError): Failure {
  const errors = error.issues.map(({ path, message }) => ({
    pointer: path.map((member) => `/${String(member).replaceAll('~', '~0').replaceAll('/', '~1')}`).join(''),
    detail: message,
  }));
  return { code: 'invalid-input', members: { errors } };
}
