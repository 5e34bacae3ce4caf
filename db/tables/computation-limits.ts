/** What is counted so that computation open to anyone stays bounded. Rows live for a minute or two. */
import { blob, index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';

/** Calls and points of one address within one second (Unix time). */
export const computationUse = sqliteTable(
  'computation_use',
  {
    /** keyed hash of the address, never the address */
    addressKey: text('address_key').notNull(),
    second: integer('second').notNull(),
    calls: integer('calls').notNull(),
    points: integer('points').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.addressKey, table.second] }),
    index('computation_use_second').on(table.second),
  ],
);

/** One computation under way. It ends by itself at `expiresAt`, so that a killed process blocks nobody. */
export const computationLeases = sqliteTable(
  'computation_leases',
  {
    id: text('id').primaryKey(),
    addressKey: text('address_key').notNull(),
    /** points set aside until it is known how many there are */
    reservedPoints: integer('reserved_points').notNull(),
    /** Unix time, ms */
    expiresAt: integer('expires_at').notNull(),
  },
  (table) => [index('computation_leases_address').on(table.addressKey)],
);

/** Random keys of this installation, made when first needed. */
export const installKeys = sqliteTable('install_keys', {
  name: text('name').primaryKey(),
  value: blob('value', { mode: 'buffer' }).notNull(),
});
