/**
 * The assessment as the API sends it: the same shape as `lib/engine/assessment.ts`, which a test holds it to.
 * Energies in kT, concentrations in the ligand's own unit.
 */
import { z } from 'zod';
import { CONCENTRATION_UNITS, ENERGY_UNITS } from '@/lib/engine/units';

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
      'linear-uncertainty',
      'shape-not-tried',
      'no-degrees-of-freedom',
      'normalisation',
      'protein-concentration-not-stated',
      'uncertainty-too-wide',
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

const SHAPES = ['offset', 'slope', 'ceiling', 'floor', 'stock', 'offset+slope', 'floor+ceiling'] as const;

const shapeSchema = z
  .strictObject({
    best: z.enum([...SHAPES, 'none']).meta({
      description:
        'The alternative that is named: lowest AIC, at least 8 below that of the stated parameters',
    }),
    allowedByStatements: z.number().meta({
      description: 'The offset that the stated uncertainties alone would allow, kT',
    }),
    alternatives: z.array(
      z.strictObject({
        kind: z.enum(SHAPES),
        estimates: z.array(
          z.strictObject({
            name: z.enum(['offset', 'slope', 'ceiling', 'floor', 'stock']),
            value: z.number().meta({ description: 'Offset in kT, the others plain numbers' }),
            u: z.number(),
          }),
        ),
        deltaAIC: z.number().meta({
          description: 'AIC less that of the stated parameters: negative favours the alternative',
        }),
      }),
    ),
  })
  .meta({ id: 'Shape', description: 'One-step alternatives to the stated parameters, lowest AIC first' });

const improvement = {
  rmsZ: z.number(),
  deltaSumZ2: z.number().meta({ description: 'Σz² with the misreading less Σz² as stated' }),
};

const conventionSchema = z
  .discriminatedUnion('misreading', [
    z.strictObject({ misreading: z.literal('gap-orientation'), ...improvement }),
    z.strictObject({ misreading: z.literal('gap-scope'), ...improvement }),
    z.strictObject({ misreading: z.literal('swapped-constants'), ...improvement }),
    z.strictObject({ misreading: z.literal('inverted-activity'), ...improvement }),
    z.strictObject({
      misreading: z.literal('concentration-scale'),
      factor: z.number().meta({ description: 'What the stated concentrations must be multiplied by' }),
      ...improvement,
    }),
    z.strictObject({
      misreading: z.literal('gap-unit'),
      unit: z.enum(ENERGY_UNITS).meta({ description: 'What the number of the gap is in' }),
      ...improvement,
    }),
    z.strictObject({ misreading: z.literal('association-constants'), ...improvement }),
    z.strictObject({
      misreading: z.literal('log-ratio'),
      base: z.enum(['10', 'e']).meta({ description: 'The base of the logarithm that the ratio’s number is' }),
      ...improvement,
    }),
  ])
  .meta({ id: 'ConventionFinding', description: 'A misreading of the statements that explains the points' });

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
    shape: shapeSchema,
    conventions: z.array(conventionSchema),
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
    conventions: z.array(conventionSchema),
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
