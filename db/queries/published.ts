/** The SQL that writes what is published, in the form that browsing reads. */
import { eq, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { datasetSeries, datasets, densityCells, offCurvePoints } from '@/db/tables/datasets';

type DatasetRow = typeof datasets.$inferInsert;

/** What a dataset's row says of the document and its assessment. */
export type DatasetSummary = Omit<
  DatasetRow,
  'accession' | 'depositId' | 'labId' | 'revision' | 'publishedAt' | 'updatedAt'
>;
export type SeriesRow = Omit<typeof datasetSeries.$inferInsert, 'accession'>;
export type CellRow = Omit<typeof densityCells.$inferInsert, 'accession'>;
export type OffCurveRow = Omit<typeof offCurvePoints.$inferInsert, 'accession'>;

/** Rows in one statement: few enough for the number of variables that SQLite takes. */
const ROWS_AT_ONCE = 1000;
const SERIES_AT_ONCE = 50;

/** Adds a dataset, or gives the one of that accession a newer revision; the date of its first publication stays. */
export async function upsertDataset(tx: Transaction, row: DatasetRow): Promise<void> {
  const { accession, depositId, labId, publishedAt, ...set } = row;
  await tx.insert(datasets).values(row).onConflictDoUpdate({ target: datasets.accession, set });
}

/** Removes the numbers of a dataset, to make room for those of a newer revision. */
export async function deleteNumbers(tx: Transaction, accession: number): Promise<void> {
  for (const table of [datasetSeries, densityCells, offCurvePoints]) {
    await tx.delete(table).where(eq(table.accession, accession));
  }
}

/** Adds the series of a dataset with their columns. */
export async function insertSeries(tx: Transaction, accession: number, rows: SeriesRow[]): Promise<void> {
  for (const some of portions(rows, SERIES_AT_ONCE)) {
    await tx.insert(datasetSeries).values(some.map((row) => ({ ...row, accession })));
  }
}

/** Adds the density cells of a dataset: whole numbers, so that they can go as JSON, which is several times faster. */
export async function insertCells(tx: Transaction, accession: number, rows: CellRow[]): Promise<void> {
  for (const some of portions(rows, 10 * ROWS_AT_ONCE)) {
    const list = some.map((row) => [row.position, row.flag, row.energyCell, row.activityCell, row.points]);
    await tx.run(sql`
      insert into ${densityCells} (accession, position, flag, energy_cell, activity_cell, points)
      select ${accession}, value ->> 0, value ->> 1, value ->> 2, value ->> 3, value ->> 4
      from json_each(${JSON.stringify(list)})`);
  }
}

/** Adds the points off the curve of a dataset. Not as JSON: SQLite reads decimals less exactly than they are written. */
export async function insertOffCurvePoints(
  tx: Transaction,
  accession: number,
  rows: OffCurveRow[],
): Promise<void> {
  for (const some of portions(rows, ROWS_AT_ONCE)) {
    await tx.insert(offCurvePoints).values(some.map((row) => ({ ...row, accession })));
  }
}

function* portions<T>(rows: T[], size: number): Generator<T[]> {
  for (let at = 0; at < rows.length; at += size) yield rows.slice(at, at + size);
}
