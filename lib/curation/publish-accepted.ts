/** Publishes what was accepted: gives it its accession and writes it as browsing reads it, in one transaction. */
import { readDatabase, type Transaction } from '@/db/client';
import { type DepositHead, nextAccession, selectDeposit, updateState } from '@/db/queries/deposits';
import { markPublished, newestRevisionNumber, selectNewestRevision } from '@/db/queries/revisions';
import { recordAudit } from '@/lib/audit/record';
import { type Actor, actorKey } from '@/lib/auth/actor';
import { formatAccession } from '@/lib/datasets/accession';
import { type EncodedDataset, encodeDataset } from '@/lib/datasets/encode-dataset';
import { publishDataset } from '@/lib/datasets/publish-dataset';
import { withoutMark } from '@/lib/deposits/judge-draft';
import { auditSubject } from '@/lib/deposits/reach-deposit';
import type { Assessment } from '@/lib/engine/assessment';
import { failed, type Outcome } from '@/lib/errors';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';

export interface PublishCall {
  actor: Actor;
  id: string;
  /** what `encodeNewest` gave; an accepted deposit does not change any more */
  encoded: EncodedDataset;
  /** Unix time, ms */
  now: number;
}

/** The newest revision of a deposit in the form that browsing reads. */
export async function encodeNewest(id: string): Promise<EncodedDataset> {
  const revision = await selectNewestRevision(await readDatabase(), id);
  if (revision === undefined) throw new Error('A submitted deposit has no revision.');
  // Both were checked and written by this application at submission and never change.
  const document = JSON.parse(withoutMark(revision.document)) as DatasetDocument;
  return encodeDataset(document, JSON.parse(revision.assessment) as Assessment);
}

/** Publishes the newest revision of an accepted deposit; a conflict where it is not accepted (any more). */
export async function publishAccepted(
  tx: Transaction,
  { actor, id, encoded, now }: PublishCall,
): Promise<Outcome<{ deposit: DepositHead; accession: number }>> {
  const deposit = await selectDeposit(tx, id);
  if (deposit === undefined) return failed('not-found');
  const { labId, version } = deposit;
  const accession = deposit.accession ?? (await nextAccession(tx));
  const accepted = { id, version, from: 'accepted' } as const;
  const to = { state: 'published', updatedAt: now, updatedBy: actorKey(actor), accession } as const;
  if (!(await updateState(tx, accepted, to))) return failed('conflict');
  const revision = await newestRevisionNumber(tx, id);
  await markPublished(tx, id, revision, now);
  await publishDataset(tx, { accession, depositId: id, labId, revision, publishedAt: now, encoded });
  const detail = formatAccession(accession, revision);
  await recordAudit(tx, { actor, action: 'published', subject: auditSubject(id), detail });
  const published = await selectDeposit(tx, id);
  return published === undefined ? failed('not-found') : { ok: true, deposit: published, accession };
}
