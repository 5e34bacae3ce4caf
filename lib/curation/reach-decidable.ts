/** What every decision of a curator begins with. */
import type { DepositHead, Reader } from '@/db/queries/deposits';
import { newestRevisionNumber } from '@/db/queries/revisions';
import type { Actor } from '@/lib/auth/actor';
import { reachDeposit } from '@/lib/deposits/reach-deposit';
import { awaitsDecision, stateWords } from '@/lib/deposits/states';
import { failed, type Outcome } from '@/lib/errors';
import { isPlainText, UNPLAIN } from '@/schemas/plain-text';

/** Longest letter, in characters. */
export const MOST_LETTER = 20_000;

export interface DecisionCall {
  actor: Actor;
  id: string;
  /** what the depositor is told */
  letter: string;
  /** the revision that the curator has before them; left out: the newest, whichever it is */
  revision?: number;
  idempotencyKey?: string | null;
}

/** The deposit and its newest revision, where the curator may decide on it now. */
export async function reachDecidable(
  reader: Reader,
  { actor, id, revision: seen }: DecisionCall,
): Promise<Outcome<{ deposit: DepositHead; revision: number }>> {
  const reached = await reachDeposit(reader, actor, 'decide-deposit', id);
  if (!reached.ok) return reached;
  const { state } = reached.deposit;
  if (!awaitsDecision(state)) {
    return failed('conflict', `The deposit is ${stateWords(state)}; only a submission can be decided on.`);
  }
  const revision = await newestRevisionNumber(reader, id);
  return seen === undefined || seen === revision
    ? { ...reached, revision }
    : failed('conflict', `Revision ${revision} has come in meanwhile; read it before you decide.`);
}

/**
 * The failure where a letter is too long, cannot be kept, or is empty although one is needed; else null.
 *
 * @param missing what it must say; null where it may be empty
 */
export function letterRefusal(letter: string, missing: string | null) {
  const refuse = (detail: string) =>
    failed('invalid-input', undefined, { errors: [{ pointer: '/letter', detail }] });
  if (missing !== null && letter.trim() === '') return refuse(missing);
  if (!isPlainText(letter)) return refuse(UNPLAIN);
  const most = MOST_LETTER.toLocaleString('en-GB');
  return letter.length > MOST_LETTER ? refuse(`a letter may have at most ${most} characters`) : null;
}
