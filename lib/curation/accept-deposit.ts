/** The verb by which a curator accepts a deposit, which is published at once or waits for its day. */
import { readDatabase, type Transaction, write } from '@/db/client';
import { insertDecision } from '@/db/queries/decisions';
import { type DepositHead, selectDeposit, updateState } from '@/db/queries/deposits';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import { actorKey } from '@/lib/auth/actor';
import type { EncodedDataset } from '@/lib/datasets/encode-dataset';
import { auditSubject, reachDeposit } from '@/lib/deposits/reach-deposit';
import { failed, type Outcome } from '@/lib/errors';
import { earlierOutcome, idempotencyOf, once } from '@/lib/serving/idempotency';
import type { PublicationDay } from '@/schemas/deposit';
import { encodeNewest, publishAccepted } from './publish-accepted';
import { type DecisionCall, letterRefusal, reachDecidable } from './reach-decidable';
import { startOfDay } from './start-of-day';

export type AcceptCall = Omit<DecisionCall, 'letter'> & {
  letter?: string;
  /** when it is published; left out: at once */
  publication?: PublicationDay;
  /** Unix time, ms; for the demonstration, whose datasets were published over a year */
  now?: number;
};

/** `accession` is null where publication waits for its day. */
type Accepted = Outcome<{ deposit: DepositHead; accession: number | null }>;

/** Accepts the newest revision and publishes it, now or on its day. */
export function acceptDeposit(given: AcceptCall): Promise<Accepted> {
  const call = { letter: '', now: Date.now(), ...given };
  const { actor, id, letter, publication, idempotencyKey = null } = call;
  return auditingRefusals({ actor, action: 'decide-deposit', subject: auditSubject(id) }, async () => {
    const database = await readDatabase();
    const reached = await reachDeposit(database, actor, 'decide-deposit', id);
    if (!reached.ok) return reached;
    const refusal = letterRefusal(letter, null) ?? dayRefusal(publication, call.now);
    if (refusal !== null) return refusal;
    const body = [
      ...['accepted', letter, String(given.revision ?? '')],
      ...(publication ? [publication.day, publication.timeZone] : []),
    ];
    const idempotency = idempotencyOf(actor, `decide ${id}`, idempotencyKey, ...body);
    const earlier = await earlierOutcome<Extract<Accepted, { ok: true }>>(database, idempotency);
    if (earlier !== null) return earlier;
    const decidable = await reachDecidable(database, call);
    if (!decidable.ok) return decidable;
    // Encoded before the transaction, so that the one writer is not held up by arithmetic.
    const encoded = publication === undefined ? await encodeNewest(id) : null;
    const seen = { ...call, revision: decidable.revision };
    return write('acknowledged', (tx) => once(tx, idempotency, () => accept(tx, seen, encoded)));
  });
}

/** The failure where publication would wait for a day that has begun already. */
function dayRefusal(publication: PublicationDay | undefined, now: number) {
  if (publication === undefined || startOfDay(publication.day, publication.timeZone) > now) return null;
  const errors = [{ pointer: '/publication/day', detail: 'must be a day to come' }];
  return failed('invalid-input', undefined, { errors });
}

async function accept(
  tx: Transaction,
  call: DecisionCall & { publication?: PublicationDay; now: number },
  encoded: EncodedDataset | null,
): Promise<Accepted> {
  const reached = await reachDecidable(tx, call);
  if (!reached.ok) return reached;
  const { actor, id, letter, publication = null, now } = call;
  const { deposit, revision } = reached;
  const { version, state: from } = deposit;
  const decidedBy = actorKey(actor);
  const day = { publishOn: publication?.day ?? null, publishZone: publication?.timeZone ?? null };
  const to = { state: 'accepted', updatedAt: now, updatedBy: decidedBy, ...day } as const;
  if (!(await updateState(tx, { id, version, from }, to))) return failed('conflict');
  const decision = { depositId: id, revision, kind: 'accepted', letter, decidedBy } as const;
  await insertDecision(tx, { ...decision, decidedAt: now });
  const detail = `revision ${revision}${publication === null ? '' : `, to be published on ${publication.day}`}`;
  await recordAudit(tx, { actor, action: 'accepted', subject: auditSubject(id), detail });
  if (encoded !== null) return publishAccepted(tx, { actor, id, encoded, now });
  const accepted = await selectDeposit(tx, id);
  return accepted === undefined ? failed('not-found') : { ok: true, deposit: accepted, accession: null };
}
