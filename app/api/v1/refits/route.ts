/** `POST /api/v1/refits`: a document and what to free in, fitted values out; at once, or under an address of their own. */
import { outcomeHeaders } from '@/lib/assessments/limit-headers';
import { VISITOR } from '@/lib/auth/actor';
import { env } from '@/lib/env';
import { problemResponse } from '@/lib/errors';
import { type RefitOutcome, startRefit } from '@/lib/refits/start-refit';
import { answering, methodNotAllowed, optionsOf } from '@/lib/serving/answer-api';
import { answerResponse, runningResponse } from '@/lib/serving/answer-refit';
import { PEER_HEADER } from '@/lib/serving/peer';
import { readJsonBody } from '@/lib/serving/read-body';
import { isFromAnotherSite } from '@/lib/serving/same-site';

export const POST = answering(async (request) => {
  if (isFromAnotherSite(request.headers, env().appUrl)) return problemResponse({ code: 'cross-site' });
  const outcome = await startRefit({
    actor: VISITOR,
    peer: request.headers.get(PEER_HEADER) ?? '',
    readBody: () => readJsonBody(request),
    signal: request.signal,
  });
  return responseOf(outcome);
});

const refuse = methodNotAllowed('POST');

export { refuse as DELETE, refuse as GET, refuse as HEAD, refuse as PATCH, refuse as PUT };
export const OPTIONS = optionsOf('POST');

function responseOf(outcome: RefitOutcome): Response {
  const headers = outcomeHeaders(outcome);
  if (outcome.kind === 'failed') return problemResponse(outcome.failure, headers);
  if (outcome.kind === 'answered') return answerResponse(outcome, headers);
  return runningResponse(202, outcome.progress, { ...headers, Location: `/api/v1/refits/${outcome.id}` });
}
