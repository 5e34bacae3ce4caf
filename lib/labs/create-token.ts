/** The verb that gives a laboratory a token for its scripts. */
import { randomBytes } from 'node:crypto';
import { write } from '@/db/client';
import { insertToken } from '@/db/queries/lab-tokens';
import { selectLaboratory } from '@/db/queries/laboratories';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import { type Actor, actorKey } from '@/lib/auth/actor';
import { hashToken, newId } from '@/lib/auth/hash-token';
import { invalidInput } from '@/lib/auth/input-errors';
import { refusalOf } from '@/lib/auth/refusal';
import { failed, type Outcome } from '@/lib/errors';
import { labTokenSchema } from '@/schemas/lab-token';

const DAY_MS = 86_400_000;

export type CreatedToken = Outcome<{ id: string; token: string; expiresAt: number }>;

/**
 * Makes a token: `ckt_` and 256 random bits, base64url. Only its SHA-256 is kept, so this answer is the one time that
 * it is seen.
 *
 * @param input name, scopes and days as the form sent them (`schemas/lab-token.ts`)
 */
export function createToken(actor: Actor, labId: string, input: unknown): Promise<CreatedToken> {
  return auditingRefusals(
    { actor, action: 'manage-tokens', subject: `laboratory:${labId}` },
    async () => refusalOf(actor, 'manage-tokens', { labId }) ?? create(actor, labId, input),
  );
}

async function create(actor: Actor, labId: string, input: unknown): Promise<CreatedToken> {
  const parsed = labTokenSchema.safeParse(input);
  if (!parsed.success) return { ok: false, failure: invalidInput(parsed.error) };
  if (!(await selectLaboratory(labId))) return failed('not-found');
  const { name, scopes, days } = parsed.data;
  const [id, token, now] = [newId(), `ckt_${randomBytes(32).toString('base64url')}`, Date.now()];
  const expiresAt = now + days * DAY_MS;
  await write('acknowledged', async (tx) => {
    const createdBy = actor.kind === 'person' ? actor.id : actorKey(actor);
    await insertToken(tx, {
      ...{ id, labId, name, scopes, createdBy, expiresAt },
      tokenHash: hashToken(token),
      createdAt: now,
    });
    await recordAudit(tx, {
      actor,
      action: 'token-created',
      subject: `token:${id}`,
      detail: `lab ${labId}; ${scopes.join(', ')}; ${days} days`,
    });
  });
  return { ok: true, id, token, expiresAt };
}
