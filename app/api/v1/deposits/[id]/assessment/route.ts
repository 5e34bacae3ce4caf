/** `GET /api/v1/deposits/{id}/assessment`: of the draft as it stands, or of the newest revision. */
import { loadAssessment } from '@/lib/deposits/load-assessment';
import { answeringActor, failureResponse } from '@/lib/serving/answer-actor';
import {
  matches,
  methodNotAllowed,
  optionsOf,
  privateNotModified,
  privateResponse,
  type RouteContext,
} from '@/lib/serving/answer-api';

export const GET = answeringActor(async ({ request, actor }, { params }: RouteContext<'id'>) => {
  const { id } = await params;
  const known = request.headers.get('if-none-match');
  const has = (tag: string) => matches(known, `"${tag}"`);
  const loaded = await loadAssessment({ actor, id, signal: request.signal, has });
  if (!loaded.ok) return failureResponse(loaded.failure);
  if ('unchanged' in loaded) return privateNotModified(`"${loaded.unchanged}"`);
  return privateResponse(request, loaded.assessment, `"${loaded.tag}"`);
});

const refuse = methodNotAllowed('GET', 'HEAD');

export { refuse as DELETE, refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf('GET', 'HEAD');
