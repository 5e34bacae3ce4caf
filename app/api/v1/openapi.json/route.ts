/** `GET /api/v1/openapi.json`: the description of this API, OpenAPI 3.1. */

import {
  allowing,
  answering,
  methodNotAllowed,
  optionsOf,
  unchangingResponse,
} from '@/lib/serving/answer-api';
import { describeApi } from '@/lib/serving/describe-api';

let text: string | undefined;

export const GET = answering(
  allowing('read-api-description', (request) => {
    text ??= JSON.stringify(describeApi(), null, 2);
    return unchangingResponse(request, text, 'application/json');
  }),
);

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
