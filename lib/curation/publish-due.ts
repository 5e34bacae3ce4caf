/** The chore that publishes accepted deposits once their day has begun. */
import { readDatabase, write } from '@/db/client';
import { selectAwaitingDay } from '@/db/queries/deposits';
import { SYSTEM } from '@/lib/auth/actor';
import { encodeNewest, publishAccepted } from './publish-accepted';
import { startOfDay } from './start-of-day';

/**
 * Publishes what is due. Of two processes that try the same, one does.
 *
 * @param now Unix time, ms
 * @returns how many it published
 */
export async function publishDue(now = Date.now()): Promise<number> {
  const waiting = await selectAwaitingDay(await readDatabase());
  const due = waiting.filter(
    ({ publishOn, publishZone }) => publishOn === null || startOfDay(publishOn, publishZone ?? 'UTC') <= now,
  );
  let published = 0;
  for (const { id } of due) {
    const encoded = await encodeNewest(id);
    const outcome = await write('acknowledged', (tx) =>
      publishAccepted(tx, { actor: SYSTEM, id, encoded, now }),
    );
    if (outcome.ok) published += 1;
  }
  return published;
}
