/** The verb that hands a deposit to the curators: validate, assess, snapshot a revision, queue. */
import { createHash } from 'node:crypto';
import { readDatabase, type Transaction, write } from '@/db/client';
import {
  type DepositHead,
  isListedSystem,
  type Reader,
  selectDeposit,
  selectDraft,
  updateState,
} from '@/db/queries/deposits';
import { insertRevision, newestRevisionNumber } from '@/db/queries/revisions';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import { type Actor, actorKey } from '@/lib/auth/actor';
import { failed, type Outcome } from '@/lib/errors';
import { earlierOutcome, idempotencyOf, once } from '@/lib/serving/idempotency';
import { type ExpectedVersions, versionRefusal } from '@/lib/serving/if-match';
import { type AssessedDocument, assessForDeposit } from './assess-for-deposit';
import { auditSubject, reachDeposit } from './reach-deposit';
import { isEditable, stateWords } from './states';
import { withUnlistedSystem } from './unlisted-system';
import { versionFailure } from './version-failure';

export interface Submission {
  actor: Actor;
  id: string;
  /** where given: the version that the actor has before them; null or left out: whatever it is */
  expected?: ExpectedVersions;
  idempotencyKey?: string | null;
  signal?: AbortSignal;
}

type Submitted = { deposit: DepositHead; revision: number };

/** Submits the document as it stands. All that is wrong comes at once. */
export function submitDeposit(call: Submission): Promise<Outcome<Submitted>> {
  const refusal = { actor: call.actor, action: 'submit-deposit', subject: auditSubject(call.id) } as const;
  return auditingRefusals(refusal, () => assessAndSubmit(call));
}

async function assessAndSubmit(call: Submission): Promise<Outcome<Submitted>> {
  const { actor, id, idempotencyKey = null, signal = new AbortController().signal } = call;
  const database = await readDatabase();
  const reached = await reachDeposit(database, actor, 'submit-deposit', id);
  if (!reached.ok) return reached;
  const seen = JSON.stringify(call.expected ?? null);
  const idempotency = idempotencyOf(actor, `submit-deposit ${id}`, idempotencyKey, seen);
  const earlier = await earlierOutcome<Submitted>(database, idempotency);
  if (earlier !== null) return stillSubmitted(earlier, reached.deposit);
  const ready = await readyToSubmit(database, call);
  if (!ready.ok) return ready;
  const draft = await selectDraft(database, id);
  if (draft === undefined) return failed('not-found');
  const assessed = await assessForDeposit(draft.document, signal);
  const checked = await withSystemChecked(database, assessed, ready.deposit.system);
  if (!checked.ok) return checked;
  return write('acknowledged', (tx) =>
    once(tx, idempotency, () => snapshot(tx, call, { ...checked, ...draft })),
  );
}

/** What the key did is told again, but not that it is submitted of what has come back to the laboratory since. */
function stillSubmitted(earlier: Outcome<Submitted>, { state }: DepositHead): Outcome<Submitted> {
  if (!earlier.ok || !isEditable(state)) return earlier;
  const detail = `This key submitted revision ${earlier.revision}, which has come back since; take a new key to submit again.`;
  return failed('idempotency-mismatch', detail);
}

async function readyToSubmit(
  reader: Reader,
  { actor, id, expected = null }: Submission,
): Promise<Outcome<{ deposit: DepositHead }>> {
  const reached = await reachDeposit(reader, actor, 'submit-deposit', id);
  if (!reached.ok) return reached;
  const { state, version } = reached.deposit;
  if (!isEditable(state)) {
    return failed('conflict', `The deposit is ${stateWords(state)}; only a draft can be submitted.`);
  }
  const refusal = expected === null ? null : versionRefusal(expected, version);
  return refusal === null ? reached : versionFailure(refusal, reached.deposit);
}

/** Adds to what is wrong that the system is not listed, where it is not. */
async function withSystemChecked(
  reader: Reader,
  assessed: Outcome<AssessedDocument>,
  slug: string,
): Promise<Outcome<AssessedDocument>> {
  if (!assessed.ok && assessed.failure.code !== 'invalid-document') return assessed;
  const known = assessed.ok ? [] : (assessed.failure.members?.errors ?? []);
  const errors = await withUnlistedSystem(reader, { system: slug }, known);
  if (errors.length === known.length) return assessed;
  const detail =
    errors.length === 1
      ? 'One thing is wrong in the document.'
      : `${errors.length} things are wrong in the document.`;
  return failed('invalid-document', detail, { errors });
}

async function snapshot(
  tx: Transaction,
  call: Submission,
  assessed: AssessedDocument & { document: string; version: number },
): Promise<Outcome<Submitted>> {
  const ready = await readyToSubmit(tx, call);
  if (!ready.ok) return ready;
  const { actor, id } = call;
  const { state: from, version, title, system } = ready.deposit;
  const { document, assessment, summary, engine, policy } = assessed;
  if (version !== assessed.version || !(await isListedSystem(tx, system))) {
    return failed('conflict', 'The document was changed while it was being assessed; submit it again.');
  }
  const now = Date.now();
  const number = (await newestRevisionNumber(tx, id)) + 1;
  const to = { state: 'submitted', updatedAt: now, updatedBy: actorKey(actor) } as const;
  if (!(await updateState(tx, { id, version, from }, to))) return failed('conflict');
  await insertRevision(tx, {
    depositId: id,
    number,
    title,
    system,
    document,
    sha256: createHash('sha256').update(document).digest('hex'),
    assessment,
    summary,
    engine,
    policy,
    submittedBy: actorKey(actor),
    submittedAt: now,
  });
  await recordAudit(tx, {
    actor,
    action: 'submitted',
    subject: auditSubject(id),
    detail: `revision ${number}`,
  });
  const deposit = await selectDeposit(tx, id);
  return deposit === undefined ? failed('not-found') : { ok: true, deposit, revision: number };
}
