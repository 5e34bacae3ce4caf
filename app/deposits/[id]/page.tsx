import type { Metadata } from 'next';
import { DepositEditor } from '@/components/deposits/deposit-editor';
import { DepositRecord } from '@/components/deposits/deposit-record';
import { actorOfPage } from '@/lib/auth/current-actor';
import { may } from '@/lib/auth/permissions';
import { loadRecord, loadRevision } from '@/lib/deposits/load-record';
import { isEditable } from '@/lib/deposits/states';
import { turnAway } from '../../turn-away';
import { systemChoices } from '../system-choices';

export const metadata: Metadata = { title: 'Deposit', robots: { index: false } };

/** One deposit of the person’s laboratory: to be changed while it is a draft, to be read in every other state. */
export default async function DepositPage({ params }: { params: Promise<{ id: string }> }) {
  const { id } = await params;
  const actor = await actorOfPage();
  const loaded = await loadRecord(actor, id);
  if (!loaded.ok) return turnAway(loaded.failure, `/deposits/${id}`);
  const { labId, deposit, text, files } = loaded;
  const subject = { labId, state: deposit.state };
  if (isEditable(deposit.state) && may(actor, 'edit-deposit', subject)) {
    return (
      <DepositEditor
        key={`${id} ${deposit.state}`}
        deposit={deposit}
        text={text}
        files={files}
        systems={await systemChoices(actor)}
      />
    );
  }
  const revision = await loadRevision(actor, loaded);
  if (!revision.ok) return turnAway(revision.failure, `/deposits/${id}`);
  return (
    <DepositRecord
      {...revision}
      deposit={deposit}
      files={files}
      mayRecall={may(actor, 'recall-deposit', subject)}
      text={deposit.state === 'declined' && may(actor, 'create-deposit', { labId }) ? text : null}
    />
  );
}
