/** The reading part of the API's description: datasets, overlay, systems. */
import type { z } from 'zod';
import {
  datasetAnswerSchema,
  datasetListSchema,
  datasetPointsSchema,
  withdrawnSchema,
} from '@/schemas/dataset-answers';
import {
  datasetFiltersSchema,
  datasetQuerySchema,
  POINT_FLAGS,
  pageQuerySchema,
} from '@/schemas/dataset-query';
import { overlaySchema } from '@/schemas/overlay';
import { systemListSchema, systemSchema } from '@/schemas/system';
import { problems, type Registry, type Responses, text } from './describe-answers';

const READ_LIMITS = {
  RateLimit: text('What is left (draft-ietf-httpapi-ratelimit-headers-10)'),
  'RateLimit-Policy': text('Reads of one address a minute'),
};
const ETAG = { ETag: text('Changes only with the content') };
const LINK = { Link: text('Address of the next page, rel="next"; none on the last one') };
const NOT_MODIFIED: Responses = { 304: { description: 'Not changed since the ETag in If-None-Match' } };
const ACCESSION = pathParameter(
  'accession',
  'CK-000123 for the newest published revision, CK-000123.2 for one',
);

/** Adds the calls that read what is published. */
export function registerReading(registry: Registry): void {
  registerLists(registry);
  registerDataset(registry);
  registerSystems(registry);
}

function registerLists(registry: Registry): void {
  registry.registerPath({
    method: 'get',
    path: '/api/v1/datasets',
    operationId: 'listDatasets',
    summary: 'Published datasets, the newest first',
    parameters: queryParameters(datasetQuerySchema.shape),
    responses: {
      ...json(datasetListSchema, LINK),
      ...NOT_MODIFIED,
      ...problems('bad-parameter', 'too-many-calls', 'unexpected'),
    },
  });
  registry.registerPath({
    method: 'get',
    path: '/api/v1/overlay',
    operationId: 'readOverlay',
    summary: 'What the overlay plot draws of a selection',
    parameters: queryParameters(datasetFiltersSchema.shape),
    responses: {
      ...json(overlaySchema),
      ...NOT_MODIFIED,
      ...problems('bad-parameter', 'too-many-calls', 'unexpected'),
    },
  });
}

function registerDataset(registry: Registry): void {
  const failures: Responses = {
    ...problems('not-found', 'too-many-calls', 'unexpected'),
    410: {
      description: 'The dataset was withdrawn; what is left of it',
      content: { 'application/problem+json': { schema: withdrawnSchema } },
    },
  };
  registry.registerPath({
    method: 'get',
    path: '/api/v1/datasets/{accession}',
    operationId: 'readDataset',
    summary: 'One dataset: document, assessment without points, citation, files, revisions',
    parameters: [ACCESSION],
    responses: { ...json(datasetAnswerSchema), ...NOT_MODIFIED, ...failures },
  });
  registry.registerPath({
    method: 'get',
    path: '/api/v1/datasets/{accession}/document',
    operationId: 'readDatasetDocument',
    summary: 'The document, byte for byte as it was deposited',
    parameters: [ACCESSION],
    responses: {
      200: {
        description: 'The document',
        headers: { ...ETAG, ...READ_LIMITS },
        content: { 'application/json': { schema: { $ref: '#/components/schemas/Dataset' } } },
      },
      ...NOT_MODIFIED,
      ...failures,
    },
  });
  registry.registerPath({
    method: 'get',
    path: '/api/v1/datasets/{accession}/points',
    operationId: 'readDatasetPoints',
    summary: 'The computed points',
    parameters: [
      ACCESSION,
      {
        name: 'format',
        in: 'query',
        description: 'The form, in place of the Accept header',
        schema: { type: 'string', enum: ['json', 'csv', 'ndjson'] },
      },
    ],
    responses: {
      200: {
        description:
          'The points. `index` counts from 0 as in the document; CSV has `point` besides, which counts from 1 as the ' +
          'page does, and the units in its heading. Invented data say so in `note`, in CSV and NDJSON on every line.',
        headers: { ...ETAG, ...READ_LIMITS },
        content: {
          'application/json': { schema: datasetPointsSchema },
          'text/csv': { schema: { type: 'string' } },
          'application/x-ndjson': { schema: { type: 'string' } },
        },
      },
      ...NOT_MODIFIED,
      ...problems('bad-parameter', 'not-acceptable'),
      ...failures,
    },
  });
}

function registerSystems(registry: Registry): void {
  registry.registerPath({
    method: 'get',
    path: '/api/v1/systems',
    operationId: 'listSystems',
    summary: 'Listed systems, by name',
    parameters: queryParameters(pageQuerySchema.shape),
    responses: {
      ...json(systemListSchema, LINK),
      ...NOT_MODIFIED,
      ...problems('bad-parameter', 'too-many-calls', 'unexpected'),
    },
  });
  registry.registerPath({
    method: 'get',
    path: '/api/v1/systems/{slug}',
    operationId: 'readSystem',
    summary: 'One system with what is published on it',
    parameters: [pathParameter('slug', 'Slug of a listed system')],
    responses: {
      ...json(systemSchema),
      ...NOT_MODIFIED,
      ...problems('not-found', 'too-many-calls', 'unexpected'),
    },
  });
}

function json(schema: z.ZodType, headers: Record<string, ReturnType<typeof text>> = {}): Responses {
  return {
    200: {
      description: 'As the collection stands',
      headers: { ...ETAG, ...READ_LIMITS, ...headers },
      content: { 'application/json': { schema } },
    },
  };
}

function pathParameter(name: string, description: string) {
  return { name, in: 'path', required: true, description, schema: { type: 'string' } } as const;
}

const REPEATABLE = new Set(['system', 'lab', 'ligand', 'variant', 'flag']);
const NUMBERS = new Set(['from', 'to']);

/** The validators take the texts of an address; what a caller writes is described here. */
function queryParameters(shape: Record<string, z.ZodType>) {
  return Object.entries(shape).map(([name, validator]) => ({
    name,
    in: 'query' as const,
    description: validator.meta()?.description ?? '',
    schema: schemaOf(name),
  }));
}

function schemaOf(name: string) {
  const one =
    name === 'flag' ? { type: 'string' as const, enum: [...POINT_FLAGS] } : { type: 'string' as const };
  if (REPEATABLE.has(name)) return { type: 'array' as const, items: one };
  if (NUMBERS.has(name)) return { type: 'number' as const };
  return name === 'limit' ? { type: 'integer' as const, minimum: 1, maximum: 100 } : one;
}
