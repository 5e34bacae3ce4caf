/** The tokens of a laboratory, as its manager sees them: never the tokens themselves. */
import { selectTokensOf } from '@/db/queries/lab-tokens';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { type Actor, LAB_TOKEN_SCOPES, type LabTokenScope } from '@/lib/auth/actor';
import { refusalOf } from '@/lib/auth/refusal';
import type { Outcome } from '@/lib/errors';

export interface ListedToken {
  id: string;
  name: string;
  scopes: LabTokenScope[];
  /** name of the person who made it; null where that is no person of this installation */
  createdBy: string | null;
  /** Unix times, ms */
  createdAt: number;
  expiresAt: number;
  lastUsedAt: number | null;
  state: 'live' | 'expired' | 'revoked';
}

/** All tokens that the laboratory ever had, newest first. */
export function listTokens(
  actor: Actor,
  labId: string,
  nowMs = Date.now(),
): Promise<Outcome<{ tokens: ListedToken[] }>> {
  const refused = { actor, action: 'manage-tokens', subject: `laboratory:${labId}` } as const;
  return auditingRefusals(refused, async () => {
    const refusal = refusalOf(actor, 'manage-tokens', { labId });
    if (refusal !== null) return refusal;
    const rows = await selectTokensOf(labId);
    const tokens = rows.map(({ labId: _, revokedAt, scopes, ...row }) => ({
      ...row,
      scopes: LAB_TOKEN_SCOPES.filter((scope) => scopes.includes(scope)),
      state: stateOf(revokedAt, row.expiresAt, nowMs),
    }));
    return { ok: true, tokens };
  });
}

function stateOf(revokedAt: number | null, expiresAt: number, nowMs: number): ListedToken['state'] {
  if (revokedAt !== null) return 'revoked';
  return expiresAt <= nowMs ? 'expired' : 'live';
}
