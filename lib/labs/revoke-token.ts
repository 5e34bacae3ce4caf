/** The verb that takes a laboratory's token away. */
import { write } from '@/db/client';
import { selectTokenOf, updateTokenRevoked } from '@/db/queries/lab-tokens';
import { recordAudit } from '@/lib/audit/record';
import type { Actor } from '@/lib/auth/actor';
import { decide } from '@/lib/auth/permissions';
import { refusal } from '@/lib/auth/refusal';
import type { Failure } from '@/lib/errors';

export type RevokeTokenOutcome = { ok: true } | { ok: false; failure: Failure };

/** Revokes a token of that laboratory; from the next call on it lets nobody in. */
export async function revokeToken(actor: Actor, labId: string, tokenId: string): Promise<RevokeTokenOutcome> {
  const decision = decide(actor, 'manage-tokens', { labId });
  if (decision !== 'allowed') return { ok: false, failure: refusal(decision) };
  return write('acknowledged', async (tx) => {
    if (!(await selectTokenOf(tx, labId, tokenId))) return { ok: false, failure: { code: 'not-found' } };
    if (!(await updateTokenRevoked(tx, tokenId, Date.now())))
      return { ok: false, failure: { code: 'conflict', detail: 'This token was revoked already.' } };
    await recordAudit(tx, {
      actor,
      action: 'token-revoked',
      subject: `token:${tokenId}`,
      detail: `lab ${labId}`,
    });
    return { ok: true };
  });
}
