/** The command `npm run migrate`; the server applies migrations at every start as well. */
import { applyMigrations } from '@/db/apply-migrations';
import { closeDatabase } from '@/db/client';
import { checkEnvOrExit } from '@/lib/env';

checkEnvOrExit();
await applyMigrations();
await closeDatabase();
process.stdout.write('The database is at the schema of this version.\n');
