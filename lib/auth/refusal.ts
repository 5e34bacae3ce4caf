/** What a refusal of the permission table is as a failure. */
import type { Failed, Failure } from '@/lib/errors';
import type { Actor } from './actor';
import { type Action, type Decision, decide, type Subject } from './permissions';

const CODES = { unauthenticated: 'unauthenticated', forbidden: 'forbidden', hidden: 'not-found' } as const;

/** The failure of a decision that is not `allowed`. */
export function refusal(decision: Exclude<Decision, 'allowed'>): Failure {
  return { code: CODES[decision] };
}

/** The failure where the actor may not, or null where they may. */
export function refusalOf(actor: Actor, action: Action, subject?: Subject): Failed | null {
  const decision = decide(actor, action, subject);
  return decision === 'allowed' ? null : { ok: false, failure: refusal(decision), refused: true };
}
