/** `POST /api/v1/assessments` as a script sees it, on the built application. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { parseDocument } from '@/lib/documents/parse-document';
import { assess } from '@/lib/engine/assess';
import { assessmentSchema } from '@/schemas/assessment';
import { problemSchema } from '@/schemas/problem';
import { exampleDocument } from '@/tests/support/example-document';
import { postDocument } from '@/tests/support/post-document';
import { type RunningApp, startApp } from '@/tests/support/start-app';

let app: RunningApp;
beforeAll(async () => {
  app = await startApp({ CURVEKEEP_DEMO: '1' });
});
afterAll(() => app.stop());

async function problemOf(response: Response) {
  expect(response.headers.get('content-type')).toBe('application/problem+json');
  const problem = problemSchema.parse(await response.json());
  expect(problem.status).toBe(response.status);
  return problem;
}

describe('a document', () => {
  it('is answered with what the engine computes', async () => {
    const text = JSON.stringify(exampleDocument({ series: 3, pointsPerSeries: 8 }));
    const response = await postDocument(app.url, text);
    expect(response.status).toBe(200);
    expect(response.headers.get('content-type')).toBe('application/json');
    expect(response.headers.get('cache-control')).toBe('no-store');
    const parsed = parseDocument(text);
    if (!parsed.ok) throw new Error('not valid');
    const answer = assessmentSchema.parse(await response.json());
    expect(answer).toEqual(JSON.parse(JSON.stringify(assess(parsed.document))));
  });

  it('leaves nothing behind', async () => {
    const title = `Kept by nobody ${Date.now()}`;
    expect((await postDocument(app.url, { ...exampleDocument(), title })).status).toBe(200);
    expect(JSON.stringify(app.logged())).not.toContain(title);
  });

  it('that is not valid is answered with everything that is wrong', async () => {
    const document = structuredClone(exampleDocument());
    document.licence = 'All rights reserved';
    for (const series of document.series) {
      for (const point of series.points) Object.assign(point, { activity: 'high', u: -1 });
    }
    const problem = await problemOf(await postDocument(app.url, document));
    expect(problem).toMatchObject({ status: 422, type: '/api/v1/problems/invalid-document' });
    const pointers = problem.errors?.map((error) => error.pointer) ?? [];
    expect(pointers).toEqual(
      expect.arrayContaining([
        '/licence',
        '/series/0/points/0/activity',
        '/series/0/points/0/u',
        '/series/0/points/1/activity',
        '/series/0/points/1/u',
      ]),
    );
    expect(problem.detail).toBe(`${pointers.length} things are wrong in the document.`);
  });

  it('that is not JSON is answered with line and column', async () => {
    const problem = await problemOf(await postDocument(app.url, '{\n  "title": "x",\n  "series": [1,,2]\n}'));
    expect(problem).toMatchObject({ status: 400, line: 3, column: 16 });
    expect(problem.detail).toMatch(/^Line 3, column 16: /);
  });

  it.each([
    ['arrays', '['.repeat(20_000) + ']'.repeat(20_000)],
    ['objects', `${'{"series":'.repeat(20_000)}1${'}'.repeat(20_000)}`],
    ['arrays that never end', '['.repeat(20_000)],
  ])('of 20,000 nested %s gets a clean refusal', async (_, text) => {
    const { status } = await problemOf(await postDocument(app.url, text));
    expect([400, 422]).toContain(status);
  });

  it.each([
    ['text/plain', {}],
    ['application/x-www-form-urlencoded', {}],
    ['application/json', { 'Content-Encoding': 'gzip' }],
  ])('sent as %s %j is refused', async (type, headers) => {
    const response = await postDocument(app.url, exampleDocument(), { 'Content-Type': type, ...headers });
    expect((await problemOf(response)).status).toBe(415);
  });

  it('sent by a browser for a page of another site is refused', async () => {
    const headers = { 'Sec-Fetch-Site': 'cross-site', Origin: 'https://evil.example' };
    expect((await problemOf(await postDocument(app.url, exampleDocument(), headers))).status).toBe(403);
    const own = { 'Sec-Fetch-Site': 'same-origin', Origin: app.url };
    expect((await postDocument(app.url, exampleDocument(), own)).status).toBe(200);
  });

  it('with nothing in it is refused', async () => {
    expect((await problemOf(await postDocument(app.url, ''))).status).toBe(400);
    expect((await problemOf(await postDocument(app.url, 'null'))).status).toBe(422);
  });
});

describe('a large document', () => {
  it('of 20,000 points does not hold up a page', async () => {
    const text = JSON.stringify(exampleDocument({ series: 200, pointsPerSeries: 100 }));
    await (await fetch(`${app.url}/methods`)).text();
    const alone = performance.now();
    await (await postDocument(app.url, text)).arrayBuffer();
    const oneDocumentMs = performance.now() - alone;
    const computing = Promise.all([1, 2, 3].map(() => postDocument(app.url, text)));
    let done = false;
    void computing.then(() => {
      done = true;
    });
    const waits: number[] = [];
    while (!done) {
      const started = performance.now();
      await (await fetch(`${app.url}/methods`)).text();
      waits.push(performance.now() - started);
    }
    for (const response of await computing) expect(response.status).toBe(200);
    expect(waits.length).toBeGreaterThan(3);
    const median = waits.sort((a, b) => a - b)[Math.floor(waits.length / 2)];
    // Computed on the thread that answers pages, a document would hold each of them up for its whole time.
    expect(median).toBeLessThan(oneDocumentMs / 2);
  });
});
