/** Whether somebody may see what waits for curators at all, whichever deposit it is about. */
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import type { Actor } from '@/lib/auth/actor';
import { refusalOf } from '@/lib/auth/refusal';
import type { Outcome } from '@/lib/errors';

/**
 * Asks the permission table; a refusal goes on the audit trail.
 *
 * @param subject `kind:id` of what is to be seen
 */
export function seeQueue(actor: Actor, subject: string): Promise<Outcome<object>> {
  return auditingRefusals(
    { actor, action: 'see-queue', subject },
    async () => refusalOf(actor, 'see-queue') ?? { ok: true },
  );
}
