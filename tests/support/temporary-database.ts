/** A real database in a temporary folder for the tests of one file, migrated and closed again. */
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll } from 'vitest';
import { applyMigrations } from '@/db/apply-migrations';
import { closeDatabase } from '@/db/client';

/** Call it at the top of a test file, before anything asks for the settings. */
export function temporaryDatabase(): { dataDir: () => string } {
  let dataDir = '';
  beforeAll(async () => {
    dataDir = await mkdtemp(path.join(tmpdir(), 'curvekeep-db-'));
    process.env.CURVEKEEP_DATA_DIR = dataDir;
    process.env.LOG_LEVEL = 'silent';
    await applyMigrations();
  });
  afterAll(async () => {
    await closeDatabase();
    await rm(dataDir, { recursive: true, force: true });
  });
  return { dataDir: () => dataDir };
}
