/**
 * From the bytes of a document to the bytes of the answer: parse, check, count, compute, write. Runs in a worker
 * thread, so that the thread that answers pages neither parses nor writes a large document.
 */
import { parseDocument } from '@/lib/documents/parse-document';
import { assess } from '@/lib/engine/assess';
import { type Failure, problemOf } from '@/lib/errors';

export type BodyAnswer =
  | { kind: 'assessed'; status: 200; points: number; body: Uint8Array<ArrayBuffer> }
  | { kind: 'refused'; status: number; body: Uint8Array<ArrayBuffer> }
  | { kind: 'over-budget'; points: number };

/**
 * The assessment of the document in `bytes`, or the problem that stands in its way, as JSON in UTF-8.
 *
 * @param pointsBudget most points that will be computed; a document with more is not computed at all
 */
export function assessBody(bytes: Uint8Array, pointsBudget: number): BodyAnswer {
  const parsed = parseDocument(bytes);
  if (!parsed.ok) {
    const failure = failureOf(parsed);
    const problem = problemOf(failure);
    return { kind: 'refused', status: problem.status, body: encode(problem) };
  }
  const points = parsed.document.series.reduce((sum, series) => sum + series.points.length, 0);
  if (points > pointsBudget) return { kind: 'over-budget', points };
  return { kind: 'assessed', status: 200, points, body: encode(assess(parsed.document)) };
}

type Unparsed = Extract<ReturnType<typeof parseDocument>, { ok: false }>;

function failureOf(parsed: Unparsed): Failure {
  if (parsed.reason === 'syntax') {
    const { line, column } = parsed;
    const detail = `Line ${line}, column ${column}: ${parsed.detail}.`;
    return { code: 'malformed-json', detail, members: { line, column } };
  }
  const count = parsed.errors.length;
  const detail =
    count === 1 ? 'One thing is wrong in the document.' : `${count} things are wrong in the document.`;
  return { code: 'invalid-document', detail, members: { errors: parsed.errors } };
}

function encode(value: unknown): Uint8Array<ArrayBuffer> {
  return new TextEncoder().encode(JSON.stringify(value));
}
