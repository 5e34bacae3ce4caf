/** The SQL of the overlay plot: merged cells, off-curve points, and the columns of few points. */
import { and, asc, desc, inArray, sql } from 'drizzle-orm';
import { readDatabase } from '@/db/client';
import { accessionsOf, energyInWindow, inWindow, type Selection } from '@/db/queries/dataset-selection';
import { datasetSeries, datasets, densityCells, offCurvePoints } from '@/db/tables/datasets';
import { laboratories } from '@/db/tables/laboratories';
import { systems } from '@/db/tables/systems';

/** Cells of the whole selection, merged over datasets and series. */
export async function selectMergedCells(selection: Selection) {
  const database = await readDatabase();
  const { energyCell, activityCell, flag } = densityCells;
  return database
    .select({
      energyCell,
      activityCell,
      flag,
      points: sql<number>`sum(${densityCells.points})`.mapWith(Number),
    })
    .from(densityCells)
    .where(
      and(inArray(densityCells.accession, accessionsOf(database, selection)), inWindow(selection.window)),
    )
    .groupBy(energyCell, activityCell, flag)
    .orderBy(asc(energyCell), asc(activityCell), asc(flag));
}

/** Off-curve points of a selection, the furthest off first, at most `limit`. */
export async function selectOffCurve(selection: Selection, limit: number) {
  const database = await readDatabase();
  return database
    .select()
    .from(offCurvePoints)
    .where(
      and(
        inArray(offCurvePoints.accession, accessionsOf(database, selection)),
        energyInWindow(offCurvePoints.energy, selection.window),
      ),
    )
    .orderBy(
      desc(sql`abs(${offCurvePoints.z})`),
      asc(offCurvePoints.accession),
      asc(offCurvePoints.position),
      asc(offCurvePoints.point),
    )
    .limit(limit);
}

/** What single points are drawn from, series by series. */
export async function selectPointColumns(selection: Selection) {
  const database = await readDatabase();
  const { accession, position, energy, activity, expected, z, flags } = datasetSeries;
  return database
    .select({ accession, position, energy, activity, expected, z, flags })
    .from(datasetSeries)
    .where(inArray(datasetSeries.accession, accessionsOf(database, selection)))
    .orderBy(asc(accession), asc(position));
}

/** Names of the datasets that points belong to, by accession. */
export async function selectNamesOf(accessions: number[]) {
  const database = await readDatabase();
  return database
    .select({
      accession: datasets.accession,
      title: datasets.title,
      labSlug: laboratories.slug,
      labName: laboratories.name,
      system: datasets.system,
      systemName: sql<string>`coalesce(${systems.name}, ${datasets.system})`,
    })
    .from(datasets)
    .innerJoin(laboratories, sql`${laboratories.id} = ${datasets.labId}`)
    .leftJoin(systems, sql`${systems.slug} = ${datasets.system}`)
    .where(inArray(datasets.accession, accessions))
    .orderBy(asc(datasets.accession));
}
