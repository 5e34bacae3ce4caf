import type { Metadata } from 'next';
import { QueueTable } from '@/components/curation/queue-table';
import { actorOfPage } from '@/lib/auth/current-actor';
import { listQueue } from '@/lib/curation/list-queue';
import { turnAway } from '../deposits/turn-away';

export const metadata: Metadata = { title: 'Curation', robots: { index: false } };

/** What waits for a curator. */
export default async function CurationPage() {
  const listed = await listQueue({ actor: await actorOfPage() });
  return listed.ok ? <QueueTable queue={listed.queue} /> : turnAway(listed.failure, '/curation');
}
