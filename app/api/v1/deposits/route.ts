/** `POST /api/v1/deposits`: a new draft. `GET`: the deposits of the caller's laboratories. */
import { createDeposit } from '@/lib/deposits/create-deposit';
import { listDeposits } from '@/lib/deposits/list-deposits';
import { depositPath, headAnswer } from '@/lib/deposits/write-answer';
import { answeringActor, failureResponse } from '@/lib/serving/answer-actor';
import { methodNotAllowed, optionsOf } from '@/lib/serving/answer-api';
import { readIdempotencyKey } from '@/lib/serving/idempotency';
import { etagOf } from '@/lib/serving/if-match';
import { readJsonBody } from '@/lib/serving/read-body';
import { depositQuerySchema } from '@/schemas/deposit';

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
  const query = depositQuerySchema.safeParse(Object.fromEntries(new URL(request.url).searchParams));
  if (!query.success) {
    const [issue] = query.error.issues;
    const detail = `${issue?.path.join('.')} is not right: ${issue?.message}.`;
    return failureResponse({ code: 'bad-parameter', detail });
  }
  const listed = await listDeposits({ actor, ...query.data });
  if (!listed.ok) return failureResponse(listed.failure);
  const { deposits, next } = listed;
  const headers: Record<string, string> = { 'Cache-Control': 'no-store' };
  if (next !== null) headers.Link = `<${nextPage(request.url, next)}>; rel="next"`;
  return Response.json({ deposits: deposits.map(headAnswer), next }, { headers });
});

function nextPage(address: string, cursor: string): string {
  const { pathname, searchParams } = new URL(address);
  searchParams.set('cursor', cursor);
  return `${pathname}?${searchParams}`;
}

const METHODS = ['GET', 'HEAD', 'POST'];
const refuse = methodNotAllowed(...METHODS);

export { refuse as DELETE, refuse as PATCH, refuse as PUT };
export const OPTIONS = optionsOf(...METHODS);
