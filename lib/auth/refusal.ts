/** What a refusal of the permission table is as a failure. */
import type { Failure } from '@/lib/errors';
import type { Decision } from './permissions';

const CODES = { unauthenticated: 'unauthenticated', forbidden: 'forbidden', hidden: 'not-found' } as const;

/** The failure of a decision that is not `allowed`. */
export function refusal(decision: Exclude<Decision, 'allowed'>): Failure {
  return { code: CODES[decision] };
}
