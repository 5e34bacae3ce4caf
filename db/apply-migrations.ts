/** Brings the database to the schema of this version. */
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { migrate } from 'drizzle-orm/libsql/migrator';
import { writeAlone } from '@/db/client';

/** Applies the migrations that are missing, in order; where none is missing it changes nothing. */
export async function applyMigrations(migrationsFolder = path.resolve('drizzle')): Promise<void> {
  const apply = () => writeAlone((database) => migrate(database, { migrationsFolder }));
  try {
    await apply();
  } catch {
    // Two processes that start together both find the same migration missing; the later one looks again.
    await sleep(500);
    await apply();
  }
}
