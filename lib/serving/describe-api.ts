/** The API in OpenAPI 3.1, made from the same validators that its answers are tested against. */
import { OpenAPIRegistry, OpenApiGeneratorV31 } from '@asteasolutions/zod-to-openapi';
import { ERRORS } from '@/lib/errors';
import { MOST_BODY_BYTES } from '@/lib/serving/read-body';
import { assessmentSchema } from '@/schemas/assessment';
import datasetSchema from '@/schemas/dataset-1.schema.json';
import { healthSchema } from '@/schemas/health';
import { problemKindSchema } from '@/schemas/problem';
import { type ComponentSchema, LIMIT_HEADERS, problems, type Registry, unchanging } from './describe-answers';
import { registerDeposits } from './describe-deposits';
import { registerReading } from './describe-reading';
import { registerRefits } from './describe-refits';

const DATASET = 'Dataset';

/** The whole description, ready to be sent as JSON. */
export function describeApi(): Record<string, unknown> {
  const registry = new OpenAPIRegistry();
  registerDataset(registry);
  registerAssessments(registry);
  registerRefits(registry, `#/components/schemas/${DATASET}`);
  registerReads(registry);
  registerReading(registry);
  registerDeposits(registry);
  const document = new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Curvekeep',
      version: '1.0.0',
      description:
        'Recomputes the free-energy coordinate of every measured activity of a dataset from the parameters that ' +
        'the dataset states, and flags the points that do not fall on the master curve. Research data only.',
    },
    servers: [{ url: '/' }],
    // Said outright: anybody may call, without credentials, where a call does not say otherwise.
    security: [],
  });
  return { ...document };
}

/** The JSON Schema of a document and its parts as components: a component's references start at the description's root. */
function registerDataset(registry: Registry): void {
  const { $schema: _dialect, $id: _id, $defs, ...root } = datasetSchema as Record<string, unknown>;
  const parts = Object.entries(($defs ?? {}) as Record<string, unknown>).map(
    ([name, part]) => [`${DATASET}.${name}`, part] as const,
  );
  for (const [name, schema] of [[DATASET, root] as const, ...parts]) {
    registry.registerComponent('schemas', name, withComponentReferences(schema) as ComponentSchema);
  }
}

function withComponentReferences(node: unknown): unknown {
  if (Array.isArray(node)) return node.map(withComponentReferences);
  if (node === null || typeof node !== 'object') return node;
  return Object.fromEntries(
    Object.entries(node).map(([key, value]) => [
      key,
      key === '$ref'
        ? String(value).replace(/^#\/\$defs\//, `#/components/schemas/${DATASET}.`)
        : withComponentReferences(value),
    ]),
  );
}

function registerAssessments(registry: Registry): void {
  registry.registerPath({
    method: 'post',
    path: '/api/v1/assessments',
    operationId: 'assessDocument',
    summary: 'Assess a dataset document; nothing is stored',
    request: {
      body: {
        required: true,
        description: `At most ${MOST_BODY_BYTES} bytes, uncompressed`,
        content: { 'application/json': { schema: { $ref: `#/components/schemas/${DATASET}` } } },
      },
    },
    responses: {
      200: {
        description: 'The assessment',
        headers: LIMIT_HEADERS,
        content: { 'application/json': { schema: assessmentSchema } },
      },
      ...problems(
        'malformed-json',
        'incomplete-body',
        'forbidden',
        'cross-site',
        'body-too-large',
        'not-json-type',
        'invalid-document',
        'too-many-calls',
        'too-many-points',
        'too-many-at-once',
        'unexpected',
        'busy',
        'took-too-long',
        'unavailable',
      ),
    },
  });
}

function registerReads(registry: Registry): void {
  const schemaText = { type: 'object', description: 'JSON Schema, 2020-12' } as const;
  registry.registerPath({
    method: 'get',
    path: '/api/v1/schemas/dataset-1',
    operationId: 'readDatasetSchema',
    summary: 'The JSON Schema of a dataset document',
    responses: { ...unchanging('application/schema+json', schemaText), ...problems('unexpected') },
  });
  registry.registerPath({
    method: 'get',
    path: '/api/v1/openapi.json',
    operationId: 'readApiDescription',
    summary: 'This description',
    responses: { ...unchanging('application/json', { type: 'object' }), ...problems('unexpected') },
  });
  registry.registerPath({
    method: 'get',
    path: '/api/v1/problems/{code}',
    operationId: 'readProblemKind',
    summary: 'What the type of a problem means',
    parameters: [
      { name: 'code', in: 'path', required: true, schema: { type: 'string', enum: Object.keys(ERRORS) } },
    ],
    responses: {
      ...unchanging('application/json', problemKindSchema),
      ...problems('not-found', 'unexpected'),
    },
  });
  registry.registerPath({
    method: 'get',
    path: '/api/v1/health',
    operationId: 'readHealth',
    summary: 'Whether database and computation work',
    responses: {
      200: { description: 'All parts work', content: { 'application/json': { schema: healthSchema } } },
      503: { description: 'A part does not', content: { 'application/json': { schema: healthSchema } } },
    },
  });
}
