/**
 * Answers that change with the collection only: a strong ETag over the body, and 304 where the caller has it. That
 * nothing changed is found by the collection's version alone, without making the body again.
 */
import { createHash } from 'node:crypto';
import { selectCollectionVersion } from '@/db/queries/datasets';
import { noteLimited } from '@/lib/audit/audit-refusals';
import { VISITOR } from '@/lib/auth/actor';
import type { Failed } from '@/lib/errors';
import { problemOf, problemResponse } from '@/lib/errors';
import type { Tombstone } from '@/schemas/dataset-answers';
import { admitReading, readLimitHeaders } from './admit-reading';
import { matches } from './answer-api';
import { PEER_HEADER } from './peer';

export interface CollectionBody {
  text: string;
  contentType: string;
  /** more headers of this form, such as Content-Disposition */
  headers?: Record<string, string>;
}

/** A list as JSON, with the address of its next page as a Link header as well (RFC 8288). */
export function listBody(list: { next: string | null }): CollectionBody {
  const link: Record<string, string> = list.next === null ? {} : { Link: `<${list.next}>; rel="next"` };
  return { text: JSON.stringify(list), contentType: 'application/json', headers: link };
}

/** Any answer as JSON. */
export function jsonBody(answer: object): CollectionBody {
  return { text: JSON.stringify(answer), contentType: 'application/json' };
}

/** Has a browser save the answer under a name of letters, digits, dots and hyphens. */
export function attachment(fileName: string): Record<string, string> {
  return { 'Content-Disposition': `attachment; filename="${fileName}"` };
}

/** ETags that this process made, by collection version and form. Lost, it only costs making a body again. */
const known = new Map<string, string>();
const MOST_KNOWN = 2000;

/**
 * The answer, or 304, or that the caller's address has read enough for the minute.
 *
 * @param form all that the body depends on besides the collection: address, parameters, media type
 * @param make makes the body, or says what is wrong
 */
export async function collectionResponse(
  request: Request,
  form: string,
  make: () => Promise<CollectionBody | (Failed & { tombstone?: Tombstone })>,
): Promise<Response> {
  const admission = await admitReading(request.headers.get(PEER_HEADER) ?? '');
  if (admission === null) return answerFrom(request, form, make);
  const { admitted, quota } = admission;
  if (!admitted) await noteLimited(VISITOR, 'read-published');
  const response = admitted
    ? await answerFrom(request, form, make)
    : problemResponse({ code: 'too-many-calls', retryAfterSeconds: quota.resetSeconds });
  for (const [name, value] of Object.entries(readLimitHeaders(quota))) response.headers.set(name, value);
  return response;
}

async function answerFrom(
  request: Request,
  form: string,
  make: () => Promise<CollectionBody | (Failed & { tombstone?: Tombstone })>,
): Promise<Response> {
  const version = await selectCollectionVersion();
  const key = createHash('sha256').update(`${version}\n${form}`).digest('base64url');
  const before = known.get(key);
  if (before !== undefined && matches(request.headers.get('if-none-match'), before))
    return notModified(before);
  const made = await make();
  if ('failure' in made) return refused(made);
  const etag = `"${createHash('sha256').update(form).update(made.text).digest('base64url').slice(0, 27)}"`;
  // What was read may be newer than the version that was looked up before it.
  if ((await selectCollectionVersion()) === version) remember(key, etag);
  if (matches(request.headers.get('if-none-match'), etag)) return notModified(etag);
  const { text, contentType, headers } = made;
  return new Response(text, { headers: { ...headersOf(etag), ...headers, 'Content-Type': contentType } });
}

/** The failure as problem details; of a withdrawn dataset with its tombstone. */
function refused({ failure, tombstone }: Failed & { tombstone?: Tombstone }): Response {
  if (tombstone === undefined) return problemResponse(failure);
  const problem = { ...problemOf(failure), tombstone };
  const headers = { 'Content-Type': 'application/problem+json', 'Cache-Control': 'no-store' };
  return new Response(JSON.stringify(problem), { status: problem.status, headers });
}

function remember(key: string, etag: string): void {
  if (known.size >= MOST_KNOWN) known.clear();
  known.set(key, etag);
}

function notModified(etag: string): Response {
  return new Response(null, { status: 304, headers: headersOf(etag) });
}

function headersOf(etag: string): Record<string, string> {
  // no-transform: compressed on the way it would be other bytes under the same strong ETag.
  return { ETag: etag, 'Cache-Control': 'public, no-cache, no-transform', Vary: 'Accept' };
}
