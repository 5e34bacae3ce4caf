/** `POST /api/v1/deposits/{id}/submission`: submit the document as it stands. `DELETE`: recall the submission. */
import { recallDeposit } from '@/lib/deposits/recall-deposit';
import { submitDeposit } from '@/lib/deposits/submit-deposit';
import { headAnswer } from '@/lib/deposits/write-answer';
import { answeringActor, failureResponse } from '@/lib/serving/answer-actor';
import { methodNotAllowed, optionsOf, type RouteContext } from '@/lib/serving/answer-api';
import { readIdempotencyKey } from '@/lib/serving/idempotency';
import { etagOf, readIfMatch } from '@/lib/serving/if-match';

type Context = RouteContext<'id'>;

export const POST = answeringActor(async ({ request, actor }, { params }: Context) => {
  const idempotency = readIdempotencyKey(request.headers);
  if (!idempotency.ok) return failureResponse(idempotency.failure);
  const submitted = await submitDeposit({
    actor,
    id: (await params).id,
    expected: readIfMatch(request.headers),
    idempotencyKey: idempotency.key,
    signal: request.signal,
  });
  if (!submitted.ok) return failureResponse(submitted.failure);
  const { deposit, revision } = submitted;
  const headers = { ETag: etagOf(deposit.version), 'Cache-Control': 'no-store' };
  return Response.json({ ...headAnswer(deposit), revision }, { headers });
});

export const DELETE = answeringActor(async ({ actor }, { params }: Context) => {
  const recalled = await recallDeposit({ actor, id: (await params).id });
  if (!recalled.ok) return failureResponse(recalled.failure);
  const headers = { ETag: etagOf(recalled.deposit.version), 'Cache-Control': 'no-store' };
  return Response.json(headAnswer(recalled.deposit), { headers });
});

const METHODS = ['POST', 'DELETE'];
const refuse = methodNotAllowed(...METHODS);

export { refuse as GET, refuse as HEAD, refuse as PATCH, refuse as PUT };
export const OPTIONS = optionsOf(...METHODS);
