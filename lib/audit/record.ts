/** Writes the audit trail: sign-ins, refusals and every change of state, in the transaction of what is recorded. */
import type { Transaction } from '@/db/client';
import { insertAuditEntry } from '@/db/queries/audit';
import { type Actor, actorKey } from '@/lib/auth/actor';

export interface AuditEntry {
  actor: Actor;
  /** what was done, as a word of the permission table or a past participle: `signed-in`, `token-revoked` */
  action: string;
  /** what it was done to, as `kind:id` */
  subject: string;
  /** what else is worth knowing; never a password, a token or an address */
  detail?: string;
}

/** Adds one line to the audit trail. */
export async function recordAudit(
  tx: Transaction,
  { actor, action, subject, detail = '' }: AuditEntry,
): Promise<void> {
  await insertAuditEntry(tx, { at: Date.now(), actor: actorKey(actor), action, subject, detail });
}
