import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { closeDatabase } from '@/db/client';
import { closeAssessmentPool } from '@/lib/assessments/assessment-pool';
import { checkHealth } from '@/lib/serving/check-health';

const home = process.cwd();
let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'curvekeep-health-'));
  Object.assign(process.env, { CURVEKEEP_DATA_DIR: folder, LOG_LEVEL: 'silent' });
  // From here there is no bundle for a worker thread to run, and no database that was migrated.
  process.chdir(folder);
});
afterAll(async () => {
  process.chdir(home);
  await closeAssessmentPool();
  await closeDatabase();
  await rm(folder, { recursive: true });
});

it('a part that does not answer is named, and the answer comes soon', async () => {
  const started = performance.now();
  const both = await Promise.all([checkHealth(), checkHealth()]);
  expect(both[0]).toEqual({
    status: 'degraded',
    database: 'unavailable',
    storage: 'unavailable',
    computation: 'unavailable',
  });
  expect(both[1]).toBe(both[0]);
  expect(performance.now() - started).toBeLessThan(6000);
});
