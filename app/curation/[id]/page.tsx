import type { Metadata } from 'next';
import { Review } from '@/components/curation/review';
import { actorOfPage } from '@/lib/auth/current-actor';
import { decide, may } from '@/lib/auth/permissions';
import { refusal } from '@/lib/auth/refusal';
import { loadRecord, loadRevision } from '../../deposits/load-record';
import { turnAway } from '../../deposits/turn-away';

export const metadata: Metadata = { title: 'Review', robots: { index: false } };

/** One submission under review: what it amounts to, and the decision. */
export default async function ReviewPage({ params }: { params: Promise<{ id: string }> }) {
  const { id } = await params;
  const path = `/curation/${id}`;
  const actor = await actorOfPage();
  const decision = decide(actor, 'see-queue');
  if (decision !== 'allowed') return turnAway(refusal(decision), path);
  const loaded = await loadRecord(actor, id);
  if (!loaded.ok) return turnAway(loaded.failure, path);
  const revision = await loadRevision(actor, loaded);
  if (!revision.ok) return turnAway(revision.failure, path);
  const { labId, deposit, files } = loaded;
  const mayDecide = may(actor, 'decide-deposit', { labId, state: deposit.state });
  return <Review {...revision} deposit={deposit} files={files} mayDecide={mayDecide} />;
}
