/** The two answers of a refit: still running, or what it came to. Both are the caller's alone and change: no-store. */
import type { RefitProgressAnswer } from '@/schemas/refit';

/** Seconds after which it is worth asking again. */
const ASK_AGAIN_SECONDS = 1;

/** That it is still being computed, and how far it is (0 to 1). */
export function runningResponse(
  status: 200 | 202,
  progress: number,
  headers: Record<string, string> = {},
): Response {
  const answer: RefitProgressAnswer = { state: 'running', progress };
  return Response.json(answer, {
    status,
    headers: { 'Cache-Control': 'no-store', 'Retry-After': String(ASK_AGAIN_SECONDS), ...headers },
  });
}

/** What it came to: fitted values, or a problem. */
export function answerResponse(
  { status, body }: { status: number; body: Uint8Array<ArrayBuffer> },
  headers: Record<string, string> = {},
): Response {
  return new Response(body, {
    status,
    headers: {
      'Content-Type': status === 200 ? 'application/json' : 'application/problem+json',
      'Cache-Control': 'no-store',
      ...headers,
    },
  });
}
