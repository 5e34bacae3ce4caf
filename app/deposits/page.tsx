import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { DepositList } from '@/components/deposits/deposit-list';
import { NewDraft } from '@/components/deposits/new-draft';
import { actorOfPage } from '@/lib/auth/current-actor';
import { formatAccession } from '@/lib/datasets/accession';
import { listDepositsWithCounts } from '@/lib/deposits/list-deposits-with-counts';
import { publicationOf } from '@/lib/deposits/write-answer';
import { depositStateSchema } from '@/schemas/deposit';
import { DEPOSIT_STATES } from '@/schemas/deposit-states';
import { turnAway } from '../turn-away';
import { systemNames } from './system-choices';

export const metadata: Metadata = { title: 'Deposits', robots: { index: false } };

interface DepositsPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** The deposits of the person’s laboratories. */
export default async function DepositsPage({ searchParams }: DepositsPageProps) {
  const { state: wanted, cursor } = await searchParams;
  const state = depositStateSchema.safeParse(wanted).data;
  const actor = await actorOfPage();
  const place = typeof cursor === 'string' ? cursor : undefined;
  const listed = await listDepositsWithCounts({ actor, state, cursor: place });
  // A place in the list that is none (any more): the list from its beginning.
  if (!listed.ok && listed.failure.code === 'bad-parameter') redirect('/deposits');
  if (!listed.ok) return turnAway(listed.failure, '/deposits');
  const nameOf = await systemNames(actor);
  const labs = actor.kind === 'person' ? actor.memberships : [];
  return (
    <DepositList
      deposits={listed.deposits.map(({ accession, ...deposit }) => ({
        ...deposit,
        system: nameOf(deposit.system),
        accession: accession === null ? null : formatAccession(accession),
        publication: publicationOf(deposit),
      }))}
      state={state ?? null}
      states={DEPOSIT_STATES}
      severalLabs={labs.length > 1}
      next={listed.next === null ? null : addressOf(state, listed.next)}
      begin={
        <NewDraft
          labs={labs.map(({ labSlug, labName }) => ({ slug: labSlug, name: labName }))}
          person={actor.kind === 'person' ? actor.name : ''}
        />
      }
    />
  );
}

function addressOf(state: string | undefined, cursor: string): string {
  return `/deposits?${new URLSearchParams({ ...(state ? { state } : {}), cursor })}`;
}
