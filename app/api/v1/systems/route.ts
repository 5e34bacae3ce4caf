/** `GET /api/v1/systems`: the listed systems, by name. */
import { actorOfRequest } from '@/lib/auth/current-actor';
import { problemResponse } from '@/lib/errors';
import { answering, methodNotAllowed, optionsOf } from '@/lib/serving/answer-api';
import { collectionResponse, listBody } from '@/lib/serving/answer-collection';
import { listSystems } from '@/lib/systems/list-systems';
import { readPageQuery } from '@/schemas/dataset-query';

export const GET = answering(async (request) => {
  const read = readPageQuery(new URL(request.url).searchParams);
  if (!read.ok) return problemResponse({ code: 'bad-parameter', detail: read.detail });
  const { limit, cursor } = read.query;
  const actor = await actorOfRequest(request);
  return collectionResponse(request, `systems ${limit} ${cursor}`, async () => {
    const outcome = await listSystems(actor, read.query);
    return outcome.ok ? listBody(outcome.list) : outcome;
  });
});

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
