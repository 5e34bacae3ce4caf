/** What the API says of published datasets. Energies in kT; times are ISO 8601 in UTC. */
import { z } from 'zod';
import { assessmentSchema, seriesAssessmentSchema } from './assessment';
import { POINT_FLAGS } from './dataset-query';
import { problemSchema } from './problem';

const time = z.iso.datetime();
export const namedSchema = z.strictObject({ slug: z.string(), name: z.string() }).meta({ id: 'Named' });

export const pointCountsSchema = z
  .strictObject({ points: z.int(), onCurve: z.int(), warning: z.int(), offCurve: z.int() })
  .meta({ id: 'PointCounts' });

const stripSchema = z
  .strictObject({
    energy: z.array(z.number()),
    z: z.array(z.number()),
    flag: z.array(z.enum(POINT_FLAGS)),
  })
  .meta({
    id: 'Strip',
    description:
      'Ticks of the strip, by energy: three lists of one length, rounded for drawing. At most 300: all warnings and ' +
      'off-curve points, points on the curve thinned evenly; `counts` holds the true numbers.',
  });

export const datasetItemSchema = z
  .strictObject({
    accession: z.string().meta({ example: 'CK-000123' }),
    revision: z.int().meta({ description: 'Newest published revision' }),
    title: z.string(),
    lab: namedSchema,
    system: namedSchema,
    ligands: z.array(z.string()),
    counts: pointCountsSchema.meta({ description: 'Points in the window; all where there is none' }),
    rmsZ: z.number().meta({ description: 'Of the whole dataset' }),
    pValue: z.number().nullable().meta({ description: 'Of the whole dataset' }),
    fittedHere: z.boolean().meta({ description: 'Some parameters were fitted to the very points' }),
    publishedAt: time.meta({ description: 'First publication' }),
    strip: stripSchema,
  })
  .meta({ id: 'DatasetItem' });

const facetSchema = z.array(
  z.strictObject({ value: z.string(), name: z.string(), datasets: z.int() }).meta({ id: 'FacetValue' }),
);

export const facetsSchema = z
  .strictObject({ system: facetSchema, lab: facetSchema, ligand: facetSchema, flag: facetSchema })
  .meta({ id: 'Facets', description: 'Datasets for each choice of one filter, under the other filters' });

export const windowSchema = z
  .strictObject({ from: z.number().nullable(), to: z.number().nullable() })
  .meta({ id: 'EnergyWindow', description: 'The window as it was counted: edges moved out to whole 0.1 kT' });

export const datasetListSchema = z
  .strictObject({
    datasets: z.array(datasetItemSchema),
    total: pointCountsSchema
      .extend({ datasets: z.int() })
      .meta({ id: 'DatasetTotals', description: 'Over all pages' }),
    window: windowSchema.nullable(),
    facets: facetsSchema,
    next: z.string().nullable().meta({ description: 'Address of the next page; null on the last one' }),
  })
  .meta({ id: 'DatasetList' });

const { points: _points, ...seriesWithoutPoints } = seriesAssessmentSchema.shape;

export const publishedAssessmentSchema = z
  .strictObject({
    ...assessmentSchema.shape,
    series: z.array(z.strictObject(seriesWithoutPoints).meta({ id: 'PublishedSeriesAssessment' })),
  })
  .meta({ id: 'PublishedAssessment', description: 'An assessment without its points' });

export const citationSchema = z
  .strictObject({
    text: z.string(),
    bibtex: z.string(),
    ris: z.string(),
    csl: z.record(z.string(), z.unknown()).meta({ description: 'CSL-JSON' }),
  })
  .meta({ id: 'Citation' });

const revisionSchema = z
  .strictObject({
    accession: z.string().meta({ example: 'CK-000123.2' }),
    revision: z.int(),
    publishedAt: time,
    sha256: z.string().meta({ description: 'Of the document as it was sent, hex' }),
    engine: z.string(),
    policy: z.int(),
  })
  .meta({ id: 'PublishedRevision' });

const fileSchema = z
  .strictObject({
    id: z.string(),
    name: z.string(),
    size: z.int(),
    sha256: z.string(),
    mediaType: z.string(),
    uploadedAt: time,
    href: z.string().meta({ description: 'Address of its bytes' }),
  })
  .meta({ id: 'DatasetFile' });

