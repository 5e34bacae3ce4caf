/** Texts as lists, letters and rows can hold them. */

/** Control characters, of which U+0000 ends a text when SQLite reads it, and halves of surrogate pairs. */
const UNFIT = /[\p{Cc}\p{Cs}]/gu;

/** The same but tab and line breaks. */
const UNFIT_IN_LINES = /(?![\t\n\r])[\p{Cc}\p{Cs}]/u;

/**
 * A text for one line: whatever is unfit becomes a space, and it is cut between characters.
 *
 * @param most characters (code points) at most
 */
export function plainLine(text: string, most = Number.POSITIVE_INFINITY): string {
  const plain = text.replace(UNFIT, ' ').trim();
  return plain.length <= most ? plain : [...plain].slice(0, most).join('').trim();
}

/** Whether a text of several lines can be kept and read as it is. */
export function isPlainText(text: string): boolean {
  return !UNFIT_IN_LINES.test(text);
}

/** What is said of a text that is not. */
export const UNPLAIN = 'must hold no control characters but tabs and line breaks';
