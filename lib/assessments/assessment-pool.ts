/** The worker threads that compute, one pool a process, started when first needed. */
import { availableParallelism } from 'node:os';
import { Piscina } from 'piscina';
import type { BodyAnswer } from './assess-body';
import type { WorkerAnswer, WorkerTask } from './assessment-worker';
import { threadOptions } from './thread-options';

/** One core stays free for the thread that answers pages; more than eight threads would only crowd the memory. */
const THREADS = Math.min(8, Math.max(1, availableParallelism() - 1));

/** How many calls may wait. A waiting call holds up to 8 MiB, so that this bounds the memory as well. */
const MOST_WAITING = 32;

/** Longest time from handing a document over to its answer, waiting included. */
const MOST_MS = 30_000;

/** Longest time that a sign of life may take. */
const PING_MS = 3_000;

export type ComputationOutcome =
  | BodyAnswer
  | { kind: 'busy' }
  | { kind: 'took-too-long' }
  | { kind: 'aborted' };

type Pool = Piscina<WorkerTask, WorkerAnswer>;

const KEY = Symbol.for('curvekeep.assessment-pool');
// Next bundles route handlers apart from the server, which must close the same pool.
const shared = globalThis as typeof globalThis & { [KEY]?: Pool };

/**
 * Computes the document in `bytes` in a worker thread. `bytes` changes hands and is empty afterwards.
 *
 * @param signal of the caller: where it aborts, the computation stops
 * @param mostMs longest time that it may take
 */
export async function computeInPool(
  bytes: Uint8Array<ArrayBuffer>,
  pointsBudget: number,
  signal: AbortSignal,
  mostMs = MOST_MS,
): Promise<ComputationOutcome> {
  if (pool().queueSize >= MOST_WAITING) return { kind: 'busy' };
  const timeout = AbortSignal.timeout(mostMs);
  try {
    const task: WorkerTask = { kind: 'assess', bytes, pointsBudget };
    const options = { transferList: [bytes.buffer], signal: AbortSignal.any([signal, timeout]) };
    const answer = await pool().run(task, options);
    if (answer.kind === 'pong') throw new Error('A worker answered a document with a sign of life.');
    return answer;
  } catch (error) {
    if (signal.aborted) return { kind: 'aborted' };
    if (timeout.aborted) return { kind: 'took-too-long' };
    throw error;
  }
}

/** Whether computation works; `busy` where calls are waiting, which is no fault. */
export async function probeComputation(): Promise<'ok' | 'busy' | 'unavailable'> {
  if (pool().queueSize > 0) return 'busy';
  try {
    await pool().run({ kind: 'ping' }, { signal: AbortSignal.timeout(PING_MS) });
    return 'ok';
  } catch {
    return pool().queueSize > 0 || pool().utilization > 0.5 ? 'busy' : 'unavailable';
  }
}

/** Lets what is under way finish and ends the threads. */
export async function closeAssessmentPool(): Promise<void> {
  const closing = shared[KEY];
  delete shared[KEY];
  await closing?.close();
}

function pool(): Pool {
  shared[KEY] ??= new Piscina<WorkerTask, WorkerAnswer>(
    threadOptions('assessment-worker', THREADS, MOST_WAITING),
  );
  return shared[KEY];
}