const seriesSummarySchema = z
  .strictObject({
    id: z.string(),
    label: z.string(),
    variant: z.string(),
    counts: pointCountsSchema,
  })
  .meta({ id: 'SeriesSummary' });

export const datasetAnswerSchema = z
  .strictObject({
    accession: z.string(),
    revision: z.int(),
    newest: z.boolean().meta({ description: 'Whether this is the newest published revision' }),
    title: z.string(),
    note: z.string().nullable().meta({ description: 'That the data are invented, where they are' }),
    lab: namedSchema.extend({ institution: z.string() }).meta({ id: 'DatasetLab' }),
    system: namedSchema,
    publishedAt: time.meta({ description: 'Of this revision' }),
    firstPublishedAt: time,
    document: z.record(z.string(), z.unknown()).meta({ description: 'The dataset document' }),
    assessment: publishedAssessmentSchema,
    series: z.array(seriesSummarySchema),
    citation: citationSchema,
    files: z.array(fileSchema),
    revisions: z.array(revisionSchema).meta({ description: 'All published ones, newest first' }),
    links: z
      .strictObject({
        page: z.string(),
        self: z.string(),
        newest: z.string(),
        document: z.string(),
        pointsJson: z.string(),
        pointsCsv: z.string(),
        pointsNdjson: z.string(),
        system: z.string(),
      })
      .meta({ id: 'DatasetLinks' }),
  })
  .meta({ id: 'PublishedDataset' });

export const datasetPointSchema = z
  .strictObject({
    series: z.string().meta({ description: 'Id of the series' }),
    index: z.int().meta({ description: 'Place in the series, from 0, as in the document' }),
    ligands: z.record(z.string(), z.number()).meta({ description: 'In the units of the document' }),
    modulators: z.record(z.string(), z.number()),
    energy: z.number(),
    energyU: z.number(),
    activity: z.number(),
    activityU: z.number(),
    expected: z.number(),
    expectedU: z.number(),
    residual: z.number(),
    residualU: z.number(),
    z: z.number(),
    pValue: z.number(),
    q: z.number(),
    flag: z.enum(POINT_FLAGS),
    uncertainty: z.enum(['stated', 'replicates', 'assumed']),
  })
  .meta({ id: 'DatasetPoint' });

export const datasetPointsSchema = z
  .strictObject({
    accession: z.string(),
    revision: z.int(),
    note: z.string().nullable(),
    units: z
      .strictObject({
        energy: z.literal('kT'),
        ligands: z.record(z.string(), z.string()),
        modulators: z.record(z.string(), z.string()),
      })
      .meta({ id: 'PointUnits', description: 'Of energies, and of ligands and modulators by id' }),
    points: z.array(datasetPointSchema),
  })
  .meta({ id: 'DatasetPoints' });

export const tombstoneSchema = z
  .strictObject({
    accession: z.string(),
    title: z.string(),
    lab: namedSchema,
    system: namedSchema,
    publishedAt: time,
    withdrawnAt: time,
    reason: z.string().nullable().meta({ description: 'Why; null where none is on record' }),
  })
  .meta({ id: 'Tombstone' });

export const withdrawnSchema = problemSchema.extend({ tombstone: tombstoneSchema }).meta({ id: 'Withdrawn' });

export type PointCounts = z.infer<typeof pointCountsSchema>;
export type Strip = z.infer<typeof stripSchema>;
export type DatasetItem = z.infer<typeof datasetItemSchema>;
export type DatasetList = z.infer<typeof datasetListSchema>;
export type Facets = z.infer<typeof facetsSchema>;
export type EnergyWindowAnswer = z.infer<typeof windowSchema>;
export type PublishedAssessment = z.infer<typeof publishedAssessmentSchema>;
export type Citation = z.infer<typeof citationSchema>;
export type DatasetPoint = z.infer<typeof datasetPointSchema>;
export type DatasetPoints = z.infer<typeof datasetPointsSchema>;
export type Tombstone = z.infer<typeof tombstoneSchema>;
/** The answer with its document typed as what it is. */
export type DatasetAnswer = z.infer<typeof datasetAnswerSchema>;
