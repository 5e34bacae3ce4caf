/** A curator's decision as it is sent and answered. */
import { z } from 'zod';
import { publicationDaySchema } from './deposit';
import { DECISION_KINDS } from './deposit-states';
import { isPlainText, UNPLAIN } from './plain-text';

export const decisionSchema = z
  .strictObject({
    kind: z.enum(DECISION_KINDS, { error: 'must be accepted, changes-requested or declined' }),
    letter: z
      .string({ error: 'must be a text' })
      .max(20_000, 'a letter may have at most 20,000 characters')
      .refine(isPlainText, UNPLAIN)
      .default('')
      .meta({ description: 'What the depositor is told; only an acceptance may be without one' }),
    revision: z
      .int({ error: 'must be the number of a revision' })
      .positive('must be the number of a revision')
      .optional()
      .meta({ description: 'The revision that the decision is about; refused where a newer one came in' }),
    publication: publicationDaySchema
      .optional()
      .meta({ description: 'With an acceptance: not at once but on this day, which must be to come' }),
  })
  .refine(({ kind, publication }) => publication === undefined || kind === 'accepted', {
    path: ['publication'],
    error: 'only an acceptance has a day of publication',
  })
  .meta({ id: 'Decision' });
