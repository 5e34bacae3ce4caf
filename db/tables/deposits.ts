/** Datasets on their way: the draft as it is, its immutable revisions, what curators decided, its files. */
import { sql } from 'drizzle-orm';
import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { DECISION_KINDS, DEPOSIT_STATES } from '../../schemas/deposit-states';
import { laboratories } from './laboratories';

export const deposits = sqliteTable(
  'deposits',
  {
    /** 128 random bits, base64url */
    id: text('id').primaryKey(),
    labId: text('lab_id')
      .notNull()
      .references(() => laboratories.id),
    state: text('state', { enum: DEPOSIT_STATES }).notNull(),
    /** counts every change of document or state; its strong ETag */
    version: integer('version').notNull(),
    /** for lists: the document's title where it has one */
    title: text('title').notNull(),
    /** slug that the document names, or an empty text */
    system: text('system').notNull().default(''),
    createdBy: text('created_by').notNull(),
    createdAt: integer('created_at').notNull(),
    updatedAt: integer('updated_at').notNull(),
    /** who made the last change of document or state, as the audit trail writes actors */
    updatedBy: text('updated_by').notNull(),
    /** an accepted deposit is published at the first midnight of this day, `2027-03-01`; null: at once */
    publishOn: text('publish_on'),
    /** whose midnight: an IANA time zone; null where there is no day */
    publishZone: text('publish_zone'),
    /** 123 of CK-000123; given at first publication and never again */
    accession: integer('accession').unique(),
    /** how many entries `errors` has */
    errorCount: integer('error_count').notNull().default(0),
    // Long texts come last: whatever stands behind one is read through all of it.
    /** what is wrong with the document, as JSON: a list of places and sentences */
    errors: text('errors').notNull().default('[]'),
    /** the working document, byte for byte as it was sent, valid or not */
    document: text('document').notNull(),
  },
  (table) => [
    index('deposits_lab').on(table.labId, table.updatedAt),
    index('deposits_state').on(table.state),
  ],
);

export const revisions = sqliteTable(
  'revisions',
  {
    id: integer('id').primaryKey(),
    depositId: text('deposit_id')
      .notNull()
      .references(() => deposits.id),
    /** 1, 2, 3 … within the deposit */
    number: integer('number').notNull(),
    /** title and system of the document, as those of the deposit */
    title: text('title').notNull(),
    system: text('system').notNull(),
    /** SHA-256 of `document`, hex */
    sha256: text('sha256').notNull(),
    /** the assessment's summary by itself, as JSON, for lists */
    summary: text('summary').notNull(),
    engine: text('engine').notNull(),
    policy: integer('policy').notNull(),
    submittedBy: text('submitted_by').notNull(),
    submittedAt: integer('submitted_at').notNull(),
    publishedAt: integer('published_at'),
    // Long texts come last, as above.
    /** byte for byte as it was submitted */
    document: text('document').notNull(),
    /** the whole assessment as JSON, as the engine wrote it at submission */
    assessment: text('assessment').notNull(),
  },
  (table) => [uniqueIndex('revisions_number').on(table.depositId, table.number)],
);

export const decisions = sqliteTable(
  'decisions',
  {
    id: integer('id').primaryKey(),
    depositId: text('deposit_id')
      .notNull()
      .references(() => deposits.id),
    revision: integer('revision').notNull(),
    kind: text('kind', { enum: DECISION_KINDS }).notNull(),
    letter: text('letter').notNull(),
    decidedBy: text('decided_by').notNull(),
    decidedAt: integer('decided_at').notNull(),
  },
  (table) => [index('decisions_deposit').on(table.depositId)],
);

export const files = sqliteTable(
  'files',
  {
    id: text('id').primaryKey(),
    depositId: text('deposit_id')
      .notNull()
      .references(() => deposits.id),
    /** as the depositor called it; metadata only, never a path */
    name: text('name').notNull(),
    size: integer('size').notNull(),
    sha256: text('sha256').notNull(),
    mediaType: text('media_type').notNull(),
    objectKey: text('object_key').notNull(),
    uploadedBy: text('uploaded_by').notNull(),
    uploadedAt: integer('uploaded_at').notNull(),
  },
  (table) => [index('files_deposit').on(table.depositId)],
);

/**
 * Objects that no file points to yet, or any more. A row is there before the object is and goes in the transaction
 * that makes a file of it, so that nothing is forgotten in the store whatever is killed when.
 */
export const looseObjects = sqliteTable(
  'loose_objects',
  {
    objectKey: text('object_key').primaryKey(),
    /** Unix time, ms */
    since: integer('since').notNull(),
  },
  (table) => [index('loose_objects_since').on(table.since)],
);

/** What an `Idempotency-Key` already did: one actor, one call, 24 hours. */
export const idempotencyKeys = sqliteTable(
  'idempotency_keys',
  {
    /** SHA-256 of actor, call and key */
    keyHash: text('key_hash').primaryKey(),
    /** SHA-256 of the body that came with it, hex */
    bodyHash: text('body_hash').notNull(),
    /** what the call came to, as JSON */
    outcome: text('outcome').notNull(),
    createdAt: integer('created_at').notNull(),
  },
  (table) => [index('idempotency_keys_created').on(table.createdAt)],
);

/** Append-only: sign-ins, refusals, every change of state. */
export const auditTrail = sqliteTable(
  'audit_trail',
  {
    id: integer('id').primaryKey(),
    at: integer('at').notNull(),
    actor: text('actor').notNull(),
    action: text('action').notNull(),
    subject: text('subject').notNull(),
    detail: text('detail').notNull().default(sql`''`),
  },
  (table) => [index('audit_trail_subject').on(table.subject)],
);
