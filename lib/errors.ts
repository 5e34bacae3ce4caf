/** The short list of ways in which a call can fail, and what each is in HTTP and in words. */
import type { Problem } from '@/schemas/problem';

interface ErrorKind {
  status: number;
  title: string;
  meaning: string;
}

export const ERRORS = {
  'bad-parameter': {
    status: 400,
    title: 'A parameter of the address is not right',
    meaning: '`detail` names the parameter and says what would be right.',
  },
  'bad-header': {
    status: 400,
    title: 'A header is not right',
    meaning: '`detail` names the header and says what would be right.',
  },
  'malformed-json': {
    status: 400,
    title: 'The body is not JSON',
    meaning: 'The body could not be read as JSON; `line` and `column` say where reading stopped.',
  },
  unauthenticated: {
    status: 401,
    title: 'Sign in first',
    meaning: 'This needs a session or a laboratory token.',
  },
  'cross-site': {
    status: 403,
    title: 'Call from another site',
    meaning: 'A browser sent this call for a page of another site. Pages of this site and scripts may call.',
  },
  forbidden: { status: 403, title: 'Not allowed', meaning: 'You may not do this.' },
  'not-found': { status: 404, title: 'Not found', meaning: 'There is nothing at this address.' },
  'method-not-allowed': {
    status: 405,
    title: 'Method not allowed',
    meaning: 'The address exists, but not for this method; the Allow header lists those that it takes.',
  },
  'not-acceptable': {
    status: 406,
    title: 'None of these forms',
    meaning: 'This cannot be sent in any of the forms that the Accept header asks for.',
  },
  conflict: {
    status: 409,
    title: 'Not in this state',
    meaning: 'The state in which this is does not allow it; load it again to see what changed.',
  },
  withdrawn: {
    status: 410,
    title: 'The dataset was withdrawn',
    meaning: 'Its data are no longer given out; its metadata stay, with the reason and the date.',
  },
  stale: {
    status: 412,
    title: 'Changed meanwhile',
    meaning: 'If-Match names another version than the present one; load it again and repeat the change.',
  },
  'incomplete-body': {
    status: 400,
    title: 'The body did not arrive whole',
    meaning: 'The connection ended before the whole body had arrived.',
  },
  'body-too-large': {
    status: 413,
    title: 'The body is too large',
    meaning: 'A document may have at most 8 MiB (8,388,608 bytes).',
  },
  'file-too-large': {
    status: 413,
    title: 'The file is too large',
    meaning: 'A file may have at most 100 MiB (104,857,600 bytes).',
  },
  'not-json-type': {
    status: 415,
    title: 'The body must be application/json',
    meaning: 'Send the document with the header Content-Type: application/json, uncompressed.',
  },
  'not-plain-file': {
    status: 415,
    title: 'Send the file itself',
    meaning: 'The body is the bytes of the file and nothing else, not a form (multipart/form-data).',
  },
  'empty-file': {
    status: 422,
    title: 'The file is empty',
    meaning: 'A file of no bytes is not kept: it is most often one that was not sent.',
  },
  'invalid-document': {
    status: 422,
    title: 'The document is not valid',
    meaning: '`errors` lists everything that is wrong, each with its place and what would be right.',
  },
  'invalid-input': {
    status: 422,
    title: 'Something is not filled in right',
    meaning: '`errors` lists what is wrong, each with its place and what would be right.',
  },
  'choose-laboratory': {
    status: 422,
    title: 'Which laboratory?',
    meaning: 'You belong to several laboratories; name the one that deposits as ?lab= in the address.',
  },
  'digest-mismatch': {
    status: 422,
    title: 'The file arrived changed',
    meaning: 'Its SHA-256 is not the one that was declared with it; nothing was kept. Send it again.',
  },
  'idempotency-mismatch': {
    status: 422,
    title: 'The key was used for something else',
    meaning: 'An Idempotency-Key belongs to one body; take a new key for another one.',
  },
  'precondition-required': {
    status: 428,
    title: 'If-Match is needed',
    meaning: 'Send the ETag that you last loaded as If-Match, so that nobody else’s change is lost.',
  },
  'too-many-calls': {
    status: 429,
    title: 'Too many calls',
    meaning: 'The calls for the minute are used up; Retry-After says when there are more.',
  },
  'too-many-points': {
    status: 429,
    title: 'Too many points',
    meaning: 'The points for the minute are used up; Retry-After says when there are enough.',
  },
  'too-many-at-once': {
    status: 429,
    title: 'Too many at once',
    meaning: 'Other calls of yours are still being computed; wait for their answers.',
  },
  unexpected: {
    status: 500,
    title: 'Something went wrong here',
    meaning: 'The fault is on our side and has been noted in the log.',
  },
  busy: {
    status: 503,
    title: 'Busy',
    meaning: 'More is waiting to be computed than can be held; Retry-After says when to try again.',
  },
  'took-too-long': {
    status: 503,
    title: 'The computation took too long',
    meaning: 'The computation was stopped after 30 seconds.',
  },
  unavailable: {
    status: 503,
    title: 'Not available at the moment',
    meaning: 'A part that this call needs does not answer; /api/v1/health says which.',
  },
} as const satisfies Record<string, ErrorKind>;

export type ErrorCode = keyof typeof ERRORS;

export interface Failure {
  code: ErrorCode;
  /** what would be right here; the general meaning where left out */
  detail?: string;
  members?: Pick<Problem, 'line' | 'column' | 'errors'>;
  /** after how many seconds it may work */
  retryAfterSeconds?: number;
}

/** What a verb comes to where it fails. */
export interface Failed {
  ok: false;
  failure: Failure;
  /** the permission table said no to somebody; goes on the audit trail */
  refused?: true;
}

/** What a verb comes to. */
export type Outcome<T> = ({ ok: true } & T) | Failed;

/** The outcome of a verb that failed in that way. */
export function failed(code: ErrorCode, detail?: string, members?: Failure['members']): Failed {
  return {
    ok: false,
    failure: { code, ...(detail ? { detail } : {}), ...(members ? { members } : {}) },
  };
}

/** Whether a text is one of the codes. */
export function isErrorCode(text: string): text is ErrorCode {
  return Object.hasOwn(ERRORS, text);
}

/** The failure as problem details. */
export function problemOf({ code, detail, members }: Failure): Problem {
  const { status, title, meaning } = ERRORS[code];
  return { type: `/api/v1/problems/${code}`, title, status, detail: detail ?? meaning, ...members };
}

/** The failure as an HTTP answer: the one place where a code becomes a status. */
export function problemResponse(failure: Failure, headers: Record<string, string> = {}): Response {
  const problem = problemOf(failure);
  const { retryAfterSeconds } = failure;
  return new Response(JSON.stringify(problem), {
    status: problem.status,
    headers: {
      'Content-Type': 'application/problem+json',
      'Cache-Control': 'no-store',
      // RFC 9110, 11.6.1: a 401 says how to identify oneself.
      ...(problem.status === 401 ? { 'WWW-Authenticate': 'Bearer realm="Curvekeep"' } : {}),
      ...(retryAfterSeconds === undefined ? {} : { 'Retry-After': String(retryAfterSeconds) }),
      ...headers,
    },
  });
}
