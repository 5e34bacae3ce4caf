/** Work that is to be done after a call was answered: done at least once, even if a process dies over it. */
import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export const jobs = sqliteTable(
  'jobs',
  {
    id: text('id').primaryKey(),
    kind: text('kind').notNull(),
    /** what its handler needs to know, JSON */
    payload: text('payload').notNull(),
    /** Unix time, ms, before which it is not tried (again) */
    runAt: integer('run_at').notNull(),
    /** how often it was begun */
    attempts: integer('attempts').notNull().default(0),
    /** who is at work on it: a random text of each attempt; null: nobody */
    leaseToken: text('lease_token'),
    /** Unix time, ms; a lease that has run out is a dead process's */
    leaseUntil: integer('lease_until'),
    /** of the last attempt that failed */
    lastError: text('last_error'),
    /** Unix time, ms; null while it may still be tried */
    givenUpAt: integer('given_up_at'),
    createdAt: integer('created_at').notNull(),
  },
  (table) => [index('jobs_due').on(table.givenUpAt, table.runAt)],
);
