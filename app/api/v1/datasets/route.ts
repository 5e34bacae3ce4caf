/** `GET /api/v1/datasets`: what is published, under the filters of the address, the newest first. */
import { actorOfRequest } from '@/lib/auth/current-actor';
import { filterParameters } from '@/lib/datasets/dataset-filter';
import { listDatasets } from '@/lib/datasets/list-datasets';
import { problemResponse } from '@/lib/errors';
import { answering, methodNotAllowed, optionsOf } from '@/lib/serving/answer-api';
import { collectionResponse, listBody } from '@/lib/serving/answer-collection';
import { readDatasetQuery } from '@/schemas/dataset-query';

export const GET = answering(async (request) => {
  const read = readDatasetQuery(new URL(request.url).searchParams);
  if (!read.ok) return problemResponse({ code: 'bad-parameter', detail: read.detail });
  const { limit, cursor, ...filters } = read.query;
  const actor = await actorOfRequest(request);
  return collectionResponse(request, `datasets ${filterParameters(filters)} ${limit} ${cursor}`, async () => {
    const outcome = await listDatasets(actor, read.query);
    return outcome.ok ? listBody(outcome.list) : outcome;
  });
});

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
