/** What every verb on a deposit begins with: is there one, and may the actor do this to it. */
import { type DepositHead, type Reader, selectDeposit } from '@/db/queries/deposits';
import type { Actor } from '@/lib/auth/actor';
import type { Action } from '@/lib/auth/permissions';
import { refusalOf } from '@/lib/auth/refusal';
import { type Failed, failed, type Outcome } from '@/lib/errors';

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
  const beforehand = signInFirst(actor, action);
  if (beforehand !== null) return beforehand;
  const deposit = await selectDeposit(reader, id);
  if (deposit === undefined) return failed('not-found');
  const { labId, state } = deposit;
  return refusalOf(actor, action, { labId, state }) ?? { ok: true, deposit };
}

/** The failure of a visitor who may do this to no deposit at all: told before anything is read or waited for. */
export function signInFirst(actor: Actor, action: Action): Failed | null {
  const refusal = refusalOf(actor, action);
  return refusal?.failure.code === 'unauthenticated' ? refusal : null;
}

/** The subject of a deposit on the audit trail. */
export function auditSubject(id: string): string {
  return `deposit:${id}`;
}
