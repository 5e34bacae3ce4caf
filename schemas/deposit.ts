/** A deposit as the API sends it, and the parameters of its calls. */
import { z } from 'zod';
import { DECISION_KINDS, DEPOSIT_STATES } from './deposit-states';
import { documentErrorSchema } from './problem';
import { isTimeZone } from './time-zone';

export const depositStateSchema = z.enum(DEPOSIT_STATES).meta({ id: 'DepositState' });

const instant = z.iso.datetime().meta({ description: 'UTC, ISO 8601' });

export const publicationDaySchema = z
  .strictObject({
    day: z.iso.date('must be a day like 2027-03-01').meta({ description: 'Published at its first midnight' }),
    timeZone: z
      .string()
      .refine(isTimeZone, 'must be the name of a time zone, such as Europe/Oslo')
      .meta({ description: 'Whose midnight: an IANA time zone', example: 'Europe/Oslo' }),
  })
  .meta({ id: 'PublicationDay' });

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
  updatedBy: z
    .string()
    .nullable()
    .meta({ description: 'Person or token of the laboratory that made the last change; null: a curator' }),
  publication: publicationDaySchema
    .nullable()
    .meta({ description: 'Of an accepted deposit: the day of its publication; null: at once' }),
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
    kind: z.enum(DECISION_KINDS),
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
    next: z.string().nullable().meta({ description: 'Address of the next page; null on the last one' }),
  })
  .meta({ id: 'DepositList' });

/** The parameters of the list, each at most once. */
export const depositQuerySchema = z.strictObject({
  state: z
    .enum(DEPOSIT_STATES, { error: `must be one of ${DEPOSIT_STATES.join(', ')}` })
    .optional()
    .meta({ description: 'Deposits in that state' }),
  cursor: z
    .string()
    .regex(/^[\w-]{1,200}$/, 'must be the cursor of an earlier answer')
    .optional()
    .meta({ description: 'Where the page begins; part of `next` of the page before' }),
  limit: z
    .string()
    .regex(/^([1-9]\d?|100)$/, 'must be a whole number from 1 to 100')
    .transform(Number)
    .optional()
    .meta({ description: 'How many a page, 1 to 100; 50 where left out' }),
});

type DepositQuery = z.output<typeof depositQuerySchema>;

/** The parameters of an address; where one is wrong, a sentence that names it and says what would be right. */
export function readDepositQuery(
  parameters: URLSearchParams,
): { ok: true; query: DepositQuery } | { ok: false; detail: string } {
  const names = [...parameters.keys()];
  const repeated = names.find((name, i) => names.indexOf(name) !== i);
  if (repeated !== undefined)
    return { ok: false, detail: `The parameter ${repeated.slice(0, 50)} can be given only once.` };
  const parsed = depositQuerySchema.safeParse(Object.fromEntries(parameters));
  if (parsed.success) return { ok: true, query: parsed.data };
  const [issue] = parsed.error.issues;
  if (issue?.code === 'unrecognized_keys')
    return { ok: false, detail: `There is no parameter “${issue.keys[0]?.slice(0, 50)}” here.` };
  return { ok: false, detail: `The parameter ${String(issue?.path[0])} ${issue?.message}.` };
}

export type PublicationDay = z.infer<typeof publicationDaySchema>;
export type DepositHeadAnswer = z.infer<typeof depositHeadSchema>;
export type SavedDepositAnswer = z.infer<typeof savedDepositSchema>;
export type DepositAnswer = z.infer<typeof depositSchema>;
