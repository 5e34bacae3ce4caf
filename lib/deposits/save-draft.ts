/** The verb that puts another document in the place of a draft's. */
import { readDatabase, type Transaction, write } from '@/db/client';
import { type DepositHead, type Reader, selectDeposit, updateDocument } from '@/db/queries/deposits';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import { type Actor, actorKey } from '@/lib/auth/actor';
import { failed, type Outcome } from '@/lib/errors';
import { type ExpectedVersions, versionRefusal } from '@/lib/serving/if-match';
import type { BodyResult } from '@/lib/serving/read-body';
import type { SavedDeposit } from './create-deposit';
import { type JudgedDraft, judgeDraft } from './judge-draft';
import { auditSubject, reachDeposit } from './reach-deposit';
import { isEditable, stateWords } from './states';
import { withUnlistedSystem } from './unlisted-system';
import { versionFailure } from './version-failure';

export interface DraftChange {
  actor: Actor;
  id: string;
  /** the versions that the actor takes for the present one */
  expected: ExpectedVersions;
  readBody: () => Promise<BodyResult>;
  signal?: AbortSignal;
}

/** Saves a document, valid or not. */
export function saveDraft(change: DraftChange): Promise<SavedDeposit> {
  const refusal = { actor: change.actor, action: 'edit-deposit', subject: auditSubject(change.id) } as const;
  return auditingRefusals(refusal, () => judgeAndSave(change));
}

async function judgeAndSave(change: DraftChange): Promise<SavedDeposit> {
  const { actor, id, expected, readBody, signal = new AbortController().signal } = change;
  // Asked before the document is read and once more in the transaction, where it counts.
  const beforehand = await reachEditable(await readDatabase(), actor, id, expected);
  if (!beforehand.ok) return beforehand;
  const body = await readBody();
  if (!body.ok) return body;
  const judged = await judgeDraft(body.bytes, signal);
  return judged.ok ? write('acknowledged', (tx) => save(tx, change, judged)) : judged;
}

async function save(
  tx: Transaction,
  { actor, id, expected }: DraftChange,
  { text: document, title, system, errors }: JudgedDraft,
): Promise<SavedDeposit> {
  const reached = await reachEditable(tx, actor, id, expected);
  if (!reached.ok) return reached;
  const { version, state: from } = reached.deposit;
  const kept = { errors: JSON.stringify(errors), errorCount: errors.length };
  const content = { document, title, system, ...kept };
  const changed = { ...content, updatedAt: Date.now(), updatedBy: actorKey(actor) };
  if (!(await updateDocument(tx, { id, version, from }, changed))) return failed('stale');
  const detail = `version ${version + 1}`;
  await recordAudit(tx, { actor, action: 'saved', subject: auditSubject(id), detail });
  const deposit = await selectDeposit(tx, id);
  if (deposit === undefined) return failed('not-found');
  return { ok: true, deposit, errors: await withUnlistedSystem(tx, deposit, errors) };
}

async function reachEditable(
  reader: Reader,
  actor: Actor,
  id: string,
  expected: ExpectedVersions,
): Promise<Outcome<{ deposit: DepositHead }>> {
  const reached = await reachDeposit(reader, actor, 'edit-deposit', id);
  if (!reached.ok) return reached;
  const { deposit } = reached;
  const { state, version } = deposit;
  if (!isEditable(state)) {
    return failed(
      'conflict',
      `The deposit is ${stateWords(state)}; only a draft, or one for which changes were requested, can be changed.`,
    );
  }
  const refusal = versionRefusal(expected, version);
  return refusal === null ? reached : versionFailure(refusal, deposit);
}
