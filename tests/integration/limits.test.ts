/** The limits of open computation, told in headers and kept. */
import { afterEach, describe, expect, it } from 'vitest';
import { problemSchema } from '@/schemas/problem';
import { exampleDocument } from '@/tests/support/example-document';
import { itemParameter, postDocument } from '@/tests/support/post-document';
import { type RunningApp, startApp } from '@/tests/support/start-app';

let app: RunningApp;
afterEach(() => app.stop());

const left = (response: Response, item: string) =>
  itemParameter(response.headers.get('ratelimit'), item, 'r');

async function expectRefusal(response: Response, code: string): Promise<void> {
  expect(response.status).toBe(429);
  expect(problemSchema.parse(await response.json()).type).toBe(`/api/v1/problems/${code}`);
  const wait = Number(response.headers.get('retry-after'));
  expect(wait).toBeGreaterThanOrEqual(1);
  expect(wait).toBeLessThanOrEqual(60);
  expect(response.headers.get('ratelimit-policy')).toContain('"calls";q=120;w=60');
}

describe('limits', () => {
  it('120 calls a minute; a forged X-Forwarded-For changes nothing', async () => {
    app = await startApp();
    for (let i = 0; i < 120; i++) {
      const response = await postDocument(app.url, '{}', {
        'X-Forwarded-For': `192.0.2.${i}`,
        'X-Curvekeep-Peer': `198.51.100.${i}`,
      });
      expect(response.status).toBe(422);
      expect(left(response, 'calls')).toBe(119 - i);
      expect(left(response, 'at-once')).toBe(2);
    }
    const headers = { 'X-Forwarded-For': '203.0.113.1', 'X-Curvekeep-Peer': '203.0.113.1' };
    await expectRefusal(await postDocument(app.url, '{}', headers), 'too-many-calls');
    expect((await fetch(`${app.url}/api/v1/health`)).status).toBe(200);
  });

  it('200,000 points a minute', async () => {
    app = await startApp();
    const text = JSON.stringify(exampleDocument({ series: 200, pointsPerSeries: 99 }));
    for (let i = 1; i <= 10; i++) {
      const response = await postDocument(app.url, text);
      expect(response.status).toBe(200);
      expect(left(response, 'points')).toBe(200_000 - i * 19_800);
    }
    const refused = await postDocument(app.url, text);
    expect(left(refused, 'points')).toBe(2_000);
    await expectRefusal(refused, 'too-many-points');
    expect((await postDocument(app.url, exampleDocument())).status).toBe(200);
  });

  it('two at a time, however many come', async () => {
    app = await startApp();
    const text = JSON.stringify(exampleDocument({ series: 100, pointsPerSeries: 100 }));
    const responses = await Promise.all([1, 2, 3, 4].map(() => postDocument(app.url, text)));
    const refused = responses.filter((response) => response.status === 429);
    expect(responses.filter((response) => response.status === 200)).toHaveLength(2);
    expect(refused).toHaveLength(2);
    for (const response of refused) await expectRefusal(response, 'too-many-at-once');
    expect((await postDocument(app.url, exampleDocument())).status).toBe(200);
  });

  it('hold per caller behind a proxy that is trusted', async () => {
    app = await startApp({ TRUSTED_PROXIES: '127.0.0.1' });
    const from = (address: string) =>
      postDocument(app.url, '{}', { 'X-Forwarded-For': `1.2.3.4, ${address}` });
    expect(left(await from('192.0.2.1'), 'calls')).toBe(119);
    expect(left(await from('192.0.2.1'), 'calls')).toBe(118);
    expect(left(await from('192.0.2.2'), 'calls')).toBe(119);
    expect(JSON.stringify(app.logged())).not.toContain('192.0.2.1');
  });

  it('600 reads a minute of what is published, in the list, the points and the overlay together', async () => {
    app = await startApp();
    const paths = ['/datasets?q=x', '/overlay', '/systems', '/datasets/CK-000001/points'];
    for (let i = 0; i < 600; i++) {
      const response = await fetch(`${app.url}/api/v1${paths[i % 4]}`);
      expect([200, 404]).toContain(response.status);
      expect(left(response, 'reads')).toBe(599 - i);
    }
    const refused = await fetch(`${app.url}/api/v1/datasets`);
    expect(refused.status).toBe(429);
    expect(refused.headers.get('ratelimit-policy')).toBe('"reads";q=600;w=60');
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThanOrEqual(1);
    expect(problemSchema.parse(await refused.json()).type).toBe('/api/v1/problems/too-many-calls');
    expect((await postDocument(app.url, exampleDocument())).status).toBe(200);
  });

  it('are ten times higher in the demonstration', async () => {
    app = await startApp({ CURVEKEEP_DEMO: '1' });
    const response = await postDocument(app.url, exampleDocument());
    expect(response.headers.get('ratelimit-policy')).toBe(
      '"calls";q=1200;w=60, "points";q=2000000;w=60;qu="points", "at-once";q=20;qu="concurrent-requests"',
    );
  });
});
