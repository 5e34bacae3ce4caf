/** What the tests of a file about deposits begin with: a database of their own, its people, and an end. */
import { afterAll, beforeAll } from 'vitest';
import { closeAssessmentPool } from '@/lib/assessments/assessment-pool';
import { startLocalStorage, stopLocalStorage } from '@/storage/local-server';
import { makeCollection } from './collection';
import { temporaryDatabase } from './temporary-database';

type Cast = Awaited<ReturnType<typeof makeCollection>>;

/**
 * The people, in place once the tests run, and where the data lie.
 *
 * @param storage whether a store for objects runs as well
 */
export function collectionForTests({ storage = false } = {}): { cast: Cast; dataDir: () => string } {
  const { dataDir } = temporaryDatabase();
  const cast = {} as Cast;
  beforeAll(async () => {
    if (storage) await startLocalStorage();
    Object.assign(cast, await makeCollection());
  });
  afterAll(async () => {
    await closeAssessmentPool();
    if (storage) await stopLocalStorage();
  });
  return { cast, dataDir };
}
