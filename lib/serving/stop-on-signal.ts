/** SIGTERM, SIGINT and the end of npm: take nothing new, finish what is under way, close, and end with 0. */
import type { Server } from 'node:http';
import { env } from '@/lib/env';
import { log } from '@/lib/log';

/** Longest wait for what is under way: a body may take a minute, its computation half of one. */
const MOST_MS = 100_000;

/** How often connections that became idle are closed while the last answers go out. */
const SWEEP_MS = 50;

/** Read as early as can be: a parent that ends while the server is still starting counts as well. */
const PARENT = process.ppid;

/** How often it is looked whether the parent process is still there. */
const ORPHAN_CHECK_MS = 500;

/**
 * Stops the server in order at the first signal, at once at the second.
 *
 * @param close what is closed after the last answer
 */
export function stopOnSignal(server: Server, close: () => Promise<void>): void {
  let stopping = false;
  const stop = async () => {
    if (stopping) process.exit(1);
    stopping = true;
    log().info('stopping');
    await finishAnswers(server);
    await close();
    log().info('stopped');
    process.exit(0);
  };
  for (const signal of ['SIGTERM', 'SIGINT'] as const) {
    process.on(signal, () => {
      stop().catch((error: unknown) => {
        log().error({ err: error }, 'stopping failed');
        process.exit(1);
      });
    });
  }
  if (env().startedByNpm) onceOrphaned(() => process.kill(process.pid, 'SIGTERM'));
}

/**
 * Calls `then` once the parent process is gone. npm hands no signal on to what it runs, so that a server whose npm was
 * ended would live on unseen and keep its port.
 */
export function onceOrphaned(then: () => void): void {
  const watch = setInterval(() => {
    if (process.ppid === PARENT) return;
    clearInterval(watch);
    then();
  }, ORPHAN_CHECK_MS);
  watch.unref();
}

function finishAnswers(server: Server): Promise<void> {
  return new Promise((resolve) => {
    const sweep = setInterval(() => server.closeIdleConnections(), SWEEP_MS);
    const giveUp = setTimeout(() => server.closeAllConnections(), MOST_MS);
    server.close(() => {
      clearInterval(sweep);
      clearTimeout(giveUp);
      resolve();
    });
  });
}
