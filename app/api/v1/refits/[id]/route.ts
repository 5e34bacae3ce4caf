/** `/api/v1/refits/{id}`: a refit that takes longer than its call: how far it is, then its answer; or end it. */
import { VISITOR } from '@/lib/auth/actor';
import { env } from '@/lib/env';
import { problemResponse } from '@/lib/errors';
import { cancelRefit } from '@/lib/refits/cancel-refit';
import { loadRefit } from '@/lib/refits/load-refit';
import { answering, methodNotAllowed, optionsOf, type RouteContext } from '@/lib/serving/answer-api';
import { answerResponse, runningResponse } from '@/lib/serving/answer-refit';
import { isFromAnotherSite } from '@/lib/serving/same-site';

type Context = RouteContext<'id'>;

export const GET = answering(async (_, { params }: Context) => {
  const loaded = await loadRefit({ actor: VISITOR, id: (await params).id });
  if (!loaded.ok) return problemResponse(loaded.failure);
  const { refit } = loaded;
  return refit.kind === 'running' ? runningResponse(200, refit.progress) : answerResponse(refit);
});

export const DELETE = answering(async (request, { params }: Context) => {
  if (isFromAnotherSite(request.headers, env().appUrl)) return problemResponse({ code: 'cross-site' });
  const cancelled = await cancelRefit({ actor: VISITOR, id: (await params).id });
  return cancelled.ok ? new Response(null, { status: 204 }) : problemResponse(cancelled.failure);
});

const METHODS = ['GET', 'HEAD', 'DELETE'];
const refuse = methodNotAllowed(...METHODS);

export { refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf(...METHODS);
