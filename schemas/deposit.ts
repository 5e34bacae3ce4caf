/** A deposit as the API sends it, and the parameters of its calls. */
import { z } from 'zod';
import { DEPOSIT_STATES } from './deposit-states';
import { documentErrorSchema } from './problem';

export const depositStateSchema = z.enum(DEPOSIT_STATES).meta({ id: 'DepositState' });

const instant = z.iso.datetime().meta({ description: 'UTC, ISO 8601' });

const headShape = {
  id: z.string(),
  state: depositStateSchema,
  version: z.int().meta({ description: 'Counts every change; the ETag is this number in quotes' }),
  title: z.string().meta({ description: 'Of the document; empty where it has none' }),
  system: z.string().meta({ description: 'Slug that the document names; empty where it names none' }),
  laboratory: z.strictObject({ slug: z.string(), name: z.string() }),
  accession: z.string().nullable().meta({ description: 'Once published', example: 'CK-000123' }),
  errorCount: z.int(),
  createdAt: instant,
  updatedAt: instant,
  links: z.strictObject({
    self: z.string(),
    submission: z.string(),
    assessment: z.string(),
    files: z.string(),
    dataset: z.string().optional(),
  }),
};

export const depositHeadSchema = z.strictObject(headShape).meta({ id: 'DepositHead' });

export const savedDepositSchema = z
  .strictObject({
    ...headShape,
    errors: z.array(documentErrorSchema).meta({ description: 'What stands in the way of submitting it' }),
  })
  .meta({ id: 'SavedDeposit' });

const revisionSchema = z
  .strictObject({
    number: z.int(),
    sha256: z.string().meta({ description: 'Of the document, hex' }),
    engine: z.string(),
    policy: z.int(),
    submittedAt: instant,
    publishedAt: instant.nullable(),
  })
  .meta({ id: 'Revision' });

const pastDecisionSchema = z
  .strictObject({
    revision: z.int(),
    kind: z.enum(['accepted', 'changes-requested']),
    letter: z.string(),
    decidedAt: instant,
  })
  .meta({ id: 'PastDecision' });

export const depositSchema = z
  .strictObject({
    ...headShape,
    errors: z.array(documentErrorSchema),
    revisions: z.array(revisionSchema).meta({ description: 'Newest first' }),
    decisions: z.array(pastDecisionSchema).meta({ description: 'Newest first' }),
    document: z
      .looseObject({})
      .meta({ description: 'The document byte for byte as it was sent, valid or not' }),
  })
  .meta({ id: 'Deposit' });

export const submittedDepositSchema = z
  .strictObject({
    ...headShape,
    revision: z.int().meta({ description: 'Number of the revision that was made' }),
  })
  .meta({ id: 'SubmittedDeposit' });

export const depositListSchema = z
  .strictObject({
    deposits: z.array(depositHeadSchema),
    next: z.string().nullable().meta({ description: 'Where the next page is; null on the last' }),
  })
  .meta({ id: 'DepositList' });

/** The parameters of the list. */
export const depositQuerySchema = z.object({
  state: depositStateSchema.optional(),
  cursor: z.string().max(200).optional(),
  limit: z.coerce.number().int().min(1).max(100).optional(),
});

export type DepositHeadAnswer = z.infer<typeof depositHeadSchema>;
export type SavedDepositAnswer = z.infer<typeof savedDepositSchema>;
export type DepositAnswer = z.infer<typeof depositSchema>;
