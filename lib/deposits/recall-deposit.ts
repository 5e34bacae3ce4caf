/** The verb that takes a submission back, as long as nobody has begun to review it. */
import { write } from '@/db/client';
import { selectDecisions } from '@/db/queries/decisions';
import { type DepositHead, selectDeposit, updateState } from '@/db/queries/deposits';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import { type Actor, actorKey } from '@/lib/auth/actor';
import { failed, type Outcome } from '@/lib/errors';
import { auditSubject, reachDeposit, signInFirst } from './reach-deposit';
import { stateWords } from './states';

/** Makes a submission a draft again, or what it was before; its revision stays and keeps its number. */
export function recallDeposit({
  actor,
  id,
}: {
  actor: Actor;
  id: string;
}): Promise<Outcome<{ deposit: DepositHead }>> {
  return auditingRefusals(
    { actor, action: 'recall-deposit', subject: auditSubject(id) },
    async () =>
      signInFirst(actor, 'recall-deposit') ??
      write('acknowledged', async (tx) => {
        const reached = await reachDeposit(tx, actor, 'recall-deposit', id);
        if (!reached.ok) return reached;
        const { state: from, version } = reached.deposit;
        if (from !== 'submitted') {
          return failed('conflict', `The deposit is ${stateWords(from)}; only a submission can be recalled.`);
        }
        // What a curator has answered is no draft any more.
        const state = (await selectDecisions(tx, id)).length > 0 ? 'changes-requested' : 'draft';
        const to = { state, updatedAt: Date.now(), updatedBy: actorKey(actor) } as const;
        if (!(await updateState(tx, { id, version, from }, to))) return failed('conflict');
        await recordAudit(tx, { actor, action: 'recalled', subject: auditSubject(id), detail: state });
        const deposit = await selectDeposit(tx, id);
        return deposit === undefined ? failed('not-found') : { ok: true, deposit };
      }),
  );
}
