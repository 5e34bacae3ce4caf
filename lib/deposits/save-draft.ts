/** The verb that puts another document in the place of a draft's. */
import { readDatabase, type Transaction, write } from '@/db/client';
import { type DepositHead, type Reader, selectDeposit, updateDocument } from '@/db/queries/deposits';
import type { Actor } from '@/lib/auth/actor';
import { failed, type Outcome } from '@/lib/errors';
import { type ExpectedVersions, versionRefusal } from '@/lib/serving/if-match';
import type { BodyResult } from '@/lib/serving/read-body';
import type { SavedDeposit } from './create-deposit';
import { type JudgedDraft, judgeDraft } from './judge-draft';
import { auditingRefusals, auditSubject, reachDeposit } from './reach-deposit';
import { isEditable, stateWords } from './states';

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
  const content = { document, title, system, errors: JSON.stringify(errors), updatedAt: Date.now() };
  if (!(await updateDocument(tx, { id, version, from }, content))) return failed('stale');
  const deposit = await selectDeposit(tx, id);
  return deposit === undefined ? failed('not-found') : { ok: true, deposit, errors };
}

async function reachEditable(
  reader: Reader,
  actor: Actor,
  id: string,
  expected: ExpectedVersions,
): Promise<Outcome<{ deposit: DepositHead }>> {
  const reached = await reachDeposit(reader, actor, 'edit-deposit', id);
  if (!reached.ok) return reached;
  const { state, version } = reached.deposit;
  if (!isEditable(state)) {
    return failed('conflict', `The deposit is ${stateWords(state)}; only a draft can be changed.`);
  }
  const refusal = versionRefusal(expected, version);
  return refusal === null ? reached : failed(refusal);
}
