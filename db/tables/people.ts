/** Accounts and their sessions. Passwords are argon2id hashes; session ids are kept as SHA-256 hashes. */
import { index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export const people = sqliteTable('people', {
  id: text('id').primaryKey(),
  /** lower case, trimmed */
  email: text('email').notNull().unique(),
  name: text('name').notNull(),
  passwordHash: text('password_hash').notNull(),
  /** what the person may do beyond their laboratories */
  role: text('role', { enum: ['depositor', 'curator', 'administrator'] }).notNull(),
  /** Unix time, ms; null while the account is in use */
  disabledAt: integer('disabled_at'),
  createdAt: integer('created_at').notNull(),
});

export const sessions = sqliteTable(
  'sessions',
  {
    /** SHA-256 of the session id that the cookie holds, hex */
    idHash: text('id_hash').primaryKey(),
    personId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    /** Unix time, ms */
    createdAt: integer('created_at').notNull(),
    expiresAt: integer('expires_at').notNull(),
  },
  (table) => [index('sessions_person').on(table.personId)],
);

/** Failed or pending sign-ins, counted before the password is verified; rows live for fifteen minutes. */
export const signInAttempts = sqliteTable(
  'sign_in_attempts',
  {
    id: text('id').primaryKey(),
    /** keyed hash of the e-mail address that was typed */
    accountKey: text('account_key').notNull(),
    /** keyed hash of the network address */
    addressKey: text('address_key').notNull(),
    /** Unix time, ms */
    at: integer('at').notNull(),
  },
  (table) => [
    index('sign_in_attempts_account').on(table.accountKey, table.at),
    index('sign_in_attempts_address').on(table.addressKey, table.at),
  ],
);

/** Where somebody signed in from lately, so that failures of others behind the same address do not make them wait. */
export const signInPlaces = sqliteTable(
  'sign_in_places',
  {
    accountKey: text('account_key').notNull(),
    addressKey: text('address_key').notNull(),
    /** Unix time, ms, of the last time */
    at: integer('at').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.accountKey, table.addressKey] }),
    index('sign_in_places_at').on(table.at),
  ],
);
