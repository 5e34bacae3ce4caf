/** Refits that take longer than their call: kept for an hour under an address that nobody can guess. */
import { blob, index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export const refits = sqliteTable(
  'refits',
  {
    /** 128 random bits */
    id: text('id').primaryKey(),
    /** what was sent; null once the answer stands, since nothing needs it any more */
    body: blob('body', { mode: 'buffer' }),
    /** 0 to 1 */
    progress: real('progress').notNull(),
    /** HTTP status and body of the answer; null while it is being computed */
    answerStatus: integer('answer_status'),
    answer: blob('answer', { mode: 'buffer' }),
    /** the place within the limits of the caller's address, given back with the answer */
    leaseId: text('lease_id').notNull(),
    jobId: text('job_id').notNull(),
    /** Unix time, ms */
    expiresAt: integer('expires_at').notNull(),
  },
  (table) => [index('refits_expiry').on(table.expiresAt)],
);
