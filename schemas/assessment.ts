/**
 * The assessment as the API sends it: the same shape as `lib/engine/assessment.ts`, which a test holds it to.
 * Energies in kT, concentrations in the ligand's own unit.
 */
import { z } from 'zod';
import { CONCENTRATION_UNITS } from '@/lib/engine/units';

const estimateSchema = z.strictObject({ value: z.number(), u: z.number() }).meta({
  id: 'Estimate',
  description: 'A value with its standard uncertainty (k = 1), both in the same unit',
});

const noteSchema = z
  .strictObject({
    code: z.enum([
      'assumed-uncertainty',
      'circular',
      'correlations-not-stated',
      'depletion',
      'derived-not-defined',
      'no-degrees-of-freedom',
    ]),
    detail: z.string(),
    points: z.array(z.int()).optional(),
  })
  .meta({ id: 'Note' });

const assessedPointSchema = z
  .strictObject({
    index: z.int(),
    energy: z.number().meta({ description: 'Free-energy coordinate f, kT' }),
    energyU: z.number(),
    activity: z.number(),
    activityU: z.number(),
    expected: z.number().meta({ description: 'Activity that the statements predict' }),
    expectedU: z.number(),
    residual: z.number(),
    residualU: z.number(),
    z: z.number(),
    pValue: z.number().meta({ description: 'Two-sided' }),
    q: z.number().meta({ description: 'Benjamini–Hochberg adjustment of pValue within the dataset' }),
    flag: z.enum(['on-curve', 'warning', 'off-curve']),
    uncertainty: z.enum(['stated', 'replicates', 'assumed']),
  })
  .meta({ id: 'AssessedPoint' });

const derivedSchema = z
  .strictObject({
    ligand: z.string(),
    unit: z.enum(CONCENTRATION_UNITS),
    leakiness: estimateSchema,
    saturation: estimateSchema,
    dynamicRange: estimateSchema,
    halfActivity: estimateSchema.nullable(),
    ec50: estimateSchema.nullable(),
    effectiveHill: estimateSchema.nullable(),
  })
  .meta({ id: 'DerivedQuantities' });

const qStatistic = {
  chiSquared: z.number(),
  degreesOfFreedom: z.number(),
  pValue: z.number().nullable(),
  rmsZ: z.number(),
};

export const seriesAssessmentSchema = z
  .strictObject({
    ...qStatistic,
    id: z.string(),
    origin: z.enum(['independent', 'fitted-elsewhere', 'fitted-here']),
    temperatureK: z.number(),
    gapKT: z.number(),
    sites: z.number(),
    derived: z.array(derivedSchema),
    notes: z.array(noteSchema),
    points: z.array(assessedPointSchema),
  })
  .meta({ id: 'SeriesAssessment' });

const summarySchema = z
  .strictObject({
    ...qStatistic,
    points: z.int(),
    onCurve: z.int(),
    warning: z.int(),
    offCurve: z.int(),
    expectedByChance: z.strictObject({ warning: z.number(), offCurve: z.number() }),
  })
  .meta({ id: 'AssessmentSummary' });

export const assessmentSchema = z
  .strictObject({
    engine: z.string(),
    policy: z.int(),
    summary: summarySchema,
    series: z.array(seriesAssessmentSchema),
  })
  .meta({ id: 'Assessment' });
