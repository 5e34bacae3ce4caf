/** Route handlers of calls that depend on who is asking. */
import type { Actor } from '@/lib/auth/actor';
import { actorOfRequest } from '@/lib/auth/current-actor';
import { env } from '@/lib/env';
import { type Failure, problemResponse } from '@/lib/errors';
import { answering } from './answer-api';
import { isFromAnotherSite } from './same-site';

const READS = ['GET', 'HEAD', 'OPTIONS'];

/** Seconds after which a caller may try again what was not possible just now. */
const RETRY_SECONDS = 2;

const BAD_TOKEN =
  'The token in the Authorization header is not valid: it is mistyped, over or revoked. Send it as “Bearer ckt_…”.';

type ActorHandler<Context extends unknown[]> = (
  call: { request: Request; actor: Actor },
  ...context: Context
) => Promise<Response>;

/**
 * A handler that is told who is asking. What is not a read is refused where a page of another site sent it with a
 * visitor's session; a lab token is never sent along by a browser, so that calls with one pass.
 */
export function answeringActor<Context extends unknown[]>(handler: ActorHandler<Context>) {
  return answering(async (request: Request, ...context: Context) => {
    const actor = await actorOfRequest(request);
    const mayBeForged = !READS.includes(request.method) && actor.kind !== 'token';
    if (mayBeForged && isFromAnotherSite(request.headers, env().appUrl)) {
      return problemResponse({ code: 'cross-site' });
    }
    const response = await handler({ request, actor }, ...context);
    return response.status === 401 && request.headers.has('authorization')
      ? problemResponse({ code: 'unauthenticated', detail: BAD_TOKEN })
      : response;
  });
}

/** A failure as an answer; where trying again may help, it says when. */
export function failureResponse(failure: Failure): Response {
  const isPassing = ['busy', 'took-too-long', 'unavailable'].includes(failure.code);
  return problemResponse(failure, isPassing ? { 'Retry-After': String(RETRY_SECONDS) } : {});
}
