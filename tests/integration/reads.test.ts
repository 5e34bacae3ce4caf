/** What the API says of itself, and what it says where there is nothing. */
import Ajv2020 from 'ajv/dist/2020.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import schema from '@/schemas/dataset-1.schema.json';
import { healthSchema } from '@/schemas/health';
import { problemKindSchema, problemSchema } from '@/schemas/problem';
import { exampleDocument } from '@/tests/support/example-document';
import { postDocument } from '@/tests/support/post-document';
import { type RunningApp, startApp } from '@/tests/support/start-app';

let app: RunningApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

const get = (path: string, init?: RequestInit) => fetch(`${app.url}${path}`, init);

async function expectProblem(response: Response, status: number): Promise<void> {
  expect(response.status).toBe(status);
  expect(response.headers.get('content-type')).toBe('application/problem+json');
  expect(problemSchema.parse(await response.json()).status).toBe(status);
}

describe('texts of this version', () => {
  it.each([
    ['/api/v1/schemas/dataset-1', 'application/schema+json'],
    ['/api/v1/openapi.json', 'application/json'],
    ['/api/v1/problems/invalid-document', 'application/json'],
  ])('%s has a strong ETag and answers 304 to it', async (path, type) => {
    const response = await get(path);
    expect(response.status).toBe(200);
    expect(response.headers.get('content-type')).toBe(type);
    const etag = response.headers.get('etag') ?? '';
    expect(etag).toMatch(/^"[\w-]+"$/);
    const again = await get(path, { headers: { 'If-None-Match': `"other", ${etag}` } });
    expect(again.status).toBe(304);
    expect(again.headers.get('etag')).toBe(etag);
    expect(await again.text()).toBe('');
    expect((await get(path, { headers: { 'If-None-Match': '"other"' } })).status).toBe(200);
    const head = await get(path, { method: 'HEAD' });
    expect(head.status).toBe(200);
    expect(head.headers.get('etag')).toBe(etag);
  });

  it('the schema is the one that documents are checked against', async () => {
    expect(await (await get('/api/v1/schemas/dataset-1')).json()).toEqual(schema);
  });

  it('the description fits the answers', async () => {
    const description = await (await get('/api/v1/openapi.json')).json();
    const ajv = new Ajv2020({ strict: false });
    ajv.addSchema({ $id: 'https://api.example/', ...description });
    const fits = (name: string, value: unknown) => {
      const validate = ajv.compile({ $ref: `https://api.example/#/components/schemas/${name}` });
      expect(validate(value), JSON.stringify(validate.errors)).toBe(true);
    };
    const document = exampleDocument();
    fits('Dataset', document);
    fits('Assessment', await (await postDocument(app.url, document)).json());
    fits('Problem', await (await postDocument(app.url, '{}')).json());
    fits('Health', await (await get('/api/v1/health')).json());
    fits('ProblemKind', await (await get('/api/v1/problems/busy')).json());
    expect(ajv.compile({ $ref: 'https://api.example/#/components/schemas/Dataset' })({})).toBe(false);
  });

  it('the type of a problem leads to what it means', async () => {
    const { type } = problemSchema.parse(await (await postDocument(app.url, '{')).json());
    const kind = problemKindSchema.parse(await (await get(type)).json());
    expect(kind).toMatchObject({ type, status: 400 });
  });
});

describe('where there is nothing', () => {
  it.each(['/api/v1/nothing', '/api/v1', '/api', '/api/v2/health', '/api/v1/problems/none', '/api/%ff'])(
    '%s: 404 as a problem',
    async (path) => expectProblem(await get(path), 404),
  );

  it.each([
    ['GET', '/api/v1/assessments', 'POST, OPTIONS'],
    ['DELETE', '/api/v1/assessments', 'POST, OPTIONS'],
    ['POST', '/api/v1/health', 'GET, HEAD, OPTIONS'],
    ['PUT', '/api/v1/schemas/dataset-1', 'GET, HEAD, OPTIONS'],
    ['PATCH', '/api/v1/openapi.json', 'GET, HEAD, OPTIONS'],
  ])('%s %s: 405 with what is allowed', async (method, path, allow) => {
    const response = await get(path, { method });
    expect(response.headers.get('allow')).toBe(allow);
    await expectProblem(response, 405);
    const options = await get(path, { method: 'OPTIONS' });
    expect(options.status).toBe(204);
    expect(options.headers.get('allow')).toBe(allow);
  });
});

describe('health', () => {
  it('tells the parts apart', async () => {
    const response = await get('/api/v1/health');
    expect(response.status).toBe(200);
    const health = healthSchema.parse(await response.json());
    expect(health).toEqual({ status: 'ok', database: 'ok', storage: 'ok', computation: 'ok' });
  });
});
