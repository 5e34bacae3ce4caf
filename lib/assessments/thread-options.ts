/** How the threads of a computing pool are made. */
import path from 'node:path';

/** Heap of one thread: enough for the largest body many times over, and a bound where a document is made to hurt. */
const HEAP_MIB = 1024;

/**
 * Settings of a pool whose threads run a program of `.build`.
 *
 * @param program its name, without `.js`
 * @param maxThreads most threads at once
 * @param maxQueue most calls that wait
 */
export function threadOptions(program: string, maxThreads: number, maxQueue: number) {
  return {
    filename: path.resolve(/* turbopackIgnore: true */ `.build/${program}.js`),
    minThreads: 1,
    maxThreads,
    maxQueue,
    idleTimeout: 30_000,
    // The bundle is plain JavaScript; a loader of the parent process would only slow the start of a thread.
    execArgv: [],
    resourceLimits: { maxOldGenerationSizeMb: HEAP_MIB },
  };
}
