/**
 * The worker threads that refit, one pool a process, started when first needed. A pool of their own: a refit may take
 * a minute, which no assessment is to wait for.
 */
import { availableParallelism } from 'node:os';
import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import { threadOptions } from '@/lib/assessments/thread-options';
import type { RefitAnswer } from './refit-body';
import type { RefitTask } from './refit-worker';

/** Half of the cores are left to pages and assessments. */
const THREADS = Math.min(4, Math.max(1, Math.floor(availableParallelism() / 2)));

/** How many calls may wait. A waiting call holds up to 8 MiB, so that this bounds the memory as well. */
const MOST_WAITING = 16;

/** Longest time that a refit may take from when it begins. */
export const MOST_REFIT_MS = 60_000;

export type RefitComputation =
  | ({ kind: 'answered' } & RefitAnswer)
  | { kind: 'busy' }
  | { kind: 'took-too-long' }
  | { kind: 'aborted' };

type Pool = Piscina<RefitTask, RefitAnswer>;

const KEY = Symbol.for('curvekeep.refit-pool');
// Next bundles route handlers apart from the server, which must close the same pool.
const shared = globalThis as typeof globalThis & { [KEY]?: Pool };

/**
 * Carries out the refit that `bytes` ask for. `bytes` changes hands and is empty afterwards.
 *
 * @param onProgress told how far it is, 0 to 1
 * @param signal where it aborts, the computation stops
 */
export async function refitInPool(
  bytes: Uint8Array<ArrayBuffer>,
  onProgress: (progress: number) => void,
  signal: AbortSignal,
  mostMs = MOST_REFIT_MS,
): Promise<RefitComputation> {
  if (pool().queueSize >= MOST_WAITING) return { kind: 'busy' };
  const late = new AbortController();
  const { port1, port2 } = new MessageChannel();
  let timer: NodeJS.Timeout | undefined;
  port1.on('message', (progress: number) => {
    // The first message says that it begins: what it waited before does not count.
    timer ??= setTimeout(() => late.abort(), mostMs);
    onProgress(progress);
  });
  try {
    const options = { transferList: [bytes.buffer, port2], signal: AbortSignal.any([signal, late.signal]) };
    return { kind: 'answered', ...(await pool().run({ bytes, port: port2 }, options)) };
  } catch (error) {
    if (signal.aborted) return { kind: 'aborted' };
    if (late.signal.aborted) return { kind: 'took-too-long' };
    throw error;
  } finally {
    clearTimeout(timer);
    port1.close();
  }
}

/** Lets what is under way finish and ends the threads. */
export async function closeRefitPool(): Promise<void> {
  const closing = shared[KEY];
  delete shared[KEY];
  await closing?.close();
}

function pool(): Pool {
  shared[KEY] ??= new Piscina<RefitTask, RefitAnswer>(threadOptions('refit-worker', THREADS, MOST_WAITING));
  return shared[KEY];
}
