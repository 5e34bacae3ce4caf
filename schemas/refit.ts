/** What a refit is asked for and answered with: the same shapes as `lib/engine/refit.ts`, which a test holds them to. */
import { z } from 'zod';
import { CONCENTRATION_UNITS } from '@/lib/engine/units';

const parameterSchema = z.enum(['gap', 'gapPerSite', 'sites', 'inactive', 'active', 'slope'], {
  error: 'must be gap, gapPerSite, sites, inactive, active or slope',
});

const name = (what: string) => z.string({ error: `must be the id of ${what}` }).optional();

const freeParameterSchema = z.strictObject({
  parameter: parameterSchema,
  siteClass: name('a site class').meta({ description: 'Of gapPerSite, sites, inactive and active' }),
  ligand: name('a ligand').meta({ description: 'Of inactive and active' }),
  modulator: name('a modulator').meta({ description: 'Of slope' }),
  share: z
    .enum(['series', 'dataset'], { error: 'must be series or dataset' })
    .meta({ description: 'One value per series, or one for the whole dataset' }),
});

/** Far more than can be fitted; what is free comes to at most 40 values. */
const MOST_ENTRIES = 200;

/** The list of parameters to be fitted; the document beside it is judged as every document is. */
export const freeListSchema = z
  .array(freeParameterSchema, { error: 'must be a list of parameters to be fitted' })
  .max(MOST_ENTRIES, `must have at most ${MOST_ENTRIES} entries`);

const estimateSchema = z
  .strictObject({
    series: z.string().nullable().meta({ description: 'null where one value stands for the dataset' }),
    parameter: parameterSchema,
    siteClass: z.string().nullable(),
    ligand: z.string().nullable(),
    modulator: z.string().nullable(),
    unit: z
      .enum([...CONCENTRATION_UNITS, 'kT'])
      .nullable()
      .meta({
        description:
          'Constants: as stated (a shared one: as in the first series). Gaps kT, inactive − active; slopes kT per unit of the modulator. Sites: null',
      }),
    value: z.number(),
    u: z.number().nullable().meta({
      description:
        'Standard error from the inverse of the normal matrix, not rescaled; null where the points do not depend on the value, or it ended at a bound of its range',
    }),
    stated: z.number().meta({
      description:
        'Where the fit started: the value as stated; of different ones the mean, of constants and sites the geometric mean',
    }),
    determined: z.boolean().meta({ description: 'Whether these data determine the value' }),
  })
  .meta({ id: 'RefitEstimate' });

export const refitAnswerSchema = z
  .strictObject({
    converged: z.boolean().meta({
      description:
        'false also where the points respond to none of the values, so that nothing says where to go',
    }),
    iterations: z.int().min(0),
    chiSquared: z.number().min(0),
    degreesOfFreedom: z.int().min(0),
    reducedChiSquared: z
      .number()
      .nullable()
      .meta({ description: 'null where no degrees of freedom are left' }),
    estimates: z.array(estimateSchema),
    correlations: z.array(z.array(z.number().min(-1).max(1).nullable())).meta({
      description:
        'Between the estimates in their order (of ln K, ln n, gaps and slopes); null where the data do not depend on one of them',
    }),
  })
  .meta({ id: 'Refit' });

export const refitProgressSchema = z
  .strictObject({
    state: z.literal('running'),
    progress: z.number().min(0).max(1).meta({ description: '0 to 1' }),
  })
  .meta({ id: 'RefitProgress' });

export type RefitProgressAnswer = z.infer<typeof refitProgressSchema>;
