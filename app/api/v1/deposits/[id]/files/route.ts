/** `POST /api/v1/deposits/{id}/files`: keep an original file, sent as it is. `GET`: the files of a deposit. */
import { Readable } from 'node:stream';
import type { ReadableStream } from 'node:stream/web';
import { attachFile } from '@/lib/deposits/attach-file';
import { listFiles } from '@/lib/deposits/open-file';
import { fileAnswer } from '@/lib/deposits/write-answer';
import type { Outcome } from '@/lib/errors';
import { failed } from '@/lib/errors';
import { answeringActor, failureResponse } from '@/lib/serving/answer-actor';
import { methodNotAllowed, optionsOf, privateResponse, type RouteContext } from '@/lib/serving/answer-api';
import { MOST_FILE_BYTES } from '@/lib/serving/body-bounds';
import { declaredSha256 } from '@/lib/serving/declared-digest';
import { cleanFileName, statedFileName } from '@/lib/serving/file-names';
import { readIdempotencyKey } from '@/lib/serving/idempotency';
import { declaredBytes } from '@/lib/serving/read-body';

type Context = RouteContext<'id'>;

export const POST = answeringActor(async ({ request, actor }, { params }: Context) => {
  const described = describeUpload(request);
  if (!described.ok) return failureResponse(described.failure);
  const { id } = await params;
  const stream = request.body ? Readable.fromWeb(request.body as ReadableStream) : Readable.from([]);
  const attached = await attachFile({ actor, id, stream, ...described });
  if (!attached.ok) return failureResponse(attached.failure);
  const answer = fileAnswer(attached.file);
  const headers = { Location: answer.links.self, 'Cache-Control': 'no-store' };
  return Response.json(answer, { status: 201, headers });
});

export const GET = answeringActor(async ({ request, actor }, { params }: Context) => {
  const listed = await listFiles({ actor, id: (await params).id });
  if (!listed.ok) return failureResponse(listed.failure);
  return privateResponse(request, JSON.stringify({ files: listed.files.map(fileAnswer) }));
});

interface Upload {
  name: string;
  sha256: string | null;
  idempotencyKey: string | null;
}

/** What address and headers say of a file, before a byte of it is read. */
function describeUpload(request: Request): Outcome<Upload> {
  const { headers } = request;
  if (/^\s*multipart\//i.test(headers.get('content-type') ?? '')) return failed('not-plain-file');
  const stated =
    new URL(request.url).searchParams.get('name') ?? statedFileName(headers.get('content-disposition'));
  const name = cleanFileName(stated ?? '');
  if (name === null) {
    return failed('bad-parameter', 'Name the file as ?name= in the address, or in Content-Disposition.');
  }
  if (declaredBytes(headers) > MOST_FILE_BYTES) return failed('file-too-large');
  const digest = declaredSha256(headers);
  if (!digest.ok) return digest;
  const idempotency = readIdempotencyKey(headers);
  if (!idempotency.ok) return idempotency;
  return { ok: true, name, sha256: digest.sha256, idempotencyKey: idempotency.key };
}

const METHODS = ['GET', 'HEAD', 'POST'];
const refuse = methodNotAllowed(...METHODS);

export { refuse as DELETE, refuse as PATCH, refuse as PUT };
export const OPTIONS = optionsOf(...METHODS);
