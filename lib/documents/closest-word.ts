const LONGEST_WORD = 64;

/**
 * The word that was probably meant, for “did you mean …”.
 *
 * @returns the candidate with the fewest changed letters, or null where none is near (a third of its letters;
 * of a word of two letters, their case)
 */
export function closestWord(word: string, candidates: readonly string[]): string | null {
  if (word.length > LONGEST_WORD) return null;
  let best: string | null = null;
  let fewest = Number.POSITIVE_INFINITY;
  for (const candidate of candidates) {
    const changes = countChanges(normalise(word), normalise(candidate));
    const allowed = candidate.length < 3 ? 0 : Math.ceil(candidate.length / 3);
    if (changes <= allowed && changes < fewest) [best, fewest] = [candidate, changes];
  }
  return best;
}

function normalise(word: string): string {
  return word.toLowerCase().replace(/[µμ]/g, 'u');
}

/** Letters to insert, remove or replace to turn `from` into `to` (Levenshtein's distance). */
function countChanges(from: string, to: string): number {
  let previous = Array.from({ length: to.length + 1 }, (_, column) => column);
  for (let row = 1; row <= from.length; row++) {
    const current = [row];
    for (let column = 1; column <= to.length; column++) {
      const replaced = (previous[column - 1] ?? 0) + (from[row - 1] === to[column - 1] ? 0 : 1);
      current.push(Math.min(replaced, (previous[column] ?? 0) + 1, (current[column - 1] ?? 0) + 1));
    }
    previous = current;
  }
  return previous[to.length] ?? 0;
}
