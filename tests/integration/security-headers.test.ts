/** The headers of every kind of answer. */
import { connect } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type RunningApp, startApp } from '@/tests/support/start-app';

let app: RunningApp;
beforeAll(async () => {
  app = await startApp({ APP_URL: 'https://curves.example.org' });
});
afterAll(() => app.stop());

const EVERYWHERE = {
  'x-content-type-options': 'nosniff',
  'cross-origin-opener-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'referrer-policy': 'strict-origin-when-cross-origin',
  'strict-transport-security': 'max-age=63072000; includeSubDomains',
};

function expectEverywhere(headers: Headers): void {
  for (const [name, value] of Object.entries(EVERYWHERE)) expect(headers.get(name), name).toBe(value);
  expect(headers.get('permissions-policy')).toContain('camera=()');
  expect(headers.get('x-powered-by')).toBeNull();
  expect(headers.get('content-security-policy')).toContain("default-src 'none'");
  expect(headers.get('content-security-policy')).toContain("frame-ancestors 'none'");
}

const PAGES = ['/', '/check', '/methods', '/no-such-page', '/api-nothing'];

describe('pages', () => {
  it.each(PAGES)('%s: strict policy with a nonce that all scripts and styles carry', async (path) => {
    const response = await fetch(`${app.url}${path}`);
    expectEverywhere(response.headers);
    const policy = response.headers.get('content-security-policy') ?? '';
    const nonce = /'nonce-([A-Za-z0-9+/=]+)'/.exec(policy)?.[1] ?? '';
    expect(Buffer.from(nonce, 'base64').byteLength).toBeGreaterThanOrEqual(16);
    expect(policy).toBe(
      `default-src 'none'; script-src 'nonce-${nonce}' 'strict-dynamic'; style-src 'self' 'nonce-${nonce}'; ` +
        `img-src 'self' blob: data:; font-src 'self'; worker-src 'self'; connect-src 'self'; base-uri 'none'; form-action 'self'; frame-ancestors 'none'`,
    );
    const html = await response.text();
    const scripts = [...html.matchAll(/<script\b[^>]*>/g)].map((match) => match[0]);
    expect(scripts.length).toBeGreaterThan(3);
    for (const tag of scripts) expect(tag).toContain(`nonce="${nonce}"`);
    for (const [tag] of html.matchAll(/<style\b[^>]*>/g)) expect(tag).toContain(`nonce="${nonce}"`);
    // A style attribute is blocked by the policy, so that none may be sent.
    expect(html.replaceAll(/<script\b[\s\S]*?<\/script>/g, '')).not.toMatch(/<[^>]+\sstyle="/);
  });

  it('get another nonce each time', async () => {
    const policies = await Promise.all(
      [1, 2, 3].map(async () => (await fetch(app.url)).headers.get('content-security-policy')),
    );
    expect(new Set(policies).size).toBe(3);
  });

  it('that are missing are 404', async () => {
    expect((await fetch(`${app.url}/no-such-page`)).status).toBe(404);
  });
});

describe('what is not a page', () => {
  it.each(['/api/v1/health', '/api/v1/nothing', '/api/v1/openapi.json'])(
    '%s: closed policy',
    async (path) => {
      const { headers } = await fetch(`${app.url}${path}`);
      expectEverywhere(headers);
      expect(headers.get('content-security-policy')).toBe(
        "default-src 'none'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'",
      );
      expect(headers.get('access-control-allow-origin')).toBeNull();
    },
  );

  it('static files', async () => {
    const html = await (await fetch(app.url)).text();
    const files = [...html.matchAll(/(?:src|href)="(\/_next\/static\/[^"]+)"/g)].map((match) => match[1]);
    expect(files.length).toBeGreaterThan(1);
    for (const file of new Set(files)) {
      const response = await fetch(`${app.url}${file}`);
      expect(response.status).toBe(200);
      expectEverywhere(response.headers);
    }
  });

  it('bytes that are no request', async () => {
    const { port, hostname } = new URL(app.url);
    const answer = await new Promise<string>((resolve) => {
      let text = '';
      const socket = connect(Number(port), hostname, () => socket.write('NONSENSE\r\n\r\n'));
      socket.on('data', (chunk) => {
        text += chunk.toString();
      });
      socket.on('close', () => resolve(text));
    });
    expect(answer).toMatch(/^HTTP\/1\.1 400 Bad Request/);
    expect(answer).toContain('application/problem+json');
    expect(answer).toContain('X-Content-Type-Options: nosniff');
  });
});
