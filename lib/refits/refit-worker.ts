/** What runs in a worker thread of the refit pool. Bundled to `.build/refit-worker.js`. */
import type { MessagePort } from 'node:worker_threads';
import { move, transferableSymbol, valueSymbol } from 'piscina';
import { refitBody } from './refit-body';

export interface RefitTask {
  bytes: Uint8Array<ArrayBuffer>;
  /** takes how far the refit is, 0 to 1: at once when it begins, and now and then afterwards */
  port: MessagePort;
}

/** Milliseconds between two messages. */
const REPORT_MS = 100;

/** Carries out one task; the bytes of the answer change hands without being copied. */
export default function work({ bytes, port }: RefitTask): unknown {
  let lastMs = performance.now();
  port.postMessage(0);
  const answer = refitBody(bytes, ({ progress }) => {
    const now = performance.now();
    if (now - lastMs < REPORT_MS) return;
    lastMs = now;
    port.postMessage(progress);
  });
  port.close();
  return move({
    get [transferableSymbol]() {
      return [answer.body.buffer];
    },
    get [valueSymbol]() {
      return answer;
    },
  });
}
