/** `POST /api/v1/deposits/{id}/decision`: a curator accepts, which publishes, asks for changes, or declines. */
import { acceptDeposit } from '@/lib/curation/accept-deposit';
import { askForChanges } from '@/lib/curation/ask-for-changes';
import { declineDeposit } from '@/lib/curation/decline-deposit';
import { readDecision } from '@/lib/curation/read-decision';
import { headAnswer } from '@/lib/deposits/write-answer';
import { answeringActor, failureResponse } from '@/lib/serving/answer-actor';
import { methodNotAllowed, optionsOf, type RouteContext } from '@/lib/serving/answer-api';
import { readIdempotencyKey } from '@/lib/serving/idempotency';
import { etagOf } from '@/lib/serving/if-match';
import { readJsonBody } from '@/lib/serving/read-body';

/** Enough for the longest letter, however it is written. */
const MOST_BYTES = 256 * 1024;

const DECIDE = {
  accepted: acceptDeposit,
  'changes-requested': askForChanges,
  declined: declineDeposit,
};

export const POST = answeringActor(async ({ request, actor }, { params }: RouteContext<'id'>) => {
  const idempotency = readIdempotencyKey(request.headers);
  if (!idempotency.ok) return failureResponse(idempotency.failure);
  const { id } = await params;
  const decision = await readDecision({ actor, id, readBody: () => readJsonBody(request, MOST_BYTES) });
  if (!decision.ok) return failureResponse(decision.failure);
  const { ok: _, kind, ...rest } = decision;
  const decided = await DECIDE[kind]({ actor, id, ...rest, idempotencyKey: idempotency.key });
  if (!decided.ok) return failureResponse(decided.failure);
  const { deposit } = decided;
  const headers = { ETag: etagOf(deposit.version), 'Cache-Control': 'no-store' };
  return Response.json(headAnswer(deposit), { headers });
});

const refuse = methodNotAllowed('POST');

export { refuse as DELETE, refuse as GET, refuse as HEAD, refuse as PATCH, refuse as PUT };
export const OPTIONS = optionsOf('POST');
