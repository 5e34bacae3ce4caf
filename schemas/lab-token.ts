/** What the form for a new laboratory token sends. */
import { z } from 'zod';
import { isPlainText, UNPLAIN } from './plain-text';

/** How long a token may live at most, days. */
export const MOST_TOKEN_DAYS = 365;

export const labTokenSchema = z.object({
  name: z
    .string()
    .trim()
    .min(1, 'Enter a name of 1 to 80 characters.')
    .max(80, 'Enter a name of 1 to 80 characters.')
    .refine(isPlainText, `The name ${UNPLAIN}.`),
  scopes: z
    .array(
      z.enum(['read-drafts', 'write-drafts', 'submit']),
      'Choose from read-drafts, write-drafts and submit.',
    )
    .min(1, 'Choose at least one thing that it may do.')
    .transform((scopes) => [...new Set(scopes)]),
  days: z.coerce
    .number('Say for how many days, from 1 to 365.')
    .int('Say for how many days, from 1 to 365.')
    .min(1, 'It must live for at least one day.')
    .max(MOST_TOKEN_DAYS, 'It may live for a year at most.'),
});
