/** The depositing part of the API's description: drafts, submissions, files, decisions. */
import type { z } from 'zod';
import { sessionCookieName } from '@/lib/auth/session';
import type { ErrorCode } from '@/lib/errors';
import { assessmentSchema } from '@/schemas/assessment';
import { decisionSchema } from '@/schemas/decision';
import {
  depositHeadSchema,
  depositListSchema,
  depositQuerySchema,
  depositSchema,
  savedDepositSchema,
  submittedDepositSchema,
} from '@/schemas/deposit';
import { fileListSchema, fileSchema } from '@/schemas/file';
import { problems, type Registry, type Responses, text } from './describe-answers';

type Route = Omit<Parameters<Registry['registerPath']>[0], 'responses' | 'security'>;

/** A lab token, or the cookie of somebody who signed in; the cookie's name depends on how the site is served. */
const SECURITY: Record<string, string[]>[] = [{ labToken: [] }, { session: [] }];
const ETAG = { ETag: text('The version in quotes; send it back as If-Match') };
const READ_ETAG = {
  ETag: text('Begins with the version; send it back as If-Match, which reads the version alone'),
};
const CONTENT_ETAG = { ETag: text('Changes only with the content') };
const LOCATION = { Location: text('Address of what was made') };
const NOT_MODIFIED: Responses = { 304: { description: 'Not changed since the ETag in If-None-Match' } };
const GONE: Responses = { 204: { description: 'It is gone' } };

const ID = parameter('path', 'id', 'Of the deposit');
const FILE_ID = parameter('path', 'fileId', 'Of the file');
const IF_MATCH = parameter('header', 'If-Match', 'ETag of the version that is changed', true);
const IDEMPOTENCY_KEY = parameter(
  'header',
  'Idempotency-Key',
  'Repeated within 24 hours: one effect, one answer',
);

const ONE = '/api/v1/deposits/{id}';
const ANYBODY_FAILS: ErrorCode[] = ['unauthenticated', 'not-found', 'unexpected'];
const DOCUMENT_FAILS: ErrorCode[] = [
  'malformed-json',
  'incomplete-body',
  'body-too-large',
  'not-json-type',
  'invalid-document',
];
const WRITING_FAILS: ErrorCode[] = ['cross-site', 'forbidden'];
const COMPUTING_FAILS: ErrorCode[] = ['busy', 'took-too-long'];
const LIMIT_FAILS: ErrorCode[] = ['too-many-calls', 'too-many-points', 'too-many-at-once'];
const KEY_FAILS: ErrorCode[] = ['bad-header', 'idempotency-mismatch'];

/** Adds the calls by which deposits are made and decided on. */
export function registerDeposits(registry: Registry): void {
  registry.registerComponent('securitySchemes', 'labToken', {
    type: 'http',
    scheme: 'bearer',
    description: 'A token that a laboratory’s manager made',
  });
  registry.registerComponent('securitySchemes', 'session', {
    type: 'apiKey',
    in: 'cookie',
    name: sessionCookieName(),
    description: 'The cookie of somebody who signed in',
  });
  const add = (route: Route, responses: Responses, ...codes: ErrorCode[]) =>
    registry.registerPath({
      ...route,
      security: SECURITY,
      responses: { ...responses, ...problems(...ANYBODY_FAILS, ...codes) },
    });
  registerDrafts(add);
  registerSubmissions(add);
  registerFiles(add);
}

type Add = (route: Route, responses: Responses, ...codes: ErrorCode[]) => void;

function registerDrafts(add: Add): void {
  const document = {
    required: true,
    content: { 'application/json': { schema: { type: 'object' } } },
  } as const;
  add(
    {
      method: 'post',
      path: '/api/v1/deposits',
      operationId: 'createDeposit',
      summary: 'A new draft from any JSON object; what is wrong with it as a document is told',
      parameters: [
        parameter('query', 'lab', 'Slug of the laboratory, for people of several'),
        parameter('header', 'Curvekeep-Lab', 'The same, where the address has no lab'),
        IDEMPOTENCY_KEY,
      ],
      request: { body: document },
    },
    json(201, savedDepositSchema, { ...LOCATION, ...ETAG }),
    ...[...DOCUMENT_FAILS, ...WRITING_FAILS, ...COMPUTING_FAILS, ...KEY_FAILS],
    'choose-laboratory',
  );
  add(
    {
      method: 'get',
      path: '/api/v1/deposits',
      operationId: 'listDeposits',
      summary: 'Deposits of the caller’s laboratories, the last changed first',
      request: { query: depositQuerySchema },
    },
    {
      ...json(200, depositListSchema, {
        ...CONTENT_ETAG,
        Link: text('Address of the next page, rel="next"; none on the last one'),
      }),
      ...NOT_MODIFIED,
    },
    'bad-parameter',
    'forbidden',
  );
  add(
    {
      method: 'get',
      path: ONE,
      operationId: 'readDeposit',
      summary: 'One deposit, its document in it',
      parameters: [ID],
    },
    { ...json(200, depositSchema, READ_ETAG), ...NOT_MODIFIED },
  );
  add(
    {
      method: 'put',
      path: ONE,
      operationId: 'saveDraft',
      summary: 'Put another document in the place of a draft’s',
      parameters: [ID, IF_MATCH],
      request: { body: document },
    },
    json(200, savedDepositSchema, ETAG),
    ...[...DOCUMENT_FAILS, ...WRITING_FAILS, ...COMPUTING_FAILS],
    ...(['conflict', 'stale', 'precondition-required'] as const),
  );
  add(
    {
      method: 'delete',
      path: ONE,
      operationId: 'deleteDraft',
      summary: 'Delete a draft',
      parameters: [ID, IF_MATCH],
    },
    GONE,
    ...WRITING_FAILS,
    ...(['conflict', 'stale', 'precondition-required'] as const),
  );
}

