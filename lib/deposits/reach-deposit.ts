/** What every verb on a deposit begins with: is there one, and may the actor do this to it. */
import { write } from '@/db/client';
import { type DepositHead, type Reader, selectDeposit } from '@/db/queries/deposits';
import { recordAudit } from '@/lib/audit/record';
import type { Actor } from '@/lib/auth/actor';
import { type Action, decide, type Subject } from '@/lib/auth/permissions';
import { refusal } from '@/lib/auth/refusal';
import { type Failed, failed, type Outcome } from '@/lib/errors';

/** The failure where the actor may not, or null where they may. */
export function refusalOf(actor: Actor, action: Action, subject?: Subject): Failed | null {
  const decision = decide(actor, action, subject);
  return decision === 'allowed' ? null : { ok: false, failure: refusal(decision), refused: true };
}

/**
 * The deposit, where it exists and the actor may do the action to it. Whether one exists is told to nobody who may
 * not know.
 */
export async function reachDeposit(
  reader: Reader,
  actor: Actor,
  action: Action,
  id: string,
): Promise<Outcome<{ deposit: DepositHead }>> {
  const beforehand = refusalOf(actor, action);
  if (beforehand?.failure.code === 'unauthenticated') return beforehand;
  const deposit = await selectDeposit(reader, id);
  if (deposit === undefined) return failed('not-found');
  const { labId, state } = deposit;
  return refusalOf(actor, action, { labId, state }) ?? { ok: true, deposit };
}

/**
 * Runs a verb; where it was refused to somebody who is known, that goes on the audit trail. Visitors are left out:
 * anybody could fill the disk.
 */
export async function auditingRefusals<T>(
  { actor, action, subject }: { actor: Actor; action: Action; subject: string },
  verb: () => Promise<Outcome<T>>,
): Promise<Outcome<T>> {
  const outcome = await verb();
  if (outcome.ok || !outcome.refused || actor.kind === 'visitor') return outcome;
  await write('acknowledged', (tx) => recordAudit(tx, { actor, action: 'refused', subject, detail: action }));
  return outcome;
}

/** The subject of a deposit on the audit trail. */
export function auditSubject(id: string): string {
  return `deposit:${id}`;
}
