/** `POST /api/v1/assessments`: a document in, its assessment out; nothing is stored. */
import { type AssessmentOutcome, assessDocument } from '@/lib/assessments/assess-document';
import { outcomeHeaders } from '@/lib/assessments/limit-headers';
import { VISITOR } from '@/lib/auth/actor';
import { env } from '@/lib/env';
import { problemResponse } from '@/lib/errors';
import { answering, methodNotAllowed, optionsOf } from '@/lib/serving/answer-api';
import { PEER_HEADER } from '@/lib/serving/peer';
import { declaredBytes, MOST_BODY_BYTES, readJsonBody } from '@/lib/serving/read-body';
import { isFromAnotherSite } from '@/lib/serving/same-site';

export const POST = answering(async (request) => {
  if (isFromAnotherSite(request.headers, env().appUrl)) return problemResponse({ code: 'cross-site' });
  const outcome = await assessDocument({
    actor: VISITOR,
    peer: request.headers.get(PEER_HEADER) ?? '',
    mostBytes: declaredBytes(request.headers) || MOST_BODY_BYTES,
    readBody: () => readJsonBody(request),
    signal: request.signal,
  });
  return responseOf(outcome);
});

const refuse = methodNotAllowed('POST');

export { refuse as DELETE, refuse as GET, refuse as HEAD, refuse as PATCH, refuse as PUT };
export const OPTIONS = optionsOf('POST');

function responseOf(outcome: AssessmentOutcome): Response {
  const limits = outcomeHeaders(outcome);
  if (outcome.kind === 'failed') return problemResponse(outcome.failure, limits);
  const { status, body } = outcome;
  return new Response(body, {
    status,
    headers: {
      'Content-Type': status === 200 ? 'application/json' : 'application/problem+json',
      'Cache-Control': 'no-store',
      ...limits,
    },
  });
}
