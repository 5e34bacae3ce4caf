/** The verb behind `GET /api/v1/refits/{id}`: how far a refit is, or its answer. */
import { selectRefit } from '@/db/queries/refits';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import { failed, type Outcome } from '@/lib/errors';

export type LoadedRefit =
  | { kind: 'running'; progress: number }
  | { kind: 'answered'; status: number; body: Uint8Array<ArrayBuffer> };

/** The refit under that id, as long as it is kept. Whoever knows the id may ask. */
export async function loadRefit({
  actor,
  id,
}: {
  actor: Actor;
  id: string;
}): Promise<Outcome<{ refit: LoadedRefit }>> {
  if (!may(actor, 'refit-document')) return failed('forbidden');
  const found = await selectRefit(id, Date.now());
  if (found === null) return failed('not-found');
  const { answer, answerStatus, progress } = found;
  if (answer === null || answerStatus === null) return { ok: true, refit: { kind: 'running', progress } };
  return { ok: true, refit: { kind: 'answered', status: answerStatus, body: Uint8Array.from(answer) } };
}
