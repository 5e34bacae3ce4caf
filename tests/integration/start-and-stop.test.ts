/** How the application starts, refuses to start, and stops. */
import { spawn, spawnSync } from 'node:child_process';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { describe, expect, it } from 'vitest';
import { exampleDocument } from '@/tests/support/example-document';
import { itemParameter, postDocument } from '@/tests/support/post-document';
import { startApp } from '@/tests/support/start-app';

function run(program: string, variables: Record<string, string>) {
  const env = { ...process.env, ...variables, NODE_ENV: 'production' as const };
  return spawnSync(process.execPath, [path.join('.build', program)], {
    env,
    encoding: 'utf8',
    timeout: 20_000,
  });
}

describe('starting', () => {
  it('with a wrong setting names it and what would be right, without a stack, and ends with 1', () => {
    const { status, stderr } = run('serve.js', { PORT: 'eighty', LOG_LEVEL: 'loud' });
    expect(status).toBe(1);
    expect(stderr).toContain('PORT must be a port number');
    expect(stderr).toContain('LOG_LEVEL must be one of');
    expect(stderr).not.toMatch(/^\s+at /m);
  });

  it('on a port that is taken says so', async () => {
    const app = await startApp();
    const dataDir = await mkdtemp(path.join(tmpdir(), 'curvekeep-test-'));
    const { status, stderr } = run('serve.js', { PORT: new URL(app.url).port, CURVEKEEP_DATA_DIR: dataDir });
    await app.stop();
    await rm(dataDir, { recursive: true });
    expect(status).toBe(1);
    expect(stderr).toMatch(/Port \d+ on 127\.0\.0\.1 is taken; set PORT to another number\./);
  });

  it('a second time keeps the data', async () => {
    const dataDir = await mkdtemp(path.join(tmpdir(), 'curvekeep-test-'));
    const first = await startApp({ CURVEKEEP_DATA_DIR: dataDir });
    await postDocument(first.url, exampleDocument());
    await first.stop();
    const started = performance.now();
    const second = await startApp({ CURVEKEEP_DATA_DIR: dataDir });
    expect(performance.now() - started).toBeLessThan(10_000);
    const response = await postDocument(second.url, exampleDocument());
    await second.stop();
    await rm(dataDir, { recursive: true });
    // The call before the restart still counts.
    expect(itemParameter(response.headers.get('ratelimit'), 'calls', 'r')).toBe(118);
  });

  it('migrating twice is the same as once', async () => {
    const dataDir = await mkdtemp(path.join(tmpdir(), 'curvekeep-test-'));
    for (let i = 0; i < 2; i++) {
      const { status, stderr } = run('migrate.js', { CURVEKEEP_DATA_DIR: dataDir });
      expect(stderr).toBe('');
      expect(status).toBe(0);
    }
    await rm(dataDir, { recursive: true });
  });
});

describe('stopping', () => {
  it('happens by itself where the npm that started it was killed', async () => {
    const dataDir = await mkdtemp(path.join(tmpdir(), 'curvekeep-test-'));
    // A shell in npm's place, which is killed without a chance to hand anything on.
    const env = {
      ...process.env,
      npm_lifecycle_event: 'start',
      PORT: '0',
      CURVEKEEP_DATA_DIR: dataDir,
      NODE_ENV: 'production' as const,
    };
    const npm = spawn('sh', ['-c', `"${process.execPath}" .build/serve.js; true`], {
      env,
      stdio: ['ignore', 'pipe', 'inherit'],
    });
    const output = createInterface({ input: npm.stdout });
    const messages: unknown[] = [];
    for await (const line of output) {
      if (!line.startsWith('{')) continue;
      const { msg } = JSON.parse(line);
      messages.push(msg);
      if (msg === 'listening') npm.kill('SIGKILL');
    }
    // The output ends with the server itself.
    await rm(dataDir, { recursive: true });
    expect(messages.slice(-2)).toEqual(['stopping', 'stopped']);
  });

  it('finishes what is under way, takes nothing new and ends with 0', async () => {
    const app = await startApp();
    const text = JSON.stringify(exampleDocument({ series: 200, pointsPerSeries: 100 }));
    await postDocument(app.url, exampleDocument());
    const computing = postDocument(app.url, text);
    await new Promise((resolve) => setTimeout(resolve, 60));
    const stopping = app.stop();
    await expect.poll(() => app.logged().some(({ msg }) => msg === 'stopping')).toBe(true);
    await expect(fetch(`${app.url}/api/v1/health`)).rejects.toThrow();
    const response = await computing;
    expect(response.status).toBe(200);
    expect(((await response.json()) as { summary: { points: number } }).summary.points).toBe(20_000);
    expect(await stopping).toBe(0);
  });
});
