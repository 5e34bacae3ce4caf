/** `GET /api/v1/overlay`: what the overlay plot draws of everything that the filters select. */
import { actorOfRequest } from '@/lib/auth/current-actor';
import { filterParameters } from '@/lib/datasets/dataset-filter';
import { loadOverlay } from '@/lib/datasets/load-overlay';
import { problemResponse } from '@/lib/errors';
import { answering, methodNotAllowed, optionsOf } from '@/lib/serving/answer-api';
import { collectionResponse, jsonBody } from '@/lib/serving/answer-collection';
import { readDatasetFilters } from '@/schemas/dataset-query';

export const GET = answering(async (request) => {
  const read = readDatasetFilters(new URL(request.url).searchParams);
  if (!read.ok) return problemResponse({ code: 'bad-parameter', detail: read.detail });
  const actor = await actorOfRequest(request);
  return collectionResponse(request, `overlay ${filterParameters(read.query)}`, async () => {
    const outcome = await loadOverlay(actor, read.query);
    return outcome.ok ? jsonBody(outcome.overlay) : outcome;
  });
});

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
