/** `/api/v1/deposits/{id}`: one deposit: read it, put another document in its place, delete it as a draft. */
import { deleteDraft } from '@/lib/deposits/delete-draft';
import { loadDeposit } from '@/lib/deposits/load-deposit';
import { saveDraft } from '@/lib/deposits/save-draft';
import { depositEtag, depositJson, headAnswer } from '@/lib/deposits/write-answer';
import { answeringActor, failureResponse } from '@/lib/serving/answer-actor';
import { methodNotAllowed, optionsOf, privateResponse, type RouteContext } from '@/lib/serving/answer-api';
import { etagOf, readIfMatch } from '@/lib/serving/if-match';
import { readJsonBody } from '@/lib/serving/read-body';

type Context = RouteContext<'id'>;

export const GET = answeringActor(async ({ request, actor }, { params }: Context) => {
  const { id } = await params;
  const loaded = await loadDeposit({ actor, id });
  if (!loaded.ok) return failureResponse(loaded.failure);
  return privateResponse(request, depositJson(loaded), depositEtag(loaded));
});

export const PUT = answeringActor(async ({ request, actor }, { params }: Context) => {
  const { id } = await params;
  const saved = await saveDraft({
    actor,
    id,
    expected: readIfMatch(request.headers),
    readBody: () => readJsonBody(request),
    signal: request.signal,
  });
  if (!saved.ok) return failureResponse(saved.failure);
  const { deposit, errors } = saved;
  const headers = { ETag: etagOf(deposit.version), 'Cache-Control': 'no-store' };
  return Response.json({ ...headAnswer(deposit), errors }, { headers });
});

export const DELETE = answeringActor(async ({ request, actor }, { params }: Context) => {
  const { id } = await params;
  const deleted = await deleteDraft({ actor, id, expected: readIfMatch(request.headers) });
  return deleted.ok ? new Response(null, { status: 204 }) : failureResponse(deleted.failure);
});

const METHODS = ['GET', 'HEAD', 'PUT', 'DELETE'];
const refuse = methodNotAllowed(...METHODS);

export { refuse as PATCH, refuse as POST };
export const OPTIONS = optionsOf(...METHODS);
