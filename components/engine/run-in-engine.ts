/** Asks the engine's worker, which is loaded when it is first needed. */
import type { EngineMessage, EngineTask, EngineTasks } from './engine-task';

interface RunOptions {
  /** ends the computation at once */
  signal?: AbortSignal;
  /** told the share done, 0 to 1 */
  onProgress?: (share: number) => void;
}

/**
 * Performs one task in a worker of its own.
 *
 * @throws DOMException `AbortError` where `signal` aborts; Error where the computation fails or cannot start
 */
export function runInEngine<Kind extends keyof EngineTasks>(
  kind: Kind,
  given: EngineTasks[Kind]['given'],
  { signal, onProgress }: RunOptions = {},
): Promise<EngineTasks[Kind]['answer']> {
  return new Promise((resolve, reject) => {
    if (signal?.aborted) return reject(signal.reason);
    const worker = new Worker(new URL('./engine-worker.ts', import.meta.url));
    const end = () => {
      worker.terminate();
      signal?.removeEventListener('abort', stop);
    };
    const stop = () => {
      end();
      reject(signal?.reason);
    };
    signal?.addEventListener('abort', stop);
    worker.onerror = (event) => {
      end();
      reject(new Error(event.message || 'The computation could not start in this browser.'));
    };
    worker.onmessage = ({ data }: MessageEvent<EngineMessage>) => {
      if (data.kind === 'progress') return onProgress?.(data.share);
      end();
      if (data.kind === 'failed') reject(new Error(data.detail));
      else resolve(data.answer as EngineTasks[Kind]['answer']);
    };
    worker.postMessage({ kind, ...given } as EngineTask);
  });
}
