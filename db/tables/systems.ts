/** The vocabulary of proteins with their ligands. */
import { integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export const systems = sqliteTable('systems', {
  slug: text('slug').primaryKey(),
  name: text('name').notNull(),
  protein: text('protein').notNull(),
  /** JSON list of ligand names */
  ligands: text('ligands', { mode: 'json' }).$type<string[]>().notNull(),
  status: text('status', { enum: ['listed', 'proposed'] }).notNull(),
  createdAt: integer('created_at').notNull(),
});
