import type { Metadata } from 'next';
import { QueueTable } from '@/components/curation/queue-table';
import { actorOfPage } from '@/lib/auth/current-actor';
import { listQueue } from '@/lib/curation/list-queue';
import { systemNames } from '../deposits/system-choices';
import { turnAway } from '../turn-away';

export const metadata: Metadata = { title: 'Curation', robots: { index: false } };

/** What waits for a curator. */
export default async function CurationPage() {
  const actor = await actorOfPage();
  const listed = await listQueue({ actor });
  if (!listed.ok) return turnAway(listed.failure, '/curation');
  const nameOf = await systemNames(actor);
  return (
    <QueueTable queue={listed.queue.map((deposit) => ({ ...deposit, system: nameOf(deposit.system) }))} />
  );
}
