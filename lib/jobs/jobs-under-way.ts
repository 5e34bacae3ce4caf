/** The jobs that this process is at work on, so that it can let go of them when it ends. */

interface UnderWay {
  id: string;
  begunBy: BegunBy;
  stop: AbortController;
  ended: Promise<void>;
}

/** Why a job's work is stopped: another process has it, or it was removed; or this process ends. */
export type StopReason = 'lost' | 'process-ends';

const KEY = Symbol.for('curvekeep.jobs-under-way');
// Next bundles route handlers apart from the server, which must let go of their jobs as well.
const shared = globalThis as typeof globalThis & { [KEY]?: Set<UnderWay> };

/** Whether work on a job was begun by a call, or by the runner that found it due. */
export type BegunBy = 'call' | 'runner';

/** How many of them the runner began. */
export function countJobsOfRunner(): number {
  return [...all()].filter(({ begunBy }) => begunBy === 'runner').length;
}

/** Does `work` on the job of that id as one of them. */
export async function whileUnderWay(
  id: string,
  begunBy: BegunBy,
  work: (stop: AbortController) => Promise<void>,
): Promise<void> {
  const stop = new AbortController();
  const entry = { id, begunBy, stop, ended: work(stop) };
  all().add(entry);
  try {
    await entry.ended;
  } finally {
    all().delete(entry);
  }
}

/** Stops the work on a job that was removed, if it is this process that is at work on it; another finds out by itself. */
export function stopRemovedJob(id: string): void {
  for (const entry of all()) if (entry.id === id) entry.stop.abort('lost' satisfies StopReason);
}

/** Stops them all, since this process ends, and waits until each is let go of. */
export async function stopJobsUnderWay(): Promise<void> {
  const entries = [...all()];
  for (const { stop } of entries) stop.abort('process-ends' satisfies StopReason);
  await Promise.allSettled(entries.map(({ ended }) => ended));
}

function all(): Set<UnderWay> {
  shared[KEY] ??= new Set();
  return shared[KEY];
}
