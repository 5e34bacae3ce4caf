/** The calls that refit, as the API's description tells of them. */
import { z } from 'zod';
import { MOST_BODY_BYTES } from '@/lib/serving/read-body';
import { freeListSchema, refitAnswerSchema, refitProgressSchema } from '@/schemas/refit';
import { type ComponentSchema, LIMIT_HEADERS, problems, type Registry, text } from './describe-answers';

const PATH = '/api/v1/refits/{id}';

const ID = {
  name: 'id',
  in: 'path',
  required: true,
  description: 'From the Location header of the call that began it',
  schema: { type: 'string' },
} as const;

const RETRY = { 'Retry-After': text('Seconds after which it is worth asking again') };

/** Adds the calls that begin, read and end a refit. */
export function registerRefits(registry: Registry, dataset: string): void {
  registerStart(registry, dataset);
  registry.registerPath({
    method: 'get',
    path: PATH,
    operationId: 'readRefit',
    summary: 'How far a refit is, then its answer; kept for an hour',
    parameters: [ID],
    responses: {
      200: {
        description: 'The answer, or how far it is. A refit that failed is answered with its problem',
        headers: RETRY,
        content: { 'application/json': { schema: refitAnswerSchema.or(refitProgressSchema) } },
      },
      ...problems('malformed-json', 'not-found', 'invalid-input', 'unexpected', 'took-too-long'),
    },
  });
  registry.registerPath({
    method: 'delete',
    path: PATH,
    operationId: 'cancelRefit',
    summary: 'End a refit, or forget its answer',
    parameters: [ID],
    responses: {
      204: { description: 'It is forgotten' },
      ...problems('cross-site', 'not-found', 'unexpected'),
    },
  });
}

function registerStart(registry: Registry, dataset: string): void {
  const { $schema: _dialect, ...free } = z.toJSONSchema(freeListSchema);
  registry.registerComponent('schemas', 'FreeParameters', free as ComponentSchema);
  registry.registerPath({
    method: 'post',
    path: '/api/v1/refits',
    operationId: 'refitDocument',
    summary: 'Fit freed parameters of a dataset document to its points',
    request: {
      body: {
        required: true,
        description: `At most ${MOST_BODY_BYTES} bytes, uncompressed; at most 40 free values`,
        content: {
          'application/json': {
            schema: {
              type: 'object',
              properties: {
                document: { $ref: dataset },
                free: { $ref: '#/components/schemas/FreeParameters' },
              },
              required: ['document', 'free'],
              additionalProperties: false,
            },
          },
        },
      },
    },
    responses: {
      200: {
        description: 'The fitted values',
        headers: LIMIT_HEADERS,
        content: { 'application/json': { schema: refitAnswerSchema } },
      },
      202: {
        description:
          'It takes longer than a second; its answer will stand at the address in Location for an hour',
        headers: { ...LIMIT_HEADERS, ...RETRY, Location: text('Where its answer will stand') },
        content: { 'application/json': { schema: refitProgressSchema } },
      },
      ...problems(
        'malformed-json',
        'incomplete-body',
        'forbidden',
        'cross-site',
        'body-too-large',
        'not-json-type',
        'invalid-input',
        'too-many-calls',
        'too-many-at-once',
        'unexpected',
        'busy',
        'took-too-long',
        'unavailable',
      ),
    },
  });
}
