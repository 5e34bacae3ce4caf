import type { Metadata } from 'next';
import { Review } from '@/components/curation/review';
import { actorOfPage } from '@/lib/auth/current-actor';
import { may } from '@/lib/auth/permissions';
import { seeQueue } from '@/lib/curation/see-queue';
import { loadRecord, loadRevision } from '@/lib/deposits/load-record';
import { auditSubject } from '@/lib/deposits/reach-deposit';
import { turnAway } from '../../turn-away';

export const metadata: Metadata = { title: 'Review', robots: { index: false } };

/** One submission under review: what it amounts to, and the decision. */
export default async function ReviewPage({ params }: { params: Promise<{ id: string }> }) {
  const { id } = await params;
  const path = `/curation/${id}`;
  const actor = await actorOfPage();
  const seen = await seeQueue(actor, auditSubject(id));
  if (!seen.ok) return turnAway(seen.failure, path);
  const loaded = await loadRecord(actor, id);
  if (!loaded.ok) return turnAway(loaded.failure, path);
  const revision = await loadRevision(actor, loaded);
  if (!revision.ok) return turnAway(revision.failure, path);
  const { labId, deposit, files } = loaded;
  const mayDecide = may(actor, 'decide-deposit', { labId, state: deposit.state });
  return <Review {...revision} deposit={deposit} files={files} mayDecide={mayDecide} />;
}
