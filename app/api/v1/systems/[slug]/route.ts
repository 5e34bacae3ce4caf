/** `GET /api/v1/systems/{slug}`: one listed system with what is published on it. */
import { actorOfRequest } from '@/lib/auth/current-actor';
import { answering, methodNotAllowed, optionsOf, type RouteContext } from '@/lib/serving/answer-api';
import { collectionResponse, jsonBody } from '@/lib/serving/answer-collection';
import { loadSystem } from '@/lib/systems/list-systems';

export const GET = answering(async (request, { params }: RouteContext<'slug'>) => {
  const { slug } = await params;
  const actor = await actorOfRequest(request);
  return collectionResponse(request, `system ${slug}`, async () => {
    const outcome = await loadSystem(actor, slug);
    return outcome.ok ? jsonBody(outcome.system) : outcome;
  });
});

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
