/** Depositing groups, who belongs to them, and their tokens for scripts. */
import { index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { people } from './people';

export const laboratories = sqliteTable('laboratories', {
  id: text('id').primaryKey(),
  slug: text('slug').notNull().unique(),
  name: text('name').notNull(),
  institution: text('institution').notNull(),
  createdAt: integer('created_at').notNull(),
});

export const memberships = sqliteTable(
  'memberships',
  {
    personId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    labId: text('lab_id')
      .notNull()
      .references(() => laboratories.id),
    role: text('role', { enum: ['member', 'manager'] }).notNull(),
    createdAt: integer('created_at').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.personId, table.labId] }),
    index('memberships_lab').on(table.labId),
  ],
);

export const labTokens = sqliteTable(
  'lab_tokens',
  {
    id: text('id').primaryKey(),
    labId: text('lab_id')
      .notNull()
      .references(() => laboratories.id),
    name: text('name').notNull(),
    /** SHA-256 of the token, hex; the token itself is shown once and never stored */
    tokenHash: text('token_hash').notNull().unique(),
    /** JSON list of `read-drafts`, `write-drafts`, `submit` */
    scopes: text('scopes', { mode: 'json' }).$type<string[]>().notNull(),
    createdBy: text('created_by').notNull(),
    createdAt: integer('created_at').notNull(),
    expiresAt: integer('expires_at').notNull(),
    lastUsedAt: integer('last_used_at'),
    revokedAt: integer('revoked_at'),
  },
  (table) => [index('lab_tokens_lab').on(table.labId)],
);
