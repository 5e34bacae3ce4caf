/** Whether the database answers and holds the tables of this version. */
import { access } from 'node:fs/promises';
import { sql } from 'drizzle-orm';
import { localFile, readDatabase } from '@/db/client';
import { installKeys } from '@/db/tables/computation-limits';
import { env } from '@/lib/env';

/** Throws where the database is gone, cannot be read or lacks its tables. */
export async function probeDatabase(): Promise<void> {
  const file = localFile(env().databaseUrl);
  // An open connection still answers from a file that was deleted, so the file itself is looked for.
  if (file) await access(file);
  const database = await readDatabase();
  await database.select({ count: sql<number>`count(*)` }).from(installKeys);
}
