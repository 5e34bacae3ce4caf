/** The verb that takes a laboratory's token away. */
import { write } from '@/db/client';
import { selectTokenOf, updateTokenRevoked } from '@/db/queries/lab-tokens';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import type { Actor } from '@/lib/auth/actor';
import { refusalOf } from '@/lib/auth/refusal';
import { failed, type Outcome } from '@/lib/errors';

/** Revokes a token of that laboratory; from the next call on it lets nobody in. */
export function revokeToken(actor: Actor, labId: string, tokenId: string): Promise<Outcome<object>> {
  const subject = `token:${tokenId}`;
  return auditingRefusals(
    { actor, action: 'manage-tokens', subject },
    async () => refusalOf(actor, 'manage-tokens', { labId }) ?? revoke(actor, labId, tokenId),
  );
}

function revoke(actor: Actor, labId: string, tokenId: string): Promise<Outcome<object>> {
  return write('acknowledged', async (tx): Promise<Outcome<object>> => {
    if (!(await selectTokenOf(tx, labId, tokenId))) return failed('not-found');
    if (!(await updateTokenRevoked(tx, tokenId, Date.now())))
      return failed('conflict', 'This token was revoked already.');
    await recordAudit(tx, {
      actor,
      action: 'token-revoked',
      subject: `token:${tokenId}`,
      detail: `lab ${labId}`,
    });
    return { ok: true };
  });
}
