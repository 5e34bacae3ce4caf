/**
 * From the bytes of a call to the bytes of its answer: read, check, fit, write. Runs in a worker thread, so that the
 * thread that answers pages neither parses nor writes a large document.
 */
import { invalidInput } from '@/lib/auth/input-errors';
import { checkDocument } from '@/lib/documents/check-document';
import { checkFree } from '@/lib/documents/check-free';
import { findSyntaxError } from '@/lib/documents/find-syntax-error';
import { readText } from '@/lib/documents/read-text';
import { type RefitProgress, refit } from '@/lib/engine/refit';
import { type Failure, problemOf } from '@/lib/errors';
import { freeListSchema } from '@/schemas/refit';

export interface RefitAnswer {
  status: number;
  /** JSON in UTF-8 */
  body: Uint8Array<ArrayBuffer>;
}

/** The refit that `bytes` ask for, or the problem that stands in its way. */
export function refitBody(bytes: Uint8Array, onProgress: (progress: RefitProgress) => void): RefitAnswer {
  const read = readBody(bytes);
  if ('failure' in read) return problemAnswer(read.failure);
  const { document, free, ...rest } = read.body;
  const listed = freeListSchema.safeParse(free);
  const checked = checkDocument(document);
  const errors = [
    ...Object.keys(rest).map((name) => ({ pointer: `/${name}`, detail: 'unknown property' })),
    ...(checked.ok
      ? []
      : checked.errors.map((error) => ({ ...error, pointer: `/document${error.pointer}` }))),
    ...(listed.success ? [] : freeErrors(listed.error)),
  ];
  if (!checked.ok || !listed.success || errors.length > 0) return problemAnswer(invalid(errors));
  const impossible = checkFree(checked.document, listed.data);
  if (impossible.length > 0) return problemAnswer(invalid(impossible));
  return { status: 200, body: encode(refit(checked.document, listed.data, { onProgress })) };
}

/** A failure as the answer of a refit. */
export function problemAnswer(failure: Failure): RefitAnswer {
  const problem = problemOf(failure);
  return { status: problem.status, body: encode(problem) };
}

type Errors = NonNullable<Failure['members']>['errors'];

function invalid(errors: NonNullable<Errors>): Failure {
  const { length } = errors;
  const detail = length === 1 ? 'One thing is wrong in the body.' : `${length} things are wrong in the body.`;
  return { code: 'invalid-input', detail, members: { errors } };
}

function freeErrors(error: Parameters<typeof invalidInput>[0]): NonNullable<Errors> {
  const errors = invalidInput(error).members?.errors ?? [];
  return errors.map(({ pointer, detail }) => ({ pointer: `/free${pointer}`, detail }));
}

function readBody(bytes: Uint8Array): { body: Record<string, unknown> } | { failure: Failure } {
  const read = readText(bytes);
  if (!read.ok) return { failure: malformed(read) };
  let body: unknown;
  try {
    body = JSON.parse(read.text);
  } catch {
    return { failure: malformed(findSyntaxError(read.text)) };
  }
  if (typeof body === 'object' && body !== null && !Array.isArray(body))
    return { body: body as Record<string, unknown> };
  return { failure: invalid([{ pointer: '', detail: 'must be an object with document and free' }]) };
}

function malformed({ line, column, detail }: { line: number; column: number; detail: string }): Failure {
  return {
    code: 'malformed-json',
    detail: `Line ${line}, column ${column}: ${detail}.`,
    members: { line, column },
  };
}

function encode(value: unknown): Uint8Array<ArrayBuffer> {
  return new TextEncoder().encode(JSON.stringify(value));
}
