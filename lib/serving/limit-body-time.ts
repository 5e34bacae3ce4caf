/** Node knows one time limit for all requests; here a file is given longer than a document. */
import type { IncomingMessage, ServerResponse } from 'node:http';
import { bodyBounds } from './body-bounds';

/** Calls `refuse` with the error of Node's own limit where the body of a request is not there in time. */
export function limitBodyTime(
  request: IncomingMessage,
  response: ServerResponse,
  refuse: (error: NodeJS.ErrnoException) => void,
): void {
  const limit = setTimeout(
    () => {
      const error = new Error('The body of a request did not arrive in time.');
      if (!request.complete) refuse(Object.assign(error, { code: 'ERR_HTTP_REQUEST_TIMEOUT' }));
    },
    bodyBounds(request.url ?? '').mostMs,
  );
  response.once('close', () => clearTimeout(limit));
}
