/** `GET /api/v1/schemas/dataset-1`: the JSON Schema that documents are checked against. */
import {
  allowing,
  answering,
  methodNotAllowed,
  optionsOf,
  unchangingResponse,
} from '@/lib/serving/answer-api';
import schema from '@/schemas/dataset-1.schema.json';

const text = JSON.stringify(schema, null, 2);

export const GET = answering(
  allowing('read-api-description', (request) => unchangingResponse(request, text, 'application/schema+json')),
);

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
