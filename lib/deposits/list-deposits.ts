/** Lists the deposits of the actor's laboratories, a page at a time. */
import { readDatabase } from '@/db/client';
import { type DepositHead, type ListPlace, selectDepositsOf } from '@/db/queries/deposits';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import type { Actor } from '@/lib/auth/actor';
import { refusalOf } from '@/lib/auth/refusal';
import { failed, type Outcome } from '@/lib/errors';
import type { DepositState } from './states';

const MOST_ROWS = 100;
const USUAL_ROWS = 50;

export interface DepositList {
  deposits: DepositHead[];
  /** where the next page begins; null where this is the last one */
  next: string | null;
}

/** Deposits of all laboratories of the actor, the last changed first. */
export function listDeposits(call: ListCall): Promise<Outcome<DepositList>> {
  const refused = { actor: call.actor, action: 'see-own-deposits', subject: 'deposits:' } as const;
  return auditingRefusals(refused, () => listOwn(call));
}

interface ListCall {
  actor: Actor;
  state?: DepositState;
  cursor?: string;
  /** 1 to 100 */
  limit?: number;
}

async function listOwn(call: ListCall): Promise<Outcome<DepositList>> {
  const { actor, state, cursor, limit = USUAL_ROWS } = call;
  const refusal = refusalOf(actor, 'see-own-deposits');
  if (refusal !== null) return refusal;
  const after = cursor === undefined ? undefined : placeOf(cursor);
  if (after === null) return failed('bad-parameter', 'cursor must be the next of an earlier answer.');
  const most = Math.min(MOST_ROWS, Math.max(1, limit));
  // One more than is shown tells whether there is a next page.
  const options = { labIds: laboratoriesOf(actor), state, after, limit: most + 1 };
  const rows = await selectDepositsOf(await readDatabase(), options);
  const deposits = rows.slice(0, most);
  const last = deposits.at(-1);
  return { ok: true, deposits, next: rows.length > most && last ? cursorOf(last) : null };
}

function laboratoriesOf(actor: Actor): string[] {
  if (actor.kind === 'token') return [actor.labId];
  return actor.kind === 'person' ? actor.memberships.map(({ labId }) => labId) : [];
}

function cursorOf({ updatedAt, id }: ListPlace): string {
  return Buffer.from(`${updatedAt} ${id}`).toString('base64url');
}

function placeOf(cursor: string): ListPlace | null {
  const [, updatedAt, id] =
    /^(\d{1,15}) ([\w-]{1,64})$/.exec(Buffer.from(cursor, 'base64url').toString()) ?? [];
  return updatedAt === undefined || id === undefined ? null : { updatedAt: Number(updatedAt), id };
}
