/** Calls of the API as outsiders make them, made by the pages; what fails comes as problem details. */
import type { Problem } from '@/schemas/problem';

/** What a page says of a call that failed: the server's problem, or that there was no answer. */
export type Complaint = Pick<Problem, 'title' | 'detail' | 'errors' | 'line' | 'column'> & {
  /** 0 where the server did not answer */
  status: number;
};

/** Thrown by a call that did not succeed. */
export class CallFailed extends Error {
  readonly complaint: Complaint;

  constructor(complaint: Complaint) {
    super(complaint.title);
    this.name = 'CallFailed';
    this.complaint = complaint;
  }
}

/**
 * @returns the answer's JSON; undefined where it has no body
 * @throws CallFailed
 */
export async function callApi<Answer>(path: string, init: RequestInit = {}): Promise<Answer> {
  let answer: Response;
  try {
    answer = await fetch(path, init);
  } catch {
    throw new CallFailed(NO_ANSWER);
  }
  if (answer.ok) return (answer.status === 204 ? undefined : await answer.json()) as Answer;
  throw new CallFailed(complaintOf(answer.status, await answer.text()));
}

/** For a call that nothing came back from. What was typed stays where it is. */
export const NO_ANSWER: Complaint = {
  status: 0,
  title: 'The server did not answer',
  detail: 'What you have here is kept. Check the connection and try again.',
};

/** What an answer that is no success says; one that is no problem document says only its number. */
export function complaintOf(status: number, body: string): Complaint {
  try {
    const { title, detail, errors, line, column }: Problem = JSON.parse(body);
    if (typeof title === 'string') return { status, title, detail, errors, line, column };
  } catch {
    // not ours: a proxy's page, or an answer that was cut off
  }
  return {
    status,
    title: 'Something went wrong',
    detail: `The server answered ${status} without saying why.`,
  };
}

/** The complaint in whatever a call threw. */
export function complaintIn(error: unknown): Complaint {
  if (error instanceof CallFailed) return error.complaint;
  return { status: 0, title: 'Something went wrong', detail: 'Try again; what you have here is kept.' };
}

/** A new Idempotency-Key: a call repeated under it has one effect. */
export function newKey(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}
