/**
 * What happens where an answer is ready before the whole body has arrived (a body that is too large, a call over its
 * limit). The rest is thrown away as it comes, for a moment only, so that the caller gets to read the answer instead
 * of an error of its connection; then the connection is closed.
 */
import type { IncomingMessage, ServerResponse } from 'node:http';
import { setTimeout as sleep } from 'node:timers/promises';

/** Longest time for which the rest of a body is thrown away. */
const MOST_MS = 2_000;

/** Most bytes that are thrown away: four times the largest body that is allowed. */
const MOST_BYTES = 32 * 1024 * 1024;

/** Has a response that comes too early for its request say that it closes, and hold its end back for a moment. */
export function lingerBeforeEnd(request: IncomingMessage, response: ServerResponse): void {
  const isEarly = () => !request.complete && hasBody(request);
  const writeHead = response.writeHead.bind(response) as (...given: unknown[]) => ServerResponse;
  const end = response.end.bind(response) as (...given: unknown[]) => ServerResponse;
  response.writeHead = ((...given: unknown[]) => {
    if (isEarly()) response.setHeader('Connection', 'close');
    return writeHead(...given);
  }) as ServerResponse['writeHead'];
  response.end = ((...given: unknown[]) => {
    response.end = end as ServerResponse['end'];
    if (!isEarly()) return end(...given);
    const [chunk, encoding] = given;
    if (typeof chunk === 'string' || chunk instanceof Uint8Array)
      response.write(chunk, encoding as BufferEncoding);
    else response.flushHeaders();
    void drain(request).then(() => end());
    return response;
  }) as ServerResponse['end'];
}

async function drain(request: IncomingMessage): Promise<void> {
  const done = new AbortController();
  let thrownAway = 0;
  request.on('data', (chunk: Buffer) => {
    thrownAway += chunk.byteLength;
    if (thrownAway > MOST_BYTES) done.abort();
  });
  for (const event of ['end', 'close', 'error']) request.once(event, () => done.abort());
  request.resume();
  await sleep(MOST_MS, undefined, { signal: done.signal }).catch(() => undefined);
  request.pause();
}

function hasBody(request: IncomingMessage): boolean {
  const { 'content-length': length, 'transfer-encoding': encoding } = request.headers;
  return encoding !== undefined || Number(length ?? 0) > 0;
}
