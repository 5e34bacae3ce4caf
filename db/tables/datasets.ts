/**
 * What is published, in the form that browsing reads: a summary a dataset, a summary a series with the numbers of
 * its points as columns of Float64 beside it, density cells, and off-curve points as rows.
 */
import { blob, index, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { deposits } from './deposits';
import { laboratories } from './laboratories';

export const datasets = sqliteTable(
  'datasets',
  {
    /** 123 of CK-000123 */
    accession: integer('accession').primaryKey(),
    depositId: text('deposit_id')
      .notNull()
      .unique()
      .references(() => deposits.id),
    labId: text('lab_id')
      .notNull()
      .references(() => laboratories.id),
    system: text('system').notNull(),
    title: text('title').notNull(),
    /** number of the newest published revision */
    revision: integer('revision').notNull(),
    licence: text('licence').notNull(),
    readout: text('readout').notNull(),
    /** JSON list of ligand names */
    ligands: text('ligands', { mode: 'json' }).$type<string[]>().notNull(),
    points: integer('points').notNull(),
    onCurve: integer('on_curve').notNull(),
    warning: integer('warning').notNull(),
    offCurve: integer('off_curve').notNull(),
    rmsZ: real('rms_z').notNull(),
    pValue: real('p_value'),
    lowestEnergy: real('lowest_energy').notNull(),
    highestEnergy: real('highest_energy').notNull(),
    /** some series' parameters were fitted to their own points */
    fittedHere: integer('fitted_here', { mode: 'boolean' }).notNull(),
    publishedAt: integer('published_at').notNull(),
    updatedAt: integer('updated_at').notNull(),
    /** Unix time, ms; null as long as its data are given out */
    withdrawnAt: integer('withdrawn_at'),
    /** why, as its tombstone says it */
    withdrawalReason: text('withdrawal_reason'),
    /** its strip without a window, as JSON; null where it was published before strips were kept */
    strip: text('strip'),
  },
  (table) => [
    index('datasets_published').on(table.publishedAt),
    index('datasets_system').on(table.system),
    index('datasets_lab').on(table.labId),
  ],
);

/** Numbers of a published series: little-endian Float64, one column a quantity, one number a point. */
export const datasetSeries = sqliteTable(
  'dataset_series',
  {
    accession: integer('accession')
      .notNull()
      .references(() => datasets.accession, { onDelete: 'cascade' }),
    /** place of the series in the document, from 0 */
    position: integer('position').notNull(),
    seriesId: text('series_id').notNull(),
    label: text('label').notNull(),
    variant: text('variant').notNull(),
    origin: text('origin').notNull(),
    points: integer('points').notNull(),
    onCurve: integer('on_curve').notNull(),
    warning: integer('warning').notNull(),
    offCurve: integer('off_curve').notNull(),
    rmsZ: real('rms_z').notNull(),
    pValue: real('p_value'),
    energy: blob('energy', { mode: 'buffer' }).notNull(),
    energyU: blob('energy_u', { mode: 'buffer' }).notNull(),
    activity: blob('activity', { mode: 'buffer' }).notNull(),
    activityU: blob('activity_u', { mode: 'buffer' }).notNull(),
    expected: blob('expected', { mode: 'buffer' }).notNull(),
    expectedU: blob('expected_u', { mode: 'buffer' }).notNull(),
    residualU: blob('residual_u', { mode: 'buffer' }).notNull(),
    z: blob('z', { mode: 'buffer' }).notNull(),
    p: blob('p', { mode: 'buffer' }).notNull(),
    q: blob('q', { mode: 'buffer' }).notNull(),
    /** one byte a point: 0 on curve, 1 warning, 2 off curve */
    flags: blob('flags', { mode: 'buffer' }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.accession, table.position] }),
    index('dataset_series_variant').on(table.variant),
  ],
);

/** How many points of a series and flag lie in a cell of the (energy, activity) plane. */
export const densityCells = sqliteTable(
  'density_cells',
  {
    accession: integer('accession')
      .notNull()
      .references(() => datasets.accession, { onDelete: 'cascade' }),
    position: integer('position').notNull(),
    flag: text('flag', { enum: ['on-curve', 'warning', 'off-curve'] }).notNull(),
    /** floor(energy / 0.1 kT) and floor(activity / 0.01) */
    energyCell: integer('energy_cell').notNull(),
    activityCell: integer('activity_cell').notNull(),
    points: integer('points').notNull(),
  },
  (table) => [
    primaryKey({
      columns: [table.accession, table.position, table.flag, table.energyCell, table.activityCell],
    }),
    index('density_cells_energy').on(table.accession, table.energyCell, table.flag, table.points),
  ],
);

/** Every point off the curve, by itself. */
export const offCurvePoints = sqliteTable(
  'off_curve_points',
  {
    accession: integer('accession')
      .notNull()
      .references(() => datasets.accession, { onDelete: 'cascade' }),
    position: integer('position').notNull(),
    point: integer('point').notNull(),
    energy: real('energy').notNull(),
    activity: real('activity').notNull(),
    expected: real('expected').notNull(),
    z: real('z').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.accession, table.position, table.point] }),
    index('off_curve_points_energy').on(table.energy),
  ],
);
