/** An error as the log holds it. */

/** Longest text of a statement or message that is kept, in characters. */
const MOST_TEXT = 2000;

/** Causes of causes that are followed. */
const MOST_CAUSES = 5;

interface DescribedError {
  type: string;
  message: string;
  code?: string;
  /** where it was thrown, without the message that a stack begins with */
  stack?: string;
  cause?: DescribedError;
}

/**
 * Its name, code, message, place and causes, and nothing else that may hang on it: a failed query carries the values
 * that it was to write. Of such a query the statement is kept without them.
 */
export function describeError(error: unknown, depth = 0): DescribedError {
  if (!(error instanceof Error)) return { type: typeof error, message: cut(String(error)) };
  const { code, query } = error as { code?: unknown; query?: unknown };
  return {
    type: error.name,
    message: cut(typeof query === 'string' ? `Failed query: ${query}` : error.message),
    ...(typeof code === 'string' ? { code } : {}),
    ...(error.stack === undefined ? {} : { stack: framesOf(error.stack) }),
    ...(error.cause === undefined || depth >= MOST_CAUSES
      ? {}
      : { cause: describeError(error.cause, depth + 1) }),
  };
}

function framesOf(stack: string): string {
  const lines = stack.split('\n').map((line) => line.trim());
  return lines.filter((line) => /^at .+:\d+:\d+\)?$/.test(line)).join('\n');
}

function cut(text: string): string {
  return text.length > MOST_TEXT ? `${text.slice(0, MOST_TEXT)} …` : text;
}
