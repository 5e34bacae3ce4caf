/** The SQL that writes what is published, in the form that browsing reads. */
import { eq, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { datasetSeries, datasets, densityCells, offCurvePoints } from '@/db/tables/datasets';

type DatasetRow = typeof datasets.$inferInsert;

/** What a dataset's row says of the document and its assessment. */
export type DatasetSummary = Omit<
  DatasetRow,
  'accession' | 'depositId' | 'labId' | 'revision' | 'publishedAt' | 'updatedAt' | 'strip'
>;
export type SeriesRow = Omit<typeof datasetSeries.$inferInsert, 'accession'>;
export type CellRow = Omit<typeof densityCells.$inferInsert, 'accession'>;
export type OffCurveRow = Omit<typeof offCurvePoints.$inferInsert, 'accession'>;

/** Rows in one statement: few enough that a statement takes moments, and, of series, for SQLite's number of variables. */
const ROWS_AT_ONCE = 5_000;
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
    await yieldToOthers();
  }
}

/** Adds the density cells of a dataset: whole numbers, which go as JSON, several times faster than as variables. */
export async function insertCells(tx: Transaction, accession: number, rows: CellRow[]): Promise<void> {
  for (const some of portions(rows, ROWS_AT_ONCE)) {
    const list = some.map((row) => [row.position, row.flag, row.energyCell, row.activityCell, row.points]);
    await tx.run(sql`
      insert into ${densityCells} (accession, position, flag, energy_cell, activity_cell, points)
      select ${accession}, value ->> 0, value ->> 1, value ->> 2, value ->> 3, value ->> 4
      from json_each(${JSON.stringify(list)})`);
    await yieldToOthers();
  }
}

/** Adds the points off the curve of a dataset, to the last bit. */
export async function insertOffCurvePoints(
  tx: Transaction,
  accession: number,
  rows: OffCurveRow[],
): Promise<void> {
  for (const some of portions(rows, ROWS_AT_ONCE)) {
    const list = some.map(({ position, point, energy, activity, expected, z }) => [
      ...[position, point],
      ...[energy, activity, expected, z].flatMap(inTwo),
    ]);
    await tx.run(sql`
      insert into ${offCurvePoints} (accession, position, point, energy, activity, expected, z)
      select ${accession}, value ->> 0, value ->> 1,
        (value ->> 2) / ${PARTS} + (value ->> 3), (value ->> 4) / ${PARTS} + (value ->> 5),
        (value ->> 6) / ${PARTS} + (value ->> 7), (value ->> 8) / ${PARTS} + (value ->> 9)
      from json_each(${JSON.stringify(list)})`);
    await yieldToOthers();
  }
}

/** 2³⁰, as a real number for SQLite. */
const PARTS = sql.raw('1073741824.0');

/**
 * A number as so many 2⁻³⁰, which is a whole number, and the rest: SQLite reads some decimals in their last bit less
 * exactly than they are written, which matters for neither of the two. Exact from 10⁻⁹ up.
 */
function inTwo(value: number): [parts: number, rest: number] {
  const parts = Math.round(value * 2 ** 30);
  return [parts, value - parts / 2 ** 30];
}

/** The driver works within one turn of the event loop; between portions others have theirs. */
function yieldToOthers(): Promise<void> {
  return new Promise((resolve) => setImmediate(resolve));
}

function* portions<T>(rows: T[], size: number): Generator<T[]> {
  for (let at = 0; at < rows.length; at += size) yield rows.slice(at, at + size);
}
