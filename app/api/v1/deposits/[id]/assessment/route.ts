/** `GET /api/v1/deposits/{id}/assessment`: of the draft as it stands, or of the newest revision. */
import { loadAssessment } from '@/lib/deposits/load-assessment';
import { answeringActor, failureResponse } from '@/lib/serving/answer-actor';
import { methodNotAllowed, optionsOf, privateResponse, type RouteContext } from '@/lib/serving/answer-api';

export const GET = answeringActor(async ({ request, actor }, { params }: RouteContext<'id'>) => {
  const { id } = await params;
  const loaded = await loadAssessment({ actor, id, signal: request.signal });
  if (!loaded.ok) return failureResponse(loaded.failure);
  const { assessment, revision, version, engine, policy } = loaded;
  const of = revision === null ? `draft-${version}` : `revision-${revision}`;
  return privateResponse(request, assessment, `"${of}-${engine}-${policy}"`);
});

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
