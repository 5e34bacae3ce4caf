/** The call that outsiders use, made by the page: a document in, its assessment or what is wrong with it out. */
import type { Assessment } from '@/lib/engine/assessment';
import type { Problem } from '@/schemas/problem';

export type AssessmentAnswer = { ok: true; assessment: Assessment } | { ok: false; problem: Problem };

/**
 * @param body a dataset document as JSON text
 * @throws TypeError where the server cannot be reached
 */
export async function requestAssessment(body: string, signal?: AbortSignal): Promise<AssessmentAnswer> {
  const answer = await fetch('/api/v1/assessments', {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body,
    signal,
  });
  if (answer.ok) return { ok: true, assessment: await answer.json() };
  const isProblem = answer.headers.get('Content-Type')?.startsWith('application/problem+json');
  if (isProblem)
    return { ok: false, problem: withWait(await answer.json(), answer.headers.get('Retry-After')) };
  throw new TypeError(`The server answered ${answer.status} without saying why.`);
}

function withWait(problem: Problem, seconds: string | null): Problem {
  if (seconds === null) return problem;
  return { ...problem, detail: `${problem.detail} Try again in ${seconds} s.` };
}
