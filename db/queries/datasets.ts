/** The SQL of browsing: lists, counts and choices of published datasets. Summaries are rows; points are counted by cells. */
import { and, asc, count, desc, eq, inArray, isNotNull, lt, or, type SQL, sql, sum } from 'drizzle-orm';
import type { SQLiteSelect } from 'drizzle-orm/sqlite-core';
import { readDatabase } from '@/db/client';
import {
  accessionsOf,
  type CellWindow,
  type FacetName,
  hasFlag,
  inWindow,
  type Selection,
  selectedBy,
} from '@/db/queries/dataset-selection';
import { datasetSeries, datasets, densityCells } from '@/db/tables/datasets';
import { deposits, revisions } from '@/db/tables/deposits';
import { laboratories } from '@/db/tables/laboratories';
import { systems } from '@/db/tables/systems';
import { POINT_FLAGS } from '@/schemas/dataset-query';

const HEAD = {
  accession: datasets.accession,
  depositId: datasets.depositId,
  labId: datasets.labId,
  revision: datasets.revision,
  title: datasets.title,
  labSlug: laboratories.slug,
  labName: laboratories.name,
  institution: laboratories.institution,
  system: datasets.system,
  // A system that is not listed yet goes by its slug.
  systemName: sql<string>`coalesce(${systems.name}, ${datasets.system})`,
  ligands: datasets.ligands,
  points: datasets.points,
  onCurve: datasets.onCurve,
  warning: datasets.warning,
  offCurve: datasets.offCurve,
  rmsZ: datasets.rmsZ,
  pValue: datasets.pValue,
  fittedHere: datasets.fittedHere,
  publishedAt: datasets.publishedAt,
  state: deposits.state,
  stateChangedAt: deposits.updatedAt,
  withdrawnAt: datasets.withdrawnAt,
  withdrawalReason: datasets.withdrawalReason,
  strip: datasets.strip,
};

export type DatasetHead = Awaited<ReturnType<typeof selectDataset>> & object;

export interface FlagCount {
  flag: (typeof POINT_FLAGS)[number];
  points: number;
}

/** Where a page of the list begins: after this dataset. */
export interface DatasetPlace {
  publishedAt: number;
  accession: number;
}

/** A dataset by its number, withdrawn ones too, or undefined. */
export async function selectDataset(accession: number) {
  const database = await readDatabase();
  const [row] = await joined(database.select(HEAD).from(datasets).$dynamic()).where(
    eq(datasets.accession, accession),
  );
  return row;
}

/** A published revision whole, or undefined: a revision that was not published is nobody's business. */
export async function selectPublishedRevision(depositId: string, number: number) {
  const database = await readDatabase();
  const [row] = await database
    .select()
    .from(revisions)
    .where(
      and(eq(revisions.depositId, depositId), eq(revisions.number, number), isNotNull(revisions.publishedAt)),
    );
  return row;
}

/** One page of a selection, the newest first. */
export async function selectDatasetPage(
  selection: Selection,
  after: DatasetPlace | null,
  limit: number,
): Promise<DatasetHead[]> {
  const database = await readDatabase();
  const behind = after
    ? or(
        lt(datasets.publishedAt, after.publishedAt),
        and(eq(datasets.publishedAt, after.publishedAt), lt(datasets.accession, after.accession)),
      )
    : undefined;
  return joined(database.select(HEAD).from(datasets).$dynamic())
    .where(and(selectedBy(selection), behind))
    .orderBy(desc(datasets.publishedAt), desc(datasets.accession))
    .limit(limit);
}

/** How many datasets a selection holds and how many points of each flag, in its window where it has one. */
export async function selectTotals(selection: Selection): Promise<{ datasets: number; points: FlagCount[] }> {
  const database = await readDatabase();
  const totals = {
    datasets: count(),
    onCurve: total(datasets.onCurve),
    warning: total(datasets.warning),
    offCurve: total(datasets.offCurve),
  };
  const [row] = await joined(database.select(totals).from(datasets).$dynamic()).where(selectedBy(selection));
  if (!row) return { datasets: 0, points: [] };
  if (selection.window) {
    const chosen = inArray(densityCells.accession, accessionsOf(database, selection));
    const points = await database
      .select({ flag: densityCells.flag, points: total(densityCells.points) })
      .from(densityCells)
      .where(and(chosen, inWindow(selection.window)))
      .groupBy(densityCells.flag);
    return { datasets: row.datasets, points };
  }
  const counts = { 'on-curve': row.onCurve, warning: row.warning, 'off-curve': row.offCurve };
  return { datasets: row.datasets, points: POINT_FLAGS.map((flag) => ({ flag, points: counts[flag] })) };
}

/** Points of some datasets within a window, by dataset and flag. */
export async function selectWindowCounts(
  accessions: number[],
  window: CellWindow,
): Promise<(FlagCount & { accession: number })[]> {
  const database = await readDatabase();
  return database
    .select({
      accession: densityCells.accession,
      flag: densityCells.flag,
      points: total(densityCells.points),
    })
    .from(densityCells)
    .where(and(inArray(densityCells.accession, accessions), inWindow(window)))
    .groupBy(densityCells.accession, densityCells.flag);
}

