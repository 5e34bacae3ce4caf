/**
 * How much of what anybody at all can cause goes on the audit trail: so many notes of a kind an hour, and then how
 * many more there were. A flood leaves its size on record and does not fill the disk.
 */

/** Milliseconds for which notes of a kind are counted together. */
const WINDOW_MS = 3_600_000;

/** Notes of a kind within the window. */
const MOST_NOTES = 200;

interface Tally {
  /** Unix time, ms, at which the window began */
  since: number;
  noted: number;
  leftOut: number;
}

const KEY = Symbol.for('curvekeep.bounded-notes');
// Next bundles route handlers apart from pages; both must count together, so the tallies hang on globalThis.
const shared = globalThis as typeof globalThis & { [KEY]?: Map<string, Tally> };
shared[KEY] ??= new Map();
const tallies = shared[KEY];

/**
 * Whether one more note of a kind is written.
 *
 * @param kind one of a few words, never what somebody sent
 * @param now Unix time, ms
 * @returns null where it is left out; else what to add to it: how many were left out before it, where any were
 */
export function admitNote(kind: string, now = Date.now()): string | null {
  const before = tallies.get(kind);
  if (before === undefined || now - before.since >= WINDOW_MS) {
    tallies.set(kind, { since: now, noted: 1, leftOut: 0 });
    return before === undefined || before.leftOut === 0 ? '' : `${before.leftOut} more before it left out`;
  }
  if (before.noted < MOST_NOTES) {
    before.noted += 1;
    return '';
  }
  before.leftOut += 1;
  return null;
}

/** Milliseconds for which the same is no news. */
const NEWS_MS = 60_000;

/** Different notes that are remembered; beyond them the oldest is forgotten, and may be noted again. */
const MOST_REMEMBERED = 10_000;

const NEWS_KEY = Symbol.for('curvekeep.news');
const sharedNews = globalThis as typeof globalThis & { [NEWS_KEY]?: Map<string, number> };
sharedNews[NEWS_KEY] ??= new Map();
const toldAt = sharedNews[NEWS_KEY];

/**
 * Whether the same was not told within the last minute; where it is news, it counts as told now.
 *
 * @param what all that makes it the same: who, what, to what; bounded in length
 * @param now Unix time, ms
 */
export function isNews(what: string, now = Date.now()): boolean {
  const before = toldAt.get(what);
  if (before !== undefined && now - before < NEWS_MS) return false;
  toldAt.delete(what);
  toldAt.set(what, now);
  const oldest = toldAt.keys().next().value;
  if (toldAt.size > MOST_REMEMBERED && oldest !== undefined) toldAt.delete(oldest);
  return true;
}
