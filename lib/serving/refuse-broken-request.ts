/** What goes back where a request cannot even be handed on: a problem. */
import type { IncomingMessage, ServerResponse } from 'node:http';
import type { Duplex } from 'node:stream';
import { problemOf } from '@/lib/errors';

const ANSWERS: Record<string, string> = {
  HPE_HEADER_OVERFLOW: '431 Request Header Fields Too Large',
  ERR_HTTP_REQUEST_TIMEOUT: '408 Request Timeout',
};

/** Answers bytes that are no HTTP request, where that is still possible, and ends the connection. */
export function refuseBrokenRequest(
  error: NodeJS.ErrnoException,
  socket: Duplex,
  headers: Record<string, string>,
): void {
  if (error.code === 'ECONNRESET' || !socket.writable) {
    socket.destroy();
    return;
  }
  const status = ANSWERS[error.code ?? ''] ?? '400 Bad Request';
  const body = JSON.stringify({
    type: 'about:blank',
    title: status.slice(4),
    status: Number(status.slice(0, 3)),
  });
  const lines = Object.entries({
    ...headers,
    'Content-Type': 'application/problem+json',
    'Content-Length': String(Buffer.byteLength(body)),
    Connection: 'close',
  }).map(([name, value]) => `${name}: ${value}\r\n`);
  socket.end(`HTTP/1.1 ${status}\r\n${lines.join('')}\r\n${body}`);
}

/** Answers a path of the API whose percent-encoding is broken, at which Next would fail. Returns whether it did. */
export function refuseUnreadablePath({ url = '' }: IncomingMessage, response: ServerResponse): boolean {
  const path = url.replace(/[?#].*$/, '');
  if (!path.startsWith('/api/') || isReadable(path)) return false;
  response.writeHead(404, { 'Content-Type': 'application/problem+json' });
  response.end(JSON.stringify(problemOf({ code: 'not-found' })));
  return true;
}

function isReadable(path: string): boolean {
  try {
    decodeURIComponent(path);
    return true;
  } catch {
    return false;
  }
}
