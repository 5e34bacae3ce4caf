/** One line per request: method, path, status, time. No query, no address, no header. */
import type { IncomingMessage, ServerResponse } from 'node:http';
import { log } from '@/lib/log';

/** Logs the request once its answer is out or its connection gone. */
export function logRequest(request: IncomingMessage, response: ServerResponse): void {
  const started = performance.now();
  const path = (request.url ?? '').replace(/[?#].*$/, '');
  response.once('close', () => {
    const ms = Math.round(performance.now() - started);
    const whole = response.writableFinished;
    log().info({ method: request.method, path, status: response.statusCode, ms, whole }, 'request');
  });
}
