import type { Metadata } from 'next';
import { CheckWorkspace } from '@/components/check/check-workspace';
import { VISITOR } from '@/lib/auth/actor';
import { actorOfPage } from '@/lib/auth/current-actor';
import { may } from '@/lib/auth/permissions';

export const metadata: Metadata = {
  title: 'Check data',
  description:
    'Paste or drop a dataset with its stated parameters and see every point’s free-energy coordinate, the master curve, and what misses it.',
};

/** Paste or drop a document or a table, see its assessment; nothing is stored, nobody signs in. */
export default async function CheckPage() {
  return <CheckWorkspace labs={await depositingLabs()} />;
}

/** The laboratories that the reader may keep a draft for. Without the database nobody is known, and data are checked. */
async function depositingLabs(): Promise<{ slug: string; name: string }[]> {
  const actor = await actorOfPage().catch(() => VISITOR);
  if (actor.kind !== 'person') return [];
  return actor.memberships
    .filter(({ labId }) => may(actor, 'create-deposit', { labId }))
    .map(({ labSlug, labName }) => ({ slug: labSlug, name: labName }));
}
