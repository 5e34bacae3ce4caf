/**
 * What Next lets neither a page nor a route handler say of its answer: a page's status beyond 404, a stream's length.
 * It is noted beside the request while it is rendered, and the server in front writes it with the headers.
 */
import { AsyncLocalStorage } from 'node:async_hooks';
import type { IncomingMessage, ServerResponse } from 'node:http';

interface LateAnswer {
  status?: PageStatus;
  contentLength?: number;
}

/** 401: sign in first; 403: not for this account; 410: withdrawn. */
type PageStatus = 401 | 403 | 410;

const KEY = Symbol.for('curvekeep.late-answer');
// Next bundles pages apart from the server; both must meet the same storage, so it hangs on globalThis.
const shared = globalThis as typeof globalThis & { [KEY]?: AsyncLocalStorage<LateAnswer> };
shared[KEY] ??= new AsyncLocalStorage<LateAnswer>();
const notes = shared[KEY];

/** Says with which status the page that is being rendered is sent. */
export function answerWithStatus(status: PageStatus): void {
  const late = notes.getStore();
  if (late) late.status = status;
}

/** Says how many bytes the body of the answer has that is being made. */
export function answerWithLength(bytes: number): void {
  const late = notes.getStore();
  if (late) late.contentLength = bytes;
}

/** Runs a handler and writes what is noted meanwhile with the headers of its answer. */
export function withLateAnswer<T>(
  request: IncomingMessage,
  response: ServerResponse,
  handle: () => Promise<T>,
): Promise<T> {
  const late: LateAnswer = {};
  const writeHead = response.writeHead.bind(response) as (...given: unknown[]) => ServerResponse;
  response.writeHead = ((status: number, ...rest: unknown[]) => {
    if (status !== 200) return writeHead(status, ...rest);
    if (late.contentLength !== undefined) response.setHeader('Content-Length', late.contentLength);
    const { status: meant } = late;
    if (meant === undefined || !isDocument(request)) return writeHead(status, ...rest);
    // RFC 9110, 11.6.1: a 401 says how to identify oneself. Browsers ask nobody for a bearer's token.
    if (meant === 401) response.setHeader('WWW-Authenticate', 'Bearer realm="Curvekeep"');
    return writeHead(meant, ...rest);
  }) as ServerResponse['writeHead'];
  return notes.run(late, handle);
}

/** A page of its own, not a part of one that Next fetches for a page that is open already. */
function isDocument({ headers }: IncomingMessage): boolean {
  return headers.rsc === undefined && headers['next-action'] === undefined;
}
