/** What is done again and again beside answering: one chore after the other, at the start and then every minute. */
import { setTimeout as sleep } from 'node:timers/promises';
import { forgetEndedSessions } from '@/lib/auth/session';
import { publishDue } from '@/lib/curation/publish-due';
import { sweepObjects } from '@/lib/deposits/loose-objects';
import { log } from '@/lib/log';
import { forgetExpiredRefits } from '@/lib/refits/forget-refits';
import { forgetGivenUpJobs } from './forget-given-up';

/** Milliseconds between the end of one round and the beginning of the next. */
const PAUSE_MS = 60_000;

const CHORES: Record<string, () => Promise<unknown>> = {
  publishDue,
  sweepObjects,
  forgetEndedSessions,
  forgetExpiredRefits,
  forgetGivenUpJobs,
};

/** Begins with them; `stop` waits for the chore under way. */
export function startChores(pauseMs = PAUSE_MS): { stop: () => Promise<void> } {
  const stopping = new AbortController();
  const done = goRound(stopping.signal, pauseMs);
  return {
    stop: () => {
      stopping.abort();
      return done;
    },
  };
}

async function goRound(signal: AbortSignal, pauseMs: number): Promise<void> {
  while (!signal.aborted) {
    for (const [chore, work] of Object.entries(CHORES)) {
      if (signal.aborted) return;
      // One that fails is tried again at the next round and keeps no other from its turn.
      await work().catch((error: unknown) => log().error({ err: error, chore }, 'a chore failed'));
    }
    await sleep(pauseMs, undefined, { signal, ref: false }).catch(() => undefined);
  }
}
