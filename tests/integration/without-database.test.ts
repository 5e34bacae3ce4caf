/** What is said where the database is gone: which part, and nothing of how it is made. */
import { rename } from 'node:fs/promises';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { healthSchema } from '@/schemas/health';
import { type RunningApp, startApp } from '@/tests/support/start-app';

let app: RunningApp;
beforeAll(async () => {
  app = await startApp();
});
afterAll(() => app.stop());

describe('without its database', () => {
  it('health says so, and says so no more when it is back', async () => {
    const file = path.join(app.dataDir, 'curvekeep.db');
    await rename(file, `${file}.away`);
    const response = await fetch(`${app.url}/api/v1/health`);
    expect(response.status).toBe(503);
    const text = await response.text();
    expect(healthSchema.parse(JSON.parse(text))).toEqual({
      status: 'degraded',
      database: 'unavailable',
      storage: 'ok',
      computation: 'ok',
    });
    expect(text).not.toMatch(/sql|curvekeep\.db|\/tmp|at /i);
    await rename(`${file}.away`, file);
    expect((await fetch(`${app.url}/api/v1/health`)).status).toBe(200);
  });
});
