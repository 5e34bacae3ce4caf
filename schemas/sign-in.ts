/** What the sign-in form sends. */
import { z } from 'zod';

/** An e-mail address as it is kept: trimmed, lower case. */
export const emailSchema = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'An e-mail address has at most 254 characters.')
  .regex(/^[^\s@]+@[^\s@]+$/, 'An e-mail address looks like name@institute.example.');

const MOST_CHARACTERS = 128;

/** A password to be. Nothing but its length is asked of it, and nothing is trimmed. */
export const newPasswordSchema = z
  .string()
  .min(8, 'A password has at least 8 characters.')
  .max(MOST_CHARACTERS, 'A password has at most 128 characters.');

/** The password is taken as it is. Its least length is no matter of signing in: a short one is just wrong. */
export const signInSchema = z.object({
  email: emailSchema,
  password: z
    .string()
    .min(1, 'Enter your password.')
    .max(MOST_CHARACTERS, 'A password has at most 128 characters.'),
});
