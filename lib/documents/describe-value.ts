/** Words for what a document holds and what it may hold, as they stand in the sentences of errors. */

const LONGEST_QUOTE = 40;

/** A text in quotation marks, shortened where it is long. */
export function quote(text: string): string {
  return text.length > LONGEST_QUOTE ? `“${text.slice(0, LONGEST_QUOTE)}…”` : `“${text}”`;
}

/** What a value is: `the text “0,41”`, `the number 3`, `null`, `a list`, `an object`. */
export function describeValue(value: unknown): string {
  if (typeof value === 'string') return value === '' ? 'an empty text' : `the text ${quote(value)}`;
  if (typeof value === 'number') {
    return Number.isFinite(value) ? `the number ${value}` : 'a number too large to be held';
  }
  if (Array.isArray(value)) return value.length === 0 ? 'an empty list' : 'a list';
  return typeof value === 'object' && value !== null ? 'an object' : String(value);
}

/** `a, b or c`. */
export function listWords(words: readonly string[], last: 'or' | 'and' = 'or'): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} ${last} ${words[words.length - 1]}`;
}

/** A count with thousands separated: `20,000`. */
export function withThousands(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+$)/g, ',');
}
