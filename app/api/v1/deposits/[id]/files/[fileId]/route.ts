/** `GET /api/v1/deposits/{id}/files/{fileId}`: an original file, byte for byte. `DELETE`: take it from a draft. */
import { Readable } from 'node:stream';
import { openFile } from '@/lib/deposits/open-file';
import { removeFile } from '@/lib/deposits/remove-file';
import { log } from '@/lib/log';
import { answeringActor, failureResponse } from '@/lib/serving/answer-actor';
import { matches, methodNotAllowed, optionsOf, type RouteContext } from '@/lib/serving/answer-api';
import { digestMember } from '@/lib/serving/declared-digest';
import { attachmentHeader } from '@/lib/serving/file-names';
import { answerWithLength } from '@/lib/serving/late-answer';

type Context = RouteContext<'id' | 'fileId'>;

export const GET = answeringActor(async ({ request, actor }, { params }: Context) => {
  const opened = await openFile({ actor, ...(await params) });
  if (!opened.ok) return failureResponse(opened.failure);
  const { file, open } = opened;
  const etag = `"${Buffer.from(file.sha256, 'hex').toString('base64url')}"`;
  const caching = { ETag: etag, 'Cache-Control': 'private, no-cache, no-transform' };
  if (matches(request.headers.get('if-none-match'), etag)) {
    return new Response(null, { status: 304, headers: caching });
  }
  const headers = {
    ...caching,
    'Content-Type': file.mediaType,
    'Content-Disposition': attachmentHeader(file.name),
    // Sandbox and nosniff come from the server (lib/serving/security-headers.ts).
    'Repr-Digest': digestMember(file.sha256),
  };
  if (request.method === 'HEAD') {
    answerWithLength(file.size);
    return new Response(null, { headers });
  }
  const bytes = await open().catch((error: unknown) => {
    log().error({ err: error }, 'a file could not be opened');
    return null;
  });
  if (bytes === null) return failureResponse({ code: 'unavailable' });
  answerWithLength(file.size);
  return new Response(Readable.toWeb(bytes) as ReadableStream, { headers });
});

export const DELETE = answeringActor(async ({ actor }, { params }: Context) => {
  const removed = await removeFile({ actor, ...(await params) });
  return removed.ok ? new Response(null, { status: 204 }) : failureResponse(removed.failure);
});

const METHODS = ['GET', 'HEAD', 'DELETE'];
const refuse = methodNotAllowed(...METHODS);

export { refuse as PATCH, refuse as POST, refuse as PUT };
export const OPTIONS = optionsOf(...METHODS);
