/** Lists what waits for a curator, the longest waiting first. */
import { readDatabase } from '@/db/client';
import { type QueueRow, selectQueue } from '@/db/queries/revisions';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import { AWAITING_DECISION } from '@/lib/deposits/states';
import type { AssessmentSummary } from '@/lib/engine/assessment';
import type { Outcome } from '@/lib/errors';
import { seeQueue } from './see-queue';

export interface QueueEntry extends Omit<QueueRow, 'summary'> {
  /** of the newest revision */
  summary: AssessmentSummary;
  /** how long it has been waiting, ms */
  ageMs: number;
  /** it is of the curator's own laboratory: somebody else decides */
  blocked: boolean;
}

/** Everything submitted or in review. */
export async function listQueue({ actor }: { actor: Actor }): Promise<Outcome<{ queue: QueueEntry[] }>> {
  const seen = await seeQueue(actor, 'queue:');
  if (!seen.ok) return seen;
  const now = Date.now();
  const rows = await selectQueue(await readDatabase(), AWAITING_DECISION);
  const queue = rows.map(({ summary, ...row }) => ({
    ...row,
    summary: JSON.parse(summary) as AssessmentSummary,
    ageMs: Math.max(0, now - row.submittedAt),
    blocked: !may(actor, 'decide-deposit', { labId: row.labId, state: row.state }),
  }));
  return { ok: true, queue };
}
