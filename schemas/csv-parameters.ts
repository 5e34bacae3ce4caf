import { z } from 'zod';
import {
  CONCENTRATION_UNITS,
  ENERGY_ORIENTATIONS,
  ENERGY_UNITS,
  MOLAR_UNITS,
  RATIO_ORIENTATIONS,
  TEMPERATURE_UNITS,
} from '@/lib/engine/units';

/**
 * The form beside a table of points: what a dataset document needs and the table does not hold. One site class.
 * Numbers' ranges are judged with the assembled document, by the one check of `lib/documents`.
 */

const number = z.number({ error: 'must be a number, such as 2.4' });
const positive = number.gt(0, 'must be greater than 0');
const uncertainty = number.min(0, 'must be 0 or more').optional();

const temperature = z.strictObject({ value: number, unit: z.enum(TEMPERATURE_UNITS), u: uncertainty });

const energy = z.strictObject({
  value: number,
  unit: z.enum(ENERGY_UNITS),
  orientation: z.enum(ENERGY_ORIENTATIONS, { error: `must be ${ENERGY_ORIENTATIONS.join(' or ')}` }),
  u: uncertainty,
});

const ratio = z.strictObject({
  value: positive,
  unit: z.literal('ratio'),
  orientation: z.enum(RATIO_ORIENTATIONS, { error: `must be ${RATIO_ORIENTATIONS.join(' or ')}` }),
  u: uncertainty,
});

const constant = z.strictObject({ value: positive, unit: z.enum(CONCENTRATION_UNITS), u: uncertainty });

const binding = z
  .strictObject({ inactive: constant.nullable(), active: constant.nullable() })
  .refine(({ inactive, active }) => inactive !== null || active !== null, {
    error: 'state at least one of the two constants; leave out a ligand that binds neither state',
  });

const seriesParameters = z.strictObject({
  origin: z.enum(['independent', 'fitted-elsewhere', 'fitted-here']),
  /** with origin `fitted-here` only */
  fittedCount: z.int('must be a whole number').min(1, 'must be 1 or more').optional(),
  gap: z.discriminatedUnion('unit', [energy, ratio]),
  /** whether the gap is meant for the whole complex or for each site */
  gapScope: z.enum(['complex', 'site']).default('complex'),
  sites: z.strictObject({ value: positive.max(1000, 'must be at most 1000'), u: uncertainty }),
  /** by ligand id */
  binding: z.record(z.string(), binding),
  /** by modulator id; the slope is per unit of the modulator */
  modulation: z.record(z.string(), z.strictObject({ slope: energy, reference: number })).default({}),
});

const oneSeries = z.strictObject({
  variant: z.string().max(200).optional(),
  temperature: temperature.optional(),
  /** where they differ from the parameters for all series */
  parameters: seriesParameters.optional(),
});

const ligand = z.strictObject({
  concentration: z.enum(['free', 'total']),
  relativeU: uncertainty,
  stockRelativeU: uncertainty,
});

export const csvParametersSchema = z.strictObject({
  title: z.string().trim().min(1, 'a title must stand here').max(500),
  abstract: z.string().max(20_000).default(''),
  licence: z.enum(['CC0-1.0', 'CC-BY-4.0']),
  system: z
    .string()
    .max(100)
    .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'must be lower-case letters and digits joined by hyphens'),
  assay: z.strictObject({
    readout: z.string().max(1000),
    conditions: z.string().max(5000),
    proteinConcentration: z.strictObject({ value: positive, unit: z.enum(MOLAR_UNITS) }).optional(),
  }),
  temperature,
  normalisation: z.strictObject({
    method: z.enum(['absolute', 'two-reference', 'series-min-max']),
    note: z.string().max(2000).optional(),
  }),
  /** by ligand id; one left out is taken as free and exact */
  ligands: z.record(z.string(), ligand).default({}),
  /** for every series that has none of its own */
  parameters: seriesParameters,
  /** by series id */
  series: z.record(z.string(), oneSeries).default({}),
});

/** The form as its fields hold it. */
export type CsvParametersInput = z.input<typeof csvParametersSchema>;
/** The form after checking, defaults filled in. */
export type CsvParameters = z.output<typeof csvParametersSchema>;
export type CsvSeriesParameters = CsvParameters['parameters'];
