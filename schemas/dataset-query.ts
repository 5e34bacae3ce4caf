/** What browsing asks for: the filters of the address, the same on pages and in the API, and the page of a list. */
import { z } from 'zod';

export const POINT_FLAGS = ['on-curve', 'warning', 'off-curve'] as const;

/** Datasets a page where nothing is said, and at most. */
export const USUAL_LIMIT = 50;
export const MOST_LIMIT = 100;
const MOST_CHOICES = 20;
const MOST_WORDS = 10;
/** Beyond every energy that is drawn, kT. */
const FURTHEST_KT = 1e6;

const names = z
  .array(
    z
      .string()
      .trim()
      .min(1, 'must not be empty; leave it out for all')
      .max(200, 'has at most 200 characters'),
  )
  .max(MOST_CHOICES, `can be given at most ${MOST_CHOICES} times`)
  .default([]);

const once = z.array(z.string()).max(1, 'can be given only once');

const energy = once
  .transform((values) => values[0])
  .pipe(
    z
      .string()
      .regex(
        /^\s*[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?\s*$/i,
        'must be an energy in kT written as a number, for example -2.5',
      )
      .transform(Number)
      .refine((value) => Math.abs(value) <= FURTHEST_KT, 'must lie between -1000000 and 1000000 kT'),
  )
  .nullable()
  .default(null);

const words = once
  .transform((values) => values[0] ?? '')
  .pipe(z.string().max(200, 'has at most 200 characters'))
  .transform((value) => value.split(/\s+/).filter((word) => word !== ''))
  .refine((list) => list.length <= MOST_WORDS, `takes at most ${MOST_WORDS} words`)
  .default([]);

const filterShape = {
  system: names.meta({ description: 'Slug of a system; repeat it for several' }),
  lab: names.meta({ description: 'Slug of a laboratory; repeat it for several' }),
  ligand: names.meta({ description: 'Name of a ligand, in any case; repeat it for several' }),
  variant: names.meta({ description: 'Name of a variant, in any case; datasets that hold a series of it' }),
  flag: z
    .array(z.enum(POINT_FLAGS, { error: `must be one of ${POINT_FLAGS.join(', ')}` }))
    .max(POINT_FLAGS.length, 'can be given at most three times')
    .default([])
    .meta({ description: 'Datasets with points of that flag, in the window where there is one' }),
  from: energy.meta({
    description: 'Lower edge of a window of energies, kT; whole cells of 0.1 kT are taken',
  }),
  to: energy.meta({ description: 'Upper edge of a window of energies, kT' }),
  q: words.meta({
    description: 'Words, in any case, each in the title, accession, system, laboratory or a variant',
  }),
};

const limit = once
  .transform((values) => values[0] ?? '')
  .pipe(z.string().regex(/^[1-9]\d{0,2}$/, `must be a whole number from 1 to ${MOST_LIMIT}`))
  .transform(Number)
  .refine((value) => value <= MOST_LIMIT, `must be a whole number from 1 to ${MOST_LIMIT}`)
  .default(USUAL_LIMIT)
  .meta({ description: `How many a page, 1 to ${MOST_LIMIT}; ${USUAL_LIMIT} where left out` });

const cursor = once
  .transform((values) => values[0] ?? '')
  .pipe(z.string().regex(/^[\w-]{1,1000}$/, 'must be the cursor of an earlier answer'))
  .nullable()
  .default(null)
  .meta({ description: 'Where the page begins: what `next` of the page before says' });

function windowIsOpen({ from, to }: { from: number | null; to: number | null }): boolean {
  return from === null || to === null || from < to;
}
const windowError = { path: ['to'], error: 'must be greater than from' };

export const datasetFiltersSchema = z.strictObject(filterShape).refine(windowIsOpen, windowError);
export const datasetQuerySchema = z
  .strictObject({ ...filterShape, limit, cursor })
  .refine(windowIsOpen, windowError);
export const pageQuerySchema = z.strictObject({ limit, cursor });

/** Lists mean *any of these*; empty ones, and null, mean *all*. */
export type DatasetFilters = z.output<typeof datasetFiltersSchema>;
export type DatasetQuery = z.output<typeof datasetQuerySchema>;
export type PageQuery = z.output<typeof pageQuerySchema>;

export type QueryResult<T> = { ok: true; query: T } | { ok: false; detail: string };

/** The filters of an address; where one is wrong, a sentence that names it and says what would be right. */
export function readDatasetFilters(parameters: URLSearchParams): QueryResult<DatasetFilters> {
  return readQuery(datasetFiltersSchema, parameters);
}

/** The filters and the page of an address. */
export function readDatasetQuery(parameters: URLSearchParams): QueryResult<DatasetQuery> {
  return readQuery(datasetQuerySchema, parameters);
}

/** The page of an address of a list without filters. */
export function readPageQuery(parameters: URLSearchParams): QueryResult<PageQuery> {
  return readQuery(pageQuerySchema, parameters);
}

function readQuery<T>(schema: z.ZodType<T>, parameters: URLSearchParams): QueryResult<T> {
  const given: Record<string, string[]> = {};
  for (const name of new Set(parameters.keys())) given[name] = parameters.getAll(name);
  const parsed = schema.safeParse(given);
  if (parsed.success) return { ok: true, query: parsed.data };
  const [issue] = parsed.error.issues;
  if (issue?.code === 'unrecognized_keys')
    return { ok: false, detail: `There is no parameter “${issue.keys[0]?.slice(0, 50)}” here.` };
  return { ok: false, detail: `The parameter ${String(issue?.path[0])} ${issue?.message}.` };
}
