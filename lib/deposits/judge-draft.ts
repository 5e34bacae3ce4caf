/** What a draft is, as far as it can be told of any JSON object: its title, its system, and what is wrong with it. */
import { computeInPool } from '@/lib/assessments/assessment-pool';
import type { DocumentError } from '@/lib/documents/document-error';
import { failed, type Outcome } from '@/lib/errors';
import { plainLine } from '@/schemas/plain-text';
import type { Problem } from '@/schemas/problem';

/** Longest title that lists show, in characters. */
const MOST_TITLE = 300;

/** A system's slug is never longer; more than that is no slug. */
const MOST_SLUG = 100;

export interface JudgedDraft {
  /** the document as it was sent */
  text: string;
  /** its title where it has one, else an empty text */
  title: string;
  /** the slug of the system that it names, else an empty text */
  system: string;
  errors: DocumentError[];
}

/**
 * Judges a working document in a worker thread, without assessing it.
 *
 * @returns a failure where it is not JSON or not an object; a draft that is merely not valid is no failure
 */
export async function judgeDraft(
  bytes: Uint8Array<ArrayBuffer>,
  signal: AbortSignal,
): Promise<Outcome<JudgedDraft>> {
  // With no points to spend, a valid document is found to be over its budget and not computed.
  const answer = await computeInPool(bytes.slice(), 0, signal);
  if (answer.kind === 'busy' || answer.kind === 'took-too-long') return failed(answer.kind);
  if (answer.kind === 'aborted') return failed('incomplete-body');
  let errors: DocumentError[] = [];
  if (answer.kind === 'refused') {
    const { detail, line, column, errors: found } = problemIn(answer.body);
    if (found === undefined) return failed('malformed-json', detail, { line, column });
    errors = found;
  }
  const text = new TextDecoder('utf-8', { ignoreBOM: true }).decode(bytes);
  const value: unknown = JSON.parse(withoutMark(text));
  if (value === null || typeof value !== 'object' || Array.isArray(value)) {
    const detail = 'a document is a JSON object, from { to }';
    return failed('invalid-document', 'A draft must be a JSON object.', {
      errors: [{ pointer: '', detail }],
    });
  }
  const { title, system } = value as { title?: unknown; system?: unknown };
  return {
    ok: true,
    text,
    title: shortText(title, MOST_TITLE),
    system: shortText(system, MOST_SLUG),
    errors,
  };
}

/** The text without the byte order mark that it may begin with. */
export function withoutMark(text: string): string {
  return text.charCodeAt(0) === 0xfeff ? text.slice(1) : text;
}

/** The problem that a worker wrote as JSON. */
export function problemIn(body: Uint8Array): Problem {
  return JSON.parse(new TextDecoder().decode(body)) as Problem;
}

function shortText(value: unknown, most: number): string {
  return typeof value === 'string' ? plainLine(value, most) : '';
}
