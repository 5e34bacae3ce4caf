/** From a draft to a published dataset over HTTP, by scripts with tokens and by people with sessions. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { closeDatabase } from '@/db/client';
import type { Membership } from '@/lib/auth/actor';
import { parseDocument } from '@/lib/documents/parse-document';
import { assess } from '@/lib/engine/assess';
import {
  depositListSchema,
  depositSchema,
  savedDepositSchema,
  submittedDepositSchema,
} from '@/schemas/deposit';
import { problemSchema } from '@/schemas/problem';
import { makeLab } from '@/tests/support/collection';
import { call, sessionHeader, settleIn, tokenHeader } from '@/tests/support/deposit-calls';
import { exampleDocument } from '@/tests/support/example-document';
import { type RunningApp, startApp } from '@/tests/support/start-app';

type Headers = Record<string, string>;

let app: RunningApp;
let lab: Membership;
let token: Headers;
let otherToken: Headers;
let curator: Headers;
beforeAll(async () => {
  app = await startApp();
  lab = await settleIn(app);
  token = await tokenHeader(lab);
  otherToken = await tokenHeader(await makeLab('elsewhere'));
  curator = (await sessionHeader('curator')).headers;
});
afterAll(async () => {
  await closeDatabase();
  await app.stop();
});

async function codeOf(response: Response): Promise<string> {
  expect(response.headers.get('content-type')).toBe('application/problem+json');
  const problem = problemSchema.parse(await response.json());
  expect(problem.status).toBe(response.status);
  return problem.type.replace('/api/v1/problems/', '');
}

async function draft(document: unknown = exampleDocument(), headers: Headers = {}): Promise<string> {
  const response = await call(app, 'POST', '/deposits', { ...token, ...headers }, document);
  expect(response.status).toBe(201);
  return savedDepositSchema.parse(await response.json()).id;
}

const read = async (id: string, headers = token) =>
  depositSchema.parse(await (await call(app, 'GET', `/deposits/${id}`, headers)).json());

describe('a deposit', () => {
  it('goes from a draft through a request for changes to a published dataset', async () => {
    const created = await call(app, 'POST', '/deposits', token, { title: 'Not finished' });
    expect(created.status).toBe(201);
    expect(created.headers.get('etag')).toBe('"1"');
    const { id, errors } = savedDepositSchema.parse(await created.json());
    expect(created.headers.get('location')).toBe(`/api/v1/deposits/${id}`);
    expect(errors.length).toBeGreaterThan(5);

    const early = await call(app, 'POST', `/deposits/${id}/submission`, token);
    expect(early.status).toBe(422);
    expect(problemSchema.parse(await early.json()).errors?.map(({ pointer }) => pointer)).toContain(
      '/system',
    );

    const document = exampleDocument({ series: 2, pointsPerSeries: 12 });
    const saved = await call(app, 'PUT', `/deposits/${id}`, { ...token, 'If-Match': '"1"' }, document);
    expect([saved.status, saved.headers.get('etag')]).toEqual([200, '"2"']);
    expect(savedDepositSchema.parse(await saved.json()).errors).toEqual([]);

    const submitted = await call(app, 'POST', `/deposits/${id}/submission`, { ...token, 'If-Match': '"2"' });
    expect(submittedDepositSchema.parse(await submitted.json())).toMatchObject({
      state: 'submitted',
      revision: 1,
    });

    const asking = { kind: 'changes-requested', letter: 'Please name the buffer.' };
    const asked = await call(app, 'POST', `/deposits/${id}/decision`, curator, asking);
    expect(asked.status).toBe(200);
    expect((await read(id)).decisions).toMatchObject([{ ...asking, revision: 1 }]);

    const better = { ...document, abstract: 'Invented example; 20 mM buffer.' };
    const { version } = await read(id);
    await call(app, 'PUT', `/deposits/${id}`, { ...token, 'If-Match': `"${version}"` }, better);
    const again = await call(app, 'POST', `/deposits/${id}/submission`, token);
    expect(submittedDepositSchema.parse(await again.json()).revision).toBe(2);

    const accepted = await call(app, 'POST', `/deposits/${id}/decision`, curator, {
      kind: 'accepted',
      revision: 2,
    });
    expect(accepted.status).toBe(200);
    const published = await read(id);
    expect(published).toMatchObject({ state: 'published', accession: expect.stringMatching(/^CK-\d{6}$/) });
    expect(published.revisions.map(({ number, publishedAt }) => [number, publishedAt !== null])).toEqual([
      [2, true],
      [1, false],
    ]);

    const assessment = await (await call(app, 'GET', `/deposits/${id}/assessment`, token)).json();
    const parsed = parseDocument(JSON.stringify(better));
    if (!parsed.ok) throw new Error('not valid');
    expect(assessment).toEqual(JSON.parse(JSON.stringify(assess(parsed.document))));
  });

  it('is given back byte for byte, with an ETag that is honoured', async () => {
    const text = '\n{ "title":"Spaces  \\u00e9 and \u2028 kept",\t"number": 1.0e+2, "number": 0 }\n';
    const id = await draft(text);
    const response = await call(app, 'GET', `/deposits/${id}`, token);
    const body = await response.text();
    expect(body).toContain(`"document":${text}}`);
    expect(() => depositSchema.parse(JSON.parse(body))).not.toThrow();
    const etag = response.headers.get('etag') ?? '';
    const same = await call(app, 'GET', `/deposits/${id}`, { ...token, 'If-None-Match': etag });
    expect([same.status, await same.text(), same.headers.get('etag')]).toEqual([304, '', etag]);
  });

  it('has one ETag for its laboratory and another for a curator, and says on what it depends', async () => {
    const id = await draft();
    await call(app, 'POST', `/deposits/${id}/submission`, token);
    const asking = { kind: 'changes-requested', letter: 'Please name the buffer.' };
    await call(app, 'POST', `/deposits/${id}/decision`, curator, asking);
    const responses = await Promise.all(
      [token, curator].map((headers) => call(app, 'GET', `/deposits/${id}`, headers)),
    );
    const [own, seen] = responses.map((response) => response.headers.get('etag') ?? '');
    expect(own).not.toBe(seen);
    for (const { headers } of responses) expect(headers.get('vary')).toContain('Cookie, Authorization');
    const crossed = await call(app, 'GET', `/deposits/${id}`, { ...curator, 'If-None-Match': own });
    expect(crossed.status).toBe(200);
    const saved = await call(app, 'PUT', `/deposits/${id}`, { ...token, 'If-Match': own }, exampleDocument());
    expect(saved.status).toBe(200);
    const stale = await call(app, 'PUT', `/deposits/${id}`, { ...token, 'If-Match': own }, exampleDocument());
    expect(stale.status).toBe(412);
  });

  it('gives its assessment once under an ETag', async () => {
    const id = await draft();
    const path = `/deposits/${id}/assessment`;
    const etag = (await call(app, 'GET', path, token)).headers.get('etag') ?? '';
    const again = await call(app, 'GET', path, { ...token, 'If-None-Match': etag });
    expect([again.status, again.headers.get('etag')]).toEqual([304, etag]);
  });

  it('begins with a byte order mark without harm', async () => {
    const id = await draft(`\ufeff${JSON.stringify(exampleDocument())}`);
    expect((await read(id)).document).toEqual(exampleDocument());
    expect((await call(app, 'POST', `/deposits/${id}/submission`, token)).status).toBe(200);
  });

  it('is not changed without If-Match, nor with a stale or weak one, nor in the wrong state', async () => {
    const id = await draft();
    const put = (headers: Headers) =>
      call(app, 'PUT', `/deposits/${id}`, { ...token, ...headers }, { title: 'x' });
    expect(await codeOf(await put({}))).toBe('precondition-required');
    expect(await codeOf(await put({ 'If-Match': '"7"' }))).toBe('stale');
    expect(await codeOf(await put({ 'If-Match': 'W/"1"' }))).toBe('stale');
    expect((await put({ 'If-Match': '"9", "1"' })).status).toBe(200);
    expect(await codeOf(await put({ 'If-Match': '"1"' }))).toBe('stale');
    const submitted = await draft();
    await call(app, 'POST', `/deposits/${submitted}/submission`, token);
    const late = await call(app, 'PUT', `/deposits/${submitted}`, { ...token, 'If-Match': '"1"' }, {});
    expect([late.status, await codeOf(late)]).toEqual([409, 'conflict']);
  });

  it('keeps every update of sixteen parallel writers', async () => {
    const id = await draft({ count: 0 });
    const increment = async () => {
      for (;;) {
        const got = await call(app, 'GET', `/deposits/${id}`, token);
        const { document } = (await got.json()) as { document: { count: number } };
        const headers = { ...token, 'If-Match': got.headers.get('etag') ?? '' };
        const { status } = await call(app, 'PUT', `/deposits/${id}`, headers, { count: document.count + 1 });
        if (status === 200) return;
        expect(status).toBe(412);
      }
    };
    await Promise.all(Array.from({ length: 16 }, increment));
    expect(await read(id)).toMatchObject({ document: { count: 16 }, version: 17 });
  });

  it('can be recalled, and deleted as a draft', async () => {
    const id = await draft();
    await call(app, 'POST', `/deposits/${id}/submission`, token);
    const kept = await call(app, 'DELETE', `/deposits/${id}`, { ...token, 'If-Match': '*' });
    expect(await codeOf(kept)).toBe('conflict');
    const recalled = await call(app, 'DELETE', `/deposits/${id}/submission`, token);
    expect(await recalled.json()).toMatchObject({ state: 'draft', version: 3 });
    expect(await codeOf(await call(app, 'DELETE', `/deposits/${id}`, token))).toBe('precondition-required');
    const deleted = await call(app, 'DELETE', `/deposits/${id}`, { ...token, 'If-Match': '"3"' });
    expect(deleted.status).toBe(204);
    expect(await codeOf(await call(app, 'GET', `/deposits/${id}`, token))).toBe('not-found');
  });

  it('is made once under an Idempotency-Key, and the answer is the same', async () => {
    const send = (document: unknown) =>
      call(app, 'POST', '/deposits', { ...token, 'Idempotency-Key': 'one-draft' }, document);
    const [first, second] = [await send(exampleDocument()), await send(exampleDocument())];
    expect([second.status, second.headers.get('location')]).toEqual([201, first.headers.get('location')]);
    expect(await second.json()).toEqual(await first.json());
    const other = await send({ title: 'another' });
    expect([other.status, await codeOf(other)]).toEqual([422, 'idempotency-mismatch']);
    const odd = await call(app, 'POST', '/deposits', { ...token, 'Idempotency-Key': 'with space' }, {});
    expect(await codeOf(odd)).toBe('bad-header');
  });

  it('takes nothing of state, role and lab from its body', async () => {
    const sly = {
      ...exampleDocument(),
      state: 'published',
      role: 'administrator',
      lab: 'elsewhere',
      accession: 'CK-000001',
    };
    const deposit = await read(await draft(sly));
    expect(deposit).toMatchObject({ state: 'draft', accession: null, laboratory: { slug: lab.labSlug } });
  });
});

describe('what is refused', () => {
  it('with a token that does not hold is told so', async () => {
    for (const Authorization of ['Bearer ckt_wrong', 'Basic eDp5', `${token.Authorization}x`]) {
      const response = await call(app, 'GET', '/deposits', { Authorization });
      expect(response.status).toBe(401);
      expect(problemSchema.parse(await response.json()).detail).toContain('is not valid');
    }
    const visitor = problemSchema.parse(await (await call(app, 'GET', '/deposits')).json());
    expect(visitor.detail).not.toContain('is not valid');
  });

  it('without credentials is 401, whether or not there is such a deposit', async () => {
    const id = await draft();
    for (const [method, path, body] of [
      ['POST', '/deposits', {}],
      ['GET', '/deposits', undefined],
      ['GET', `/deposits/${id}`, undefined],
      ['GET', '/deposits/nothing', undefined],
      ['PUT', `/deposits/${id}`, {}],
      ['DELETE', `/deposits/${id}`, undefined],
      ['POST', `/deposits/${id}/submission`, undefined],
      ['GET', `/deposits/${id}/assessment`, undefined],
      ['POST', `/deposits/${id}/decision`, { kind: 'accepted' }],
    ] as const) {
      const response = await call(app, method, path, {}, body);
      expect([method, path, response.status]).toEqual([method, path, 401]);
      expect(response.headers.get('www-authenticate')).toMatch(/^Bearer/);
      expect(await codeOf(response)).toBe('unauthenticated');
    }
    const wrong = await call(app, 'GET', `/deposits/${id}`, { Authorization: 'Bearer ckt_wrong' });
    expect(wrong.status).toBe(401);
  });

  it('to another laboratory is as if it were not there', async () => {
    const id = await draft();
    const ifMatch = { 'If-Match': '"1"' };
    for (const headers of [otherToken, curator]) {
      for (const [method, path, body] of [
        ['GET', `/deposits/${id}`, undefined],
        ['PUT', `/deposits/${id}`, {}],
        ['DELETE', `/deposits/${id}`, undefined],
        ['POST', `/deposits/${id}/submission`, undefined],
        ['GET', `/deposits/${id}/assessment`, undefined],
        ['GET', `/deposits/${id}/files`, undefined],
      ] as const) {
        const response = await call(app, method, path, { ...headers, ...ifMatch }, body);
        expect([method, path, response.status]).toEqual([method, path, 404]);
      }
    }
    expect((await read(id)).version).toBe(1);
  });

  it('to a token without the scope, to a depositor who decides, to a curator of the laboratory is 403', async () => {
    const id = await draft();
    const reading = await tokenHeader(lab, ['read-drafts']);
    expect((await call(app, 'POST', '/deposits', reading, {})).status).toBe(403);
    expect((await call(app, 'POST', `/deposits/${id}/submission`, reading)).status).toBe(403);
    await call(app, 'POST', `/deposits/${id}/submission`, token);
    const own = (await sessionHeader('curator', lab)).headers;
    for (const headers of [token, own]) {
      const decided = await call(app, 'POST', `/deposits/${id}/decision`, headers, { kind: 'accepted' });
      expect([decided.status, await codeOf(decided)]).toEqual([403, 'forbidden']);
    }
  });

  it('is a page of another site that sends with a session; a token may say any origin', async () => {
    const { headers } = await sessionHeader('depositor', lab);
    const foreign = { Origin: 'https://evil.example', 'Sec-Fetch-Site': 'cross-site' };
    const forged = await call(app, 'POST', '/deposits', { ...headers, ...foreign }, {});
    expect([forged.status, await codeOf(forged)]).toEqual([403, 'cross-site']);
    const own = { Origin: app.url, 'Sec-Fetch-Site': 'same-origin' };
    expect((await call(app, 'POST', '/deposits', { ...headers, ...own }, {})).status).toBe(201);
    expect((await call(app, 'POST', '/deposits', { ...token, ...foreign }, {})).status).toBe(201);
  });

  it('is a body that is not application/json, not JSON, not an object, or too large', async () => {
    const send = (body: unknown, headers: Headers = {}) =>
      call(app, 'POST', '/deposits', { ...token, ...headers }, body);
    expect((await send('{}', { 'Content-Type': 'text/plain' })).status).toBe(415);
    expect((await send('{"a":')).status).toBe(400);
    expect((await send('[]')).status).toBe(422);
    expect((await send(`{"a":"${'x'.repeat(8 * 2 ** 20)}"}`)).status).toBe(413);
    const largest = `{"a":"${'x'.repeat(8 * 2 ** 20 - 8)}"}`;
    expect((await send(largest)).status).toBe(201);
  });

  it('is a decision without its letter, of another kind, or with more in it', async () => {
    const id = await draft();
    await call(app, 'POST', `/deposits/${id}/submission`, token);
    const decide = (body: unknown) => call(app, 'POST', `/deposits/${id}/decision`, curator, body);
    for (const body of [
      { kind: 'changes-requested' },
      { kind: 'published' },
      { kind: 'accepted', state: 'x' },
      [],
    ]) {
      expect(await codeOf(await decide(body))).toBe('invalid-input');
    }
    expect(await codeOf(await decide('nonsense'))).toBe('malformed-json');
    expect((await read(id)).state).toBe('submitted');
  });
});

describe('the list', () => {
  it('is paged by cursor, in the body and as a Link, and narrowed by state', async () => {
    const fresh = await tokenHeader(await makeLab('for-the-list'));
    for (let i = 0; i < 5; i++) await call(app, 'POST', '/deposits', fresh, { title: `number ${i}` });
    const titles: string[] = [];
    let path: string | undefined = '/deposits?limit=2&state=draft';
    while (path) {
      const response: Response = await call(app, 'GET', path, fresh);
      const { deposits, next } = depositListSchema.parse(await response.json());
      titles.push(...deposits.map(({ title }) => title));
      const link: string | undefined = /^<\/api\/v1(.*)>; rel="next"$/.exec(
        response.headers.get('link') ?? '',
      )?.[1];
      expect(next).toBe(link === undefined ? null : `/api/v1${link}`);
      path = link;
    }
    expect(titles).toEqual([4, 3, 2, 1, 0].map((i) => `number ${i}`));
    const none = await call(app, 'GET', '/deposits?state=published', fresh);
    expect(await none.json()).toEqual({ deposits: [], next: null });
  });

  it.each([
    ...['state=nonsense', 'limit=0', 'limit=ten', 'cursor=made-up', 'cursor='],
    ...['nonsense=1', 'state=draft&state=draft'],
  ])('refuses ?%s', async (query) => {
    expect(await codeOf(await call(app, 'GET', `/deposits?${query}`, token))).toBe('bad-parameter');
  });
});

describe('a person of several laboratories', () => {
  it('says which, in the address or in a header', async () => {
    const second = await makeLab('second-lab');
    const { headers } = await sessionHeader('depositor', lab, second);
    expect(await codeOf(await call(app, 'POST', '/deposits', headers, {}))).toBe('choose-laboratory');
    const named = await call(app, 'POST', '/deposits?lab=second-lab', headers, {});
    expect((await named.json()).laboratory.slug).toBe('second-lab');
    const byHeader = await call(app, 'POST', '/deposits', { ...headers, 'Curvekeep-Lab': lab.labSlug }, {});
    expect((await byHeader.json()).laboratory.slug).toBe(lab.labSlug);
    expect((await call(app, 'POST', '/deposits?lab=elsewhere', headers, {})).status).toBe(403);
  });
});
