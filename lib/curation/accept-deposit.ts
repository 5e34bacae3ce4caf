/** The verb by which a curator accepts a deposit, which is published at once: one transaction, one accession. */
import { readDatabase, type Transaction, write } from '@/db/client';
import { insertDecision } from '@/db/queries/decisions';
import { type DepositHead, nextAccession, selectDeposit, updateState } from '@/db/queries/deposits';
import { markPublished, selectNewestRevision } from '@/db/queries/revisions';
import { recordAudit } from '@/lib/audit/record';
import { actorKey } from '@/lib/auth/actor';
import { formatAccession } from '@/lib/datasets/accession';
import { type EncodedDataset, encodeDataset } from '@/lib/datasets/encode-dataset';
import { publishDataset } from '@/lib/datasets/publish-dataset';
import { withoutMark } from '@/lib/deposits/judge-draft';
import { auditingRefusals, auditSubject, reachDeposit } from '@/lib/deposits/reach-deposit';
import type { Assessment } from '@/lib/engine/assessment';
import { failed, type Outcome } from '@/lib/errors';
import { earlierOutcome, idempotencyOf, once } from '@/lib/serving/idempotency';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { type DecisionCall, letterRefusal, reachDecidable } from './reach-decidable';

export type AcceptCall = Omit<DecisionCall, 'letter'> & {
  letter?: string;
  /** Unix time, ms; for the demonstration, whose datasets were published over a year */
  now?: number;
};

type Published = { deposit: DepositHead; accession: number };

/** Accepts the newest revision and publishes it. */
export function acceptDeposit(given: AcceptCall): Promise<Outcome<Published>> {
  const call = { letter: '', ...given };
  const { actor, id, letter, idempotencyKey = null } = call;
  return auditingRefusals({ actor, action: 'decide-deposit', subject: auditSubject(id) }, async () => {
    const database = await readDatabase();
    const reached = await reachDeposit(database, actor, 'decide-deposit', id);
    if (!reached.ok) return reached;
    const refusal = letterRefusal(letter, false);
    if (refusal !== null) return refusal;
    const idempotency = idempotencyOf(actor, `decide ${id}`, idempotencyKey, 'accepted', letter);
    const earlier = await earlierOutcome<Published>(database, idempotency);
    if (earlier !== null) return earlier;
    const decidable = await reachDecidable(database, call);
    if (!decidable.ok) return decidable;
    // Encoded before the transaction, so that the one writer is not held up by arithmetic.
    const encoded = await encodeNewest(id);
    const seen = { ...call, revision: decidable.revision };
    return write('acknowledged', (tx) => once(tx, idempotency, () => acceptAndPublish(tx, seen, encoded)));
  });
}

async function encodeNewest(id: string): Promise<EncodedDataset> {
  const revision = await selectNewestRevision(await readDatabase(), id);
  if (revision === undefined) throw new Error('A submitted deposit has no revision.');
  // Both were checked and written by this application at submission and never change.
  const document = JSON.parse(withoutMark(revision.document)) as DatasetDocument;
  return encodeDataset(document, JSON.parse(revision.assessment) as Assessment);
}

async function acceptAndPublish(
  tx: Transaction,
  call: DecisionCall & { now?: number },
  encoded: EncodedDataset,
): Promise<Outcome<Published>> {
  const reached = await reachDecidable(tx, call);
  if (!reached.ok) return reached;
  const { actor, id, letter, now = Date.now() } = call;
  const { deposit, revision } = reached;
  const { labId, version, state: from } = deposit;
  if (!(await updateState(tx, { id, version, from }, { state: 'accepted', updatedAt: now }))) {
    return failed('conflict');
  }
  const decision = { depositId: id, revision, kind: 'accepted', letter, decidedBy: actorKey(actor) } as const;
  await insertDecision(tx, { ...decision, decidedAt: now });
  const subject = auditSubject(id);
  await recordAudit(tx, { actor, action: 'accepted', subject, detail: `revision ${revision}` });
  const accession = deposit.accession ?? (await nextAccession(tx));
  const accepted = { id, version: version + 1, from: 'accepted' } as const;
  if (!(await updateState(tx, accepted, { state: 'published', updatedAt: now, accession }))) {
    throw new Error('An accepted deposit changed under a write.');
  }
  await markPublished(tx, id, revision, now);
  await publishDataset(tx, { accession, depositId: id, labId, revision, publishedAt: now, encoded });
  await recordAudit(tx, {
    actor,
    action: 'published',
    subject,
    detail: formatAccession(accession, revision),
  });
  const published = await selectDeposit(tx, id);
  return published === undefined ? failed('not-found') : { ok: true, deposit: published, accession };
}
