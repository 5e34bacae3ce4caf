/** Puts refusals on the audit trail. */
import { write } from '@/db/client';
import { type Actor, actorKey } from '@/lib/auth/actor';
import type { Action } from '@/lib/auth/permissions';
import type { Outcome } from '@/lib/errors';
import { admitNote, isNews } from './bounded-notes';
import { recordAudit } from './record';

interface Refusable {
  actor: Actor;
  action: Action;
  /** what it was to be done to, as `kind:id`; the id may be whatever somebody sent */
  subject: string;
}

/** Longest subject that is noted, in characters. */
const MOST_SUBJECT = 100;

/** Runs a verb; where the permission table refused it, that goes on the audit trail within bounds. */
export async function auditingRefusals<T>(
  { actor, action, subject }: Refusable,
  verb: () => Promise<Outcome<T>>,
): Promise<Outcome<T>> {
  const outcome = await verb();
  if (!outcome.ok && outcome.refused) await note('refused', { actor, action, subject });
  return outcome;
}

/** Puts on the audit trail that somebody was told to wait. */
export function noteLimited(actor: Actor, action: Action | 'sign-in'): Promise<void> {
  return note('limited', { actor, action, subject: `limit:${action}` });
}

/** The same of the same is noted once a minute, what visitors cause so many times an hour besides. */
async function note(
  what: 'refused' | 'limited',
  { actor, action, subject }: Omit<Refusable, 'action'> & { action: string },
): Promise<void> {
  const plain = plainSubject(subject);
  if (!isNews(`${what} ${actorKey(actor)} ${action} ${plain}`)) return;
  const more = actor.kind === 'visitor' ? admitNote(`visitor ${what}`) : '';
  if (more === null) return;
  const detail = more === '' ? action : `${action}; ${more}`;
  await write('acknowledged', (tx) => recordAudit(tx, { actor, action: what, subject: plain, detail }));
}

/** Ids and slugs as they are; what is neither is not worth keeping. */
function plainSubject(subject: string): string {
  return /^[\w:-]*$/.test(subject) && subject.length <= MOST_SUBJECT
    ? subject
    : subject.replace(/:.*$/s, ':?');
}
