/** A curator's decision as it is sent and answered. */
import { z } from 'zod';

export const decisionSchema = z
  .strictObject({
    kind: z.enum(['accepted', 'changes-requested'], {
      error: 'must be accepted or changes-requested',
    }),
    letter: z
      .string({ error: 'must be a text' })
      .max(20_000, 'a letter may have at most 20,000 characters')
      .default('')
      .meta({ description: 'What the depositor is told; needed where changes are asked for' }),
    revision: z
      .int({ error: 'must be the number of a revision' })
      .positive('must be the number of a revision')
      .optional()
      .meta({ description: 'The revision that the decision is about; refused where a newer one came in' }),
  })
  .meta({ id: 'Decision' });
