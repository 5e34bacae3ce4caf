/** Reads of API v1, made by the page: the same calls that outsiders use. */

/** What went wrong, in the words of the API's problem details. */
export class AnswerError extends Error {
  constructor(
    readonly title: string,
    readonly detail: string,
    readonly status: number | null,
  ) {
    super(title);
  }
}

/**
 * The JSON answer of a read.
 *
 * @throws AnswerError where there is none
 */
export async function fetchAnswer<T>(path: string, signal?: AbortSignal): Promise<T> {
  const answer = await reach(path, signal);
  if (answer.ok) return (await answer.json()) as T;
  const isProblem = answer.headers.get('Content-Type')?.startsWith('application/problem+json');
  const { title, detail } = isProblem ? await answer.json() : { title: undefined, detail: undefined };
  throw new AnswerError(
    title ?? `The server answered ${answer.status}`,
    detail ?? 'It did not say why.',
    answer.status,
  );
}

async function reach(path: string, signal?: AbortSignal): Promise<Response> {
  try {
    return await fetch(path, { signal, headers: { Accept: 'application/json' } });
  } catch (error) {
    if (signal?.aborted) throw error;
    throw new AnswerError('The server cannot be reached', 'Your connection may be down.', null);
  }
}