/** What the strips of some datasets are drawn from, series by series. */
export async function selectStripColumns(accessions: number[]) {
  const database = await readDatabase();
  return database
    .select({
      accession: datasetSeries.accession,
      energy: datasetSeries.energy,
      z: datasetSeries.z,
      flags: datasetSeries.flags,
    })
    .from(datasetSeries)
    .where(inArray(datasetSeries.accession, accessions))
    .orderBy(asc(datasetSeries.accession), asc(datasetSeries.position));
}

/** The series of a dataset without their numbers. */
export async function selectSeriesHeads(accessions: number[]) {
  const database = await readDatabase();
  return database
    .select({
      accession: datasetSeries.accession,
      position: datasetSeries.position,
      label: datasetSeries.label,
    })
    .from(datasetSeries)
    .where(inArray(datasetSeries.accession, accessions))
    .orderBy(asc(datasetSeries.accession), asc(datasetSeries.position));
}

export interface FacetRow {
  value: string;
  name: string;
  datasets: number;
}

/** Datasets for each choice of one filter, under the other filters; most first. */
export async function selectFacet(
  name: Exclude<FacetName, 'flag'>,
  selection: Selection,
): Promise<FacetRow[]> {
  const database = await readDatabase();
  const number = sql<number>`count(distinct ${datasets.accession})`;
  const columns = {
    system: { value: datasets.system, name: sql<string>`coalesce(${systems.name}, ${datasets.system})` },
    lab: { value: laboratories.slug, name: laboratories.name },
    ligand: { value: sql<string>`min(ligand.value)`, name: sql<string>`min(ligand.value)` },
  }[name];
  const by: Record<typeof name, SQL | typeof datasets.system> = {
    system: datasets.system,
    lab: sql`${laboratories.slug}`,
    ligand: sql`lower(ligand.value)`,
  };
  const from = joined(
    database
      .select({ ...columns, datasets: number })
      .from(datasets)
      .$dynamic(),
  );
  const spread =
    name === 'ligand' ? from.innerJoin(sql`json_each(${datasets.ligands}) as ligand`, sql`true`) : from;
  return spread.where(selectedBy(selection, name)).groupBy(by[name]).orderBy(desc(number), asc(columns.name));
}

/** What systems or laboratories of some slugs are called, whether or not any dataset of theirs is selected. */
export async function selectFacetNames(
  name: 'system' | 'lab',
  slugs: string[],
): Promise<{ value: string; name: string }[]> {
  const database = await readDatabase();
  const table = name === 'system' ? systems : laboratories;
  return database
    .select({ value: table.slug, name: table.name })
    .from(table)
    .where(inArray(table.slug, slugs))
    .orderBy(asc(table.name));
}

/** Datasets that have points of each flag, under the other filters. */
export async function selectFlagFacet(selection: Selection): Promise<Record<FlagCount['flag'], number>> {
  const database = await readDatabase();
  const having = (flag: FlagCount['flag']) =>
    sql<number>`coalesce(sum(${hasFlag(flag, selection.window)}), 0)`;
  const columns = {
    'on-curve': having('on-curve'),
    warning: having('warning'),
    'off-curve': having('off-curve'),
  };
  const [row] = await joined(database.select(columns).from(datasets).$dynamic()).where(
    selectedBy(selection, 'flag'),
  );
  return row ?? { 'on-curve': 0, warning: 0, 'off-curve': 0 };
}

/**
 * A text that changes whenever anything changes that reading may show: a dataset that comes, goes or is revised,
 * or a name of a laboratory or system.
 */
export async function selectCollectionVersion(): Promise<string> {
  const database = await readDatabase();
  const labs = sql`(select group_concat(${laboratories.slug} || '=' || ${laboratories.name} || '=' || ${laboratories.institution}) from ${laboratories})`;
  const listed = sql`(select group_concat(${systems.slug} || '=' || ${systems.name} || '=' || ${systems.protein} || '=' || ${systems.ligands} || '=' || ${systems.status}) from ${systems})`;
  const [row] = await database
    .select({
      datasets: count(),
      revisions: total(datasets.revision),
      changedAt: sql<number>`coalesce(max(${datasets.updatedAt}), 0)`,
      names: sql<string>`coalesce(${labs}, '') || '|' || coalesce(${listed}, '')`,
    })
    .from(datasets)
    .innerJoin(deposits, eq(deposits.id, datasets.depositId))
    .where(sql`${deposits.state} <> 'withdrawn'`);
  return JSON.stringify(row);
}

function total(column: Parameters<typeof sum>[0]) {
  return sql<number>`coalesce(${sum(column)}, 0)`.mapWith(Number);
}

/** The tables that the conditions of a selection speak of. */
function joined<T extends SQLiteSelect>(query: T) {
  return query
    .innerJoin(deposits, eq(deposits.id, datasets.depositId))
    .innerJoin(laboratories, eq(laboratories.id, datasets.labId))
    .leftJoin(systems, eq(systems.slug, datasets.system));
}
