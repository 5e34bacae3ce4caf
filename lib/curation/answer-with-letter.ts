/** What asking for changes and declining have in common: a letter, which is needed, and a state that follows. */
import { readDatabase, type Transaction, write } from '@/db/client';
import { insertDecision } from '@/db/queries/decisions';
import { type DepositHead, selectDeposit, updateState } from '@/db/queries/deposits';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import { actorKey } from '@/lib/auth/actor';
import { auditSubject, reachDeposit } from '@/lib/deposits/reach-deposit';
import { failed, type Outcome } from '@/lib/errors';
import { idempotencyOf, once } from '@/lib/serving/idempotency';
import { type DecisionCall, letterRefusal, reachDecidable } from './reach-decidable';

/** The decisions after which the laboratory has the word again, or nobody has. */
type Answer = 'changes-requested' | 'declined';

/** What an answer comes to. */
export type Answered = Outcome<{ deposit: DepositHead }>;

/**
 * Answers a submission with a letter.
 *
 * @param missing what the letter must say, where it is empty
 */
export function answerWithLetter(call: DecisionCall, kind: Answer, missing: string): Promise<Answered> {
  const { actor, id, letter, revision = '', idempotencyKey = null } = call;
  return auditingRefusals({ actor, action: 'decide-deposit', subject: auditSubject(id) }, async () => {
    const reached = await reachDeposit(await readDatabase(), actor, 'decide-deposit', id);
    if (!reached.ok) return reached;
    const refusal = letterRefusal(letter, missing);
    if (refusal !== null) return refusal;
    const idempotency = idempotencyOf(actor, `decide ${id}`, idempotencyKey, kind, letter, String(revision));
    return write('acknowledged', (tx) => once(tx, idempotency, () => decideSo(tx, call, kind)));
  });
}

async function decideSo(tx: Transaction, call: DecisionCall, kind: Answer): Promise<Answered> {
  const reached = await reachDecidable(tx, call);
  if (!reached.ok) return reached;
  const { actor, id, letter } = call;
  const { deposit, revision } = reached;
  const { version, state: from } = deposit;
  const [now, decidedBy] = [Date.now(), actorKey(actor)];
  const to = { state: kind, updatedAt: now, updatedBy: decidedBy };
  if (!(await updateState(tx, { id, version, from }, to))) return failed('conflict');
  await insertDecision(tx, { depositId: id, revision, kind, letter, decidedBy, decidedAt: now });
  const detail = `revision ${revision}`;
  await recordAudit(tx, { actor, action: kind, subject: auditSubject(id), detail });
  const changed = await selectDeposit(tx, id);
  return changed === undefined ? failed('not-found') : { ok: true, deposit: changed };
}
