/** Keeps the values of a statement that failed out of the error that is thrown: drafts, addresses, hashes. */
import { DrizzleQueryError } from 'drizzle-orm';

/**
 * Drizzle writes the values into message and stack, which Next prints by itself where a page throws. Drizzle sets
 * `params` before it takes the stack, so that is where the message is written anew without them.
 */
export function hideValuesOfFailedQueries(): void {
  Object.defineProperty(DrizzleQueryError.prototype, 'params', {
    configurable: true,
    get: () => [],
    set(this: DrizzleQueryError) {
      this.message = `Failed query: ${this.query}`;
    },
  });
}
