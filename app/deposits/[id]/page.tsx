import type { Metadata } from 'next';
import { DepositEditor } from '@/components/deposits/deposit-editor';
import { DepositRecord } from '@/components/deposits/deposit-record';
import type { Actor } from '@/lib/auth/actor';
import { actorOfPage } from '@/lib/auth/current-actor';
import { may } from '@/lib/auth/permissions';
import { isEditable } from '@/lib/deposits/states';
import { listSystems } from '@/lib/systems/list-systems';
import { MOST_LIMIT } from '@/schemas/dataset-query';
import { loadRecord, loadRevision } from '../load-record';
import { turnAway } from '../turn-away';

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
  const mayRecall = may(actor, 'recall-deposit', subject);
  return <DepositRecord {...revision} deposit={deposit} files={files} mayRecall={mayRecall} />;
}

/** The listed systems, all pages of them. */
async function systemChoices(actor: Actor): Promise<{ value: string; label: string }[]> {
  const choices: { value: string; label: string }[] = [];
  let cursor: string | null = null;
  do {
    const listed: Awaited<ReturnType<typeof listSystems>> = await listSystems(actor, {
      limit: MOST_LIMIT,
      cursor,
    });
    if (!listed.ok) return choices;
    const { systems, next } = listed.list;
    choices.push(...systems.map(({ slug, name }) => ({ value: slug, label: name })));
    cursor = next === null ? null : new URL(next, 'http://localhost').searchParams.get('cursor');
  } while (cursor !== null);
  return choices;
}
