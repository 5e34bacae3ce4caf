/** `/api/v1/refits` as a script sees it, on the built application. */
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { problemSchema } from '@/schemas/problem';
import { refitAnswerSchema, refitProgressSchema } from '@/schemas/refit';
import { itemParameter } from '@/tests/support/post-document';
import { postRefit, quickRefit, slowRefit } from '@/tests/support/refit-calls';
import { type RunningApp, startApp } from '@/tests/support/start-app';

/** Well above a second on any machine. */
const slow = () => slowRefit(900);

let dataDir: string;
let app: RunningApp;
beforeAll(async () => {
  dataDir = await mkdtemp(path.join(tmpdir(), 'curvekeep-refits-'));
  app = await startApp({ CURVEKEEP_DATA_DIR: dataDir });
});
afterAll(async () => {
  await app.stop();
  await rm(dataDir, { recursive: true, force: true });
});

/** Begins a refit that takes longer than its call; its address. */
async function begin(): Promise<string> {
  const response = await postRefit(app.url, slow());
  expect(response.status).toBe(202);
  expect(response.headers.get('cache-control')).toBe('no-store');
  expect(response.headers.get('retry-after')).toBe('1');
  expect(refitProgressSchema.parse(await response.json()).state).toBe('running');
  const location = response.headers.get('location') ?? '';
  expect(location).toMatch(/^\/api\/v1\/refits\/[\w-]{22}$/);
  return location;
}

/** Asks until the answer stands there. */
async function waitForAnswer(location: string) {
  for (let i = 0; i < 400; i++) {
    const response = await fetch(app.url + location);
    expect(response.status).toBe(200);
    expect(response.headers.get('cache-control')).toBe('no-store');
    const body: unknown = await response.json();
    if (!refitProgressSchema.safeParse(body).success) return refitAnswerSchema.parse(body);
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  throw new Error('no answer came');
}

/** Asks for a refit and, where it takes longer than its call, until its answer stands. */
async function refitted(body: unknown): Promise<Response> {
  let response = await postRefit(app.url, body);
  const location = response.headers.get('location');
  while (location && refitProgressSchema.safeParse(await response.clone().json()).success) {
    await new Promise((resolve) => setTimeout(resolve, 100));
    response = await fetch(app.url + location);
  }
  return response;
}

async function problemOf(response: Response) {
  expect(response.headers.get('content-type')).toBe('application/problem+json');
  return problemSchema.parse(await response.json());
}

describe('a refit', { timeout: 150_000 }, () => {
  it('that is quick is answered at once, with the limits of its caller', async () => {
    // The first one starts the thread, which may take longer than a second on a busy machine.
    expect((await refitted(quickRefit())).status).toBe(200);
    const response = await postRefit(app.url, quickRefit());
    expect(response.status).toBe(200);
    expect(response.headers.get('content-type')).toBe('application/json');
    expect(response.headers.get('cache-control')).toBe('no-store');
    expect(refitAnswerSchema.parse(await response.json()).estimates).toHaveLength(4);
    const policy = response.headers.get('ratelimit-policy');
    expect([itemParameter(policy, 'calls', 'q'), itemParameter(policy, 'at-once', 'q')]).toEqual([30, 1]);
    expect(policy).not.toContain('points');
    expect(itemParameter(response.headers.get('ratelimit'), 'calls', 'r')).toBe(28);
  });

  it('that takes longer is answered where Location says, one at a time', async () => {
    const location = await begin();
    const refused = await postRefit(app.url, quickRefit());
    expect(refused.status).toBe(429);
    expect((await problemOf(refused)).type).toBe('/api/v1/problems/too-many-at-once');
    // Assessments and pages go on meanwhile.
    expect((await fetch(`${app.url}/api/v1/health`)).status).toBe(200);
    const answer = await waitForAnswer(location);
    expect(answer.estimates).toHaveLength(39);
    expect((await refitted(quickRefit())).status).toBe(200);
  });

  it('can be cancelled, and is gone then', async () => {
    const location = await begin();
    const crossSite = await fetch(app.url + location, {
      method: 'DELETE',
      headers: { Origin: 'https://elsewhere.example' },
    });
    expect(crossSite.status).toBe(403);
    expect((await fetch(app.url + location, { method: 'DELETE' })).status).toBe(204);
    expect((await fetch(app.url + location)).status).toBe(404);
    expect((await fetch(app.url + location, { method: 'DELETE' })).status).toBe(404);
    expect((await refitted('[]')).status).toBe(422);
  });

  it.each(['SIGKILL', 'SIGTERM'] as const)('survives a process that ends by %s', async (signal) => {
    const location = await begin();
    const ended = new Promise((resolve) => app.process.once('exit', resolve));
    const stoppedAt = Date.now();
    app.process.kill(signal);
    expect(await ended).toBe(signal === 'SIGTERM' ? 0 : null);
    // It does not wait for the refit: that is for the next process.
    expect(Date.now() - stoppedAt).toBeLessThan(15_000);
    app = await startApp({ CURVEKEEP_DATA_DIR: dataDir });
    expect((await waitForAnswer(location)).estimates).toHaveLength(39);
  });

  it('of what is not there is 404, and of what is wrong 422 with its place', async () => {
    expect((await fetch(`${app.url}/api/v1/refits/AAAAAAAAAAAAAAAAAAAAAA`)).status).toBe(404);
    const { document } = quickRefit();
    const free = [{ parameter: 'inactive', siteClass: 'main', ligand: 'vellin', share: 'series' }];
    const response = await refitted({ document, free });
    expect(response.status).toBe(422);
    const [error] = (await problemOf(response)).errors ?? [];
    expect(error).toEqual({
      pointer: '/free/0/ligand',
      detail: 'no ligand “vellin”; did you mean “velline”?',
    });
  });

  it.each([
    ['another site', { Origin: 'https://elsewhere.example' }, 403],
    ['no JSON', { 'Content-Type': 'text/plain' }, 415],
  ])('from %s is refused', async (_, headers, status) => {
    expect((await postRefit(app.url, quickRefit(), headers)).status).toBe(status);
  });

  it.each([
    ['GET', '/api/v1/refits', 'POST, OPTIONS'],
    ['PUT', '/api/v1/refits/x', 'GET, HEAD, DELETE, OPTIONS'],
  ])('does not take %s at %s', async (method, address, allow) => {
    const response = await fetch(app.url + address, { method });
    expect([response.status, response.headers.get('allow')]).toEqual([405, allow]);
  });
});
