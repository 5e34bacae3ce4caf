/** `GET /api/v1/datasets/{accession}/document`: the document of a revision, byte for byte as it was deposited. */
import { actorOfRequest } from '@/lib/auth/current-actor';
import { loadRevision } from '@/lib/datasets/load-revision';
import { answering, methodNotAllowed, optionsOf, type RouteContext } from '@/lib/serving/answer-api';
import { attachment, collectionResponse } from '@/lib/serving/answer-collection';

export const GET = answering(async (request, { params }: RouteContext<'accession'>) => {
  const { accession } = await params;
  const actor = await actorOfRequest(request);
  return collectionResponse(request, `document ${accession}`, async () => {
    const outcome = await loadRevision(actor, accession);
    if (!outcome.ok) return outcome;
    const { text, accession: name } = outcome.published;
    return { text, contentType: 'application/json', headers: attachment(`${name}.json`) };
  });
});

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
