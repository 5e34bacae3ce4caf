/** `POST /api/v1/deposits`: a new draft. `GET`: the deposits of the caller's laboratories. */
import { nextAddress } from '@/lib/datasets/list-cursor';
import { createDeposit } from '@/lib/deposits/create-deposit';
import { listDeposits } from '@/lib/deposits/list-deposits';
import { depositPath, headAnswer } from '@/lib/deposits/write-answer';
import { answeringActor, failureResponse } from '@/lib/serving/answer-actor';
import { methodNotAllowed, optionsOf, privateResponse } from '@/lib/serving/answer-api';
import { readIdempotencyKey } from '@/lib/serving/idempotency';
import { etagOf } from '@/lib/serving/if-match';
import { readJsonBody } from '@/lib/serving/read-body';
import { readDepositQuery } from '@/schemas/deposit';

export const POST = answeringActor(async ({ request, actor }) => {
  const idempotency = readIdempotencyKey(request.headers);
  if (!idempotency.ok) return failureResponse(idempotency.failure);
  const created = await createDeposit({
    actor,
    lab: new URL(request.url).searchParams.get('lab') ?? request.headers.get('curvekeep-lab'),
    readBody: () => readJsonBody(request),
    idempotencyKey: idempotency.key,
    signal: request.signal,
  });
  if (!created.ok) return failureResponse(created.failure);
  const { deposit, errors } = created;
  const headers = {
    Location: depositPath(deposit.id),
    ETag: etagOf(deposit.version),
    'Cache-Control': 'no-store',
  };
  return Response.json({ ...headAnswer(deposit), errors }, { status: 201, headers });
});

export const GET = answeringActor(async ({ request, actor }) => {
  const read = readDepositQuery(new URL(request.url).searchParams);
  if (!read.ok) return failureResponse({ code: 'bad-parameter', detail: read.detail });
  const listed = await listDeposits({ actor, ...read.query });
  if (!listed.ok) return failureResponse(listed.failure);
  const deposits = listed.deposits.map(headAnswer);
  const next = listed.next === null ? null : nextPage(request.url, listed.next);
  const link: Record<string, string> = next === null ? {} : { Link: `<${next}>; rel="next"` };
  return privateResponse(request, JSON.stringify({ deposits, next }), undefined, link);
});

function nextPage(address: string, cursor: string): string {
  const { pathname, searchParams } = new URL(address);
  return nextAddress(pathname, searchParams, cursor);
}

const METHODS = ['GET', 'HEAD', 'POST'];
const refuse = methodNotAllowed(...METHODS);

export { refuse as DELETE, refuse as PATCH, refuse as PUT };
export const OPTIONS = optionsOf(...METHODS);