function registerSubmissions(add: Add): void {
  add(
    {
      method: 'post',
      path: `${ONE}/submission`,
      operationId: 'submitDeposit',
      summary: 'Submit the document as it stands: an immutable revision with its assessment',
      description:
        'Whoever submits declares, as the page asks: document and files hold no personal or patient-identifiable data, ' +
        'and the work followed the biosafety and chemical-safety rules that apply where it was done. There is no body.',
      parameters: [
        ID,
        parameter('header', 'If-Match', 'Submits only this version; another one is 412'),
        IDEMPOTENCY_KEY,
      ],
    },
    json(200, submittedDepositSchema, ETAG),
    ...[...WRITING_FAILS, ...COMPUTING_FAILS, ...KEY_FAILS],
    ...(['conflict', 'stale', 'invalid-document'] as const),
  );
  add(
    {
      method: 'delete',
      path: `${ONE}/submission`,
      operationId: 'recallDeposit',
      summary: 'Recall a submission that nobody has begun to review',
      parameters: [ID],
    },
    json(200, depositHeadSchema, ETAG),
    ...WRITING_FAILS,
    'conflict',
  );
  add(
    {
      method: 'get',
      path: `${ONE}/assessment`,
      operationId: 'readDepositAssessment',
      summary: 'The assessment of the draft as it stands, or of the newest revision',
      parameters: [ID],
    },
    { ...json(200, assessmentSchema, CONTENT_ETAG), ...NOT_MODIFIED },
    ...[...COMPUTING_FAILS, ...LIMIT_FAILS],
    'invalid-document',
  );
  add(
    {
      method: 'post',
      path: `${ONE}/decision`,
      operationId: 'decideDeposit',
      summary:
        'A curator accepts, which publishes at once or on a day, asks for changes, or declines for good',
      parameters: [ID, IDEMPOTENCY_KEY],
      request: { body: { required: true, content: { 'application/json': { schema: decisionSchema } } } },
    },
    json(200, depositHeadSchema, ETAG),
    ...[...WRITING_FAILS, ...KEY_FAILS],
    ...(['conflict', 'malformed-json', 'body-too-large', 'not-json-type', 'invalid-input'] as const),
  );
}

function registerFiles(add: Add): void {
  const bytes = { 'application/octet-stream': { schema: { type: 'string', format: 'binary' } } } as const;
  add(
    {
      method: 'post',
      path: `${ONE}/files`,
      operationId: 'attachFile',
      summary: 'Keep an original file with a draft',
      description:
        'The body is the bytes of the file, 1 to 104,857,600 of them, and no form; a deposit has at most 100 files.',
      parameters: [
        ID,
        parameter('query', 'name', 'Of the file; or in Content-Disposition'),
        parameter('header', 'Content-Digest', 'sha-256=:base64:, checked on arrival; Repr-Digest as well'),
        IDEMPOTENCY_KEY,
      ],
      request: { body: { required: true, content: bytes } },
    },
    json(201, fileSchema, LOCATION),
    ...[...WRITING_FAILS, ...KEY_FAILS],
    ...([
      'bad-parameter',
      'conflict',
      'file-too-large',
      'not-plain-file',
      'empty-file',
      'digest-mismatch',
      'incomplete-body',
      'unavailable',
    ] as const),
  );
  add(
    {
      method: 'get',
      path: `${ONE}/files`,
      operationId: 'listFiles',
      summary: 'The files of a deposit',
      parameters: [ID],
    },
    { ...json(200, fileListSchema, CONTENT_ETAG), ...NOT_MODIFIED },
  );
  add(
    {
      method: 'get',
      path: `${ONE}/files/{fileId}`,
      operationId: 'readFile',
      summary: 'A file, byte for byte; of a published deposit anybody may read it',
      parameters: [ID, FILE_ID],
    },
    {
      200: {
        description: 'The bytes, as an attachment',
        headers: {
          ETag: text('SHA-256 of the bytes'),
          'Content-Length': text('Bytes'),
          'Repr-Digest': text('SHA-256 of the bytes (RFC 9530)'),
        },
        content: { '*/*': { schema: { type: 'string', format: 'binary' } } },
      },
      ...NOT_MODIFIED,
    },
    'unavailable',
  );
  add(
    {
      method: 'delete',
      path: `${ONE}/files/{fileId}`,
      operationId: 'removeFile',
      summary: 'Take a file from a draft',
      parameters: [ID, FILE_ID],
    },
    GONE,
    ...WRITING_FAILS,
    'conflict',
  );
}

function json(
  status: number,
  schema: z.ZodType,
  headers: Record<string, ReturnType<typeof text>> = {},
): Responses {
  return { [status]: { description: 'Done', headers, content: { 'application/json': { schema } } } };
}

function parameter(
  place: 'path' | 'query' | 'header',
  name: string,
  description: string,
  required = place === 'path',
) {
  return { name, in: place, description, required, schema: { type: 'string' } } as const;
}
