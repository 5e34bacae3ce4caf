/** `GET /api/v1/datasets/{accession}`: one published dataset, all but its points. */
import { actorOfRequest } from '@/lib/auth/current-actor';
import { loadDataset } from '@/lib/datasets/load-dataset';
import { answering, methodNotAllowed, optionsOf, type RouteContext } from '@/lib/serving/answer-api';
import { collectionResponse, jsonBody } from '@/lib/serving/answer-collection';

export const GET = answering(async (request, { params }: RouteContext<'accession'>) => {
  const { accession } = await params;
  const actor = await actorOfRequest(request);
  return collectionResponse(request, `dataset ${accession}`, async () => {
    const outcome = await loadDataset(actor, accession);
    return outcome.ok ? jsonBody(outcome.dataset) : outcome;
  });
});

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
