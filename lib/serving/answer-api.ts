/** What all route handlers of the API share: errors that nobody expected, methods that are not there, reads with an ETag. */
import { createHash } from 'node:crypto';
import { VISITOR } from '@/lib/auth/actor';
import { type Action, may } from '@/lib/auth/permissions';
import { problemResponse } from '@/lib/errors';
import { log } from '@/lib/log';

type Handler<Context extends unknown[] = []> = (
  request: Request,
  ...context: Context
) => Promise<Response> | Response;

/** What Next hands to the handler of an address with changing parts, such as `/deposits/[id]`. */
export interface RouteContext<Parts extends string> {
  params: Promise<Record<Parts, string>>;
}

/** The handler, with what it throws logged and answered as a problem that gives nothing away. */
export function answering<Context extends unknown[]>(handler: Handler<Context>): Handler<Context> {
  return async (request, ...context) => {
    try {
      return await handler(request, ...context);
    } catch (error) {
      log().error(
        { err: error, method: request.method, path: new URL(request.url).pathname },
        'a call failed',
      );
      return problemResponse({ code: 'unexpected' });
    }
  };
}

/** The handler, for whom the permission table lets in; to what answers everybody alike, everybody is a visitor. */
export function allowing(action: Action, handler: Handler): Handler {
  return (request) => (may(VISITOR, action) ? handler(request) : problemResponse({ code: 'forbidden' }));
}

/** A handler for the methods that an address does not take: 405 with those that it does. */
export function methodNotAllowed(...allowed: string[]): Handler {
  return () => problemResponse({ code: 'method-not-allowed' }, { Allow: [...allowed, 'OPTIONS'].join(', ') });
}

/** A handler for OPTIONS: which methods an address takes. No other site's pages are let in, so no CORS headers. */
export function optionsOf(...allowed: string[]): Handler {
  return () => new Response(null, { status: 204, headers: { Allow: [...allowed, 'OPTIONS'].join(', ') } });
}

/** A text that only changes with the version: strong ETag, and 304 where the caller has it already. */
export function unchangingResponse(request: Request, text: string, contentType: string): Response {
  const etag = `"${createHash('sha256').update(text).digest('base64url').slice(0, 27)}"`;
  // no-transform: compressed on the way it would be other bytes under the same strong ETag.
  const headers = { ETag: etag, 'Cache-Control': 'public, no-cache, no-transform' };
  if (matches(request.headers.get('if-none-match'), etag))
    return new Response(null, { status: 304, headers });
  return new Response(text, { headers: { ...headers, 'Content-Type': contentType } });
}

/**
 * Whether the caller has the representation of that ETag already.
 *
 * @param header If-None-Match, which compares weakly (RFC 9110, 13.1.2)
 */
export function matches(header: string | null, etag: string): boolean {
  if (header === null) return false;
  return header.split(',').some((part) => ['*', etag].includes(part.trim().replace(/^W\//, '')));
}

/**
 * JSON for the caller alone: strong ETag, and 304 where the caller has it already.
 *
 * @param etag that of its content where left out
 * @param more headers of the answer
 */
export function privateResponse(
  request: Request,
  json: string,
  etag = `"${createHash('sha256').update(json).digest('base64url').slice(0, 27)}"`,
  more: Record<string, string> = {},
): Response {
  const headers = { ...privateHeaders(etag), ...more };
  if (matches(request.headers.get('if-none-match'), etag))
    return new Response(null, { status: 304, headers });
  return new Response(json, { headers: { ...headers, 'Content-Type': 'application/json' } });
}

/** That the caller has what is theirs already. */
export function privateNotModified(etag: string): Response {
  return new Response(null, { status: 304, headers: privateHeaders(etag) });
}

function privateHeaders(etag: string) {
  return {
    ETag: etag,
    'Cache-Control': 'private, no-cache, no-transform',
    // One browser may sign in as another, whose answer is another one.
    Vary: 'Cookie, Authorization',
  };
}
