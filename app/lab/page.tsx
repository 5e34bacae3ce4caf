import type { Metadata } from 'next';
import { LabColumns } from '@/components/lab/lab-columns';
import { DeadEnd } from '@/components/layout/dead-end';
import { ActionLink } from '@/components/ui/action-link';
import { actorOfPage } from '@/lib/auth/current-actor';
import { listOwnLabs } from '@/lib/labs/list-own-labs';
import { answerWithStatus } from '@/lib/serving/late-answer';
import { turnAway } from '../turn-away';
import { createTokenAction } from './create-token-action';
import { revokeTokenAction } from './revoke-token-action';

export const metadata: Metadata = { title: 'Laboratory', robots: { index: false } };

/** The person's laboratories from within; for an administrator all of them. */
export default async function LabPage() {
  const actor = await actorOfPage();
  const listed = await listOwnLabs(actor);
  if (!listed.ok && listed.failure.code !== 'forbidden') return turnAway(listed.failure, '/lab');
  if (!listed.ok) answerWithStatus(403);
  if (!listed.ok || listed.labs.length === 0) return <NoLaboratory />;
  const alone = listed.labs.length === 1;
  return (
    <div className="page-width flex grow flex-col">
      {alone ? null : <h1 className="head border-hairline border-b py-6 text-3xl">Laboratories</h1>}
      {listed.labs.map((lab, i) => (
        <LabColumns
          key={lab.id}
          lab={lab}
          alone={alone}
          explained={i === 0}
          createToken={createTokenAction}
          revokeToken={revokeTokenAction}
        />
      ))}
    </div>
  );
}

function NoLaboratory() {
  return (
    <DeadEnd
      title="You belong to no laboratory"
      ways={
        <ActionLink href="/check" prefetch={false}>
          Check data
        </ActionLink>
      }
    >
      <p>Laboratories deposit, and a laboratory’s manager takes in its members. Ask yours to add you.</p>
    </DeadEnd>
  );
}
