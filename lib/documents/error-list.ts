import { withThousands } from './describe-value';
import type { DocumentError } from './document-error';

/** As many errors as are told one by one. */
export const MOST_ERRORS = 1000;

/** As many errors as are counted; a document with more is bad beyond counting. */
const MOST_COUNTED = 100_000;

/** A list of errors that keeps the first ones and counts the rest. */
export interface ErrorList {
  /** @param explain makes the sentence; called only where the error is kept */
  add(pointer: string, explain: () => string): void;
  /** How many were added, told or only counted. */
  count(): number;
  /** Whether further errors would change nothing that a reader is told. */
  hasCountedEnough(): boolean;
  /** The kept errors; where more were added, a last one says how many. */
  toArray(): DocumentError[];
}

/** An empty list of errors. */
export function listErrors(): ErrorList {
  const kept: DocumentError[] = [];
  let count = 0;
  return {
    add(pointer, explain) {
      count += 1;
      if (kept.length < MOST_ERRORS) kept.push({ pointer, detail: explain() });
    },
    count: () => count,
    hasCountedEnough: () => count >= MOST_COUNTED,
    toArray: () => (count > kept.length ? [...kept, sayHowManyMore(count)] : [...kept]),
  };
}

function sayHowManyMore(count: number): DocumentError {
  const more = withThousands(Math.min(count, MOST_COUNTED) - MOST_ERRORS);
  const words = count < MOST_COUNTED ? more : `at least ${more}`;
  return { pointer: '', detail: `${words} more errors are not listed; mend these first` };
}
