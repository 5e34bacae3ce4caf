/** What runs in a worker thread of the assessment pool. Bundled to `.build/assessment-worker.js`. */
import { move, transferableSymbol, valueSymbol } from 'piscina';
import { assessBody, type BodyAnswer } from './assess-body';

export type WorkerTask =
  | { kind: 'ping' }
  | { kind: 'assess'; bytes: Uint8Array<ArrayBuffer>; pointsBudget: number };

export type WorkerAnswer = { kind: 'pong' } | BodyAnswer;

/** Carries out one task; the bytes of the answer change hands without being copied. */
export default function work(task: WorkerTask): unknown {
  if (task.kind === 'ping') return { kind: 'pong' } satisfies WorkerAnswer;
  const answer = assessBody(task.bytes, task.pointsBudget);
  if (!('body' in answer)) return answer;
  return move({
    get [transferableSymbol]() {
      return [answer.body.buffer];
    },
    get [valueSymbol]() {
      return answer;
    },
  });
}
