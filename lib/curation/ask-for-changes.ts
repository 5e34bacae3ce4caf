/** The verb by which a curator gives a deposit back with a letter. */
import { readDatabase, type Transaction, write } from '@/db/client';
import { insertDecision } from '@/db/queries/decisions';
import { type DepositHead, selectDeposit, updateState } from '@/db/queries/deposits';
import { recordAudit } from '@/lib/audit/record';
import { actorKey } from '@/lib/auth/actor';
import { auditingRefusals, auditSubject, reachDeposit } from '@/lib/deposits/reach-deposit';
import { failed, type Outcome } from '@/lib/errors';
import { idempotencyOf, once } from '@/lib/serving/idempotency';
import { type DecisionCall, letterRefusal, reachDecidable } from './reach-decidable';

type Asked = Outcome<{ deposit: DepositHead }>;

/** Asks the depositor for changes; the deposit can then be edited and submitted again as its next revision. */
export function askForChanges(call: DecisionCall): Promise<Asked> {
  const { actor, id, letter, idempotencyKey = null } = call;
  return auditingRefusals({ actor, action: 'decide-deposit', subject: auditSubject(id) }, async () => {
    const reached = await reachDeposit(await readDatabase(), actor, 'decide-deposit', id);
    if (!reached.ok) return reached;
    const refusal = letterRefusal(letter, true);
    if (refusal !== null) return refusal;
    const idempotency = idempotencyOf(actor, `decide ${id}`, idempotencyKey, 'changes-requested', letter);
    return write('acknowledged', (tx) => once(tx, idempotency, () => decideSo(tx, call)));
  });
}

async function decideSo(tx: Transaction, call: DecisionCall): Promise<Asked> {
  const reached = await reachDecidable(tx, call);
  if (!reached.ok) return reached;
  const { actor, id, letter } = call;
  const { deposit, revision } = reached;
  const { version, state: from } = deposit;
  const now = Date.now();
  const to = { state: 'changes-requested', updatedAt: now } as const;
  if (!(await updateState(tx, { id, version, from }, to))) return failed('conflict');
  const decidedBy = actorKey(actor);
  await insertDecision(tx, {
    depositId: id,
    revision,
    kind: 'changes-requested',
    letter,
    decidedBy,
    decidedAt: now,
  });
  const detail = `revision ${revision}`;
  await recordAudit(tx, { actor, action: 'changes-requested', subject: auditSubject(id), detail });
  const changed = await selectDeposit(tx, id);
  return changed === undefined ? failed('not-found') : { ok: true, deposit: changed };
}
