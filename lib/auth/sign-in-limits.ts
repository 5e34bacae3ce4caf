/**
 * How failed sign-ins are slowed: the rules, without a database. Nobody can lock the owner out from elsewhere: what
 * comes from one address makes that address wait, and tries on one account from everywhere are only held back by
 * moments.
 */

/** For how long an attempt counts. */
export const WINDOW_MS = 15 * 60_000;

/** Attempts from one address on one account, and on all accounts together, before it has to wait between them. */
const FREE_ON_ONE_ACCOUNT = 5;
const FREE_ON_ALL_ACCOUNTS = 30;

/**
 * For how long an account is known at an address after a sign-in. It then waits for its own failures there alone: a
 * laboratory behind one address does not wait for somebody else’s.
 */
export const KNOWN_MS = 30 * 86_400_000;

/** Longest wait between two attempts. */
const MOST_WAIT_MS = 5 * 60_000;

/** Attempts on one account from everywhere before answers are held back, by how much more each time, and at most. */
const FREE_FROM_EVERYWHERE = 20;
const HOLD_STEP_MS = 100;
const MOST_HOLD_MS = 3_000;

export interface Attempt {
  accountKey: string;
  addressKey: string;
  /** Unix time, ms */
  at: number;
}

export interface Slowing {
  /** how long this address has to wait, ms; 0 where it may try now */
  waitMs: number;
  /** how long the answer is held back, ms */
  holdMs: number;
}

/**
 * What a further attempt meets.
 *
 * @param attempts those on this account or from this address that did not succeed, in any order
 * @param isKnown whether the account was signed in to from this address lately
 */
export function slowingOf(
  attempts: readonly Attempt[],
  { accountKey, addressKey, at }: Attempt,
  isKnown = false,
): Slowing {
  const counting = attempts.filter((attempt) => attempt.at > at - WINDOW_MS);
  const fromHere = counting.filter((attempt) => attempt.addressKey === addressKey);
  const onIt = fromHere.filter((attempt) => attempt.accountKey === accountKey);
  const fromEverywhere = counting.filter((attempt) => attempt.accountKey === accountKey).length;
  return {
    waitMs: Math.max(
      waitAfter(onIt, FREE_ON_ONE_ACCOUNT, at),
      isKnown ? 0 : waitAfter(fromHere, FREE_ON_ALL_ACCOUNTS, at),
    ),
    holdMs: Math.min(MOST_HOLD_MS, HOLD_STEP_MS * Math.max(0, fromEverywhere - FREE_FROM_EVERYWHERE)),
  };
}

/** One second after the last attempt, and twice as long after each further one. */
function waitAfter(attempts: readonly Attempt[], free: number, now: number): number {
  if (attempts.length < free) return 0;
  const last = Math.max(...attempts.map(({ at }) => at));
  const pause = Math.min(MOST_WAIT_MS, 1000 * 2 ** (attempts.length - free));
  return Math.max(0, last + pause - now);
}
