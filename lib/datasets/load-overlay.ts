/** What the overlay plot draws of a selection: cells always, single points where they are few, off-curve points. */
import type { Selection } from '@/db/queries/dataset-selection';
import { selectSeriesHeads, selectTotals } from '@/db/queries/datasets';
import { selectMergedCells, selectNamesOf, selectOffCurve, selectPointColumns } from '@/db/queries/overlay';
import type { Actor } from '@/lib/auth/actor';
import { decide } from '@/lib/auth/permissions';
import { refusal } from '@/lib/auth/refusal';
import type { Outcome } from '@/lib/errors';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { ACTIVITY_CELL, ENERGY_CELL_KT } from '@/schemas/density-grid';
import type { Overlay, OverlayCells, OverlayPoints } from '@/schemas/overlay';
import { formatAccession } from './accession';
import { countedWindow, countsOf, selectionOf } from './dataset-filter';
import { decodeFlags, decodeNumbers } from './decode-columns';
import { energyCellOf } from './density-grid';

/** Up to this many points of all flags are sent one by one. */
export const MOST_SINGLE_POINTS = 4000;
/** Off-curve points that are sent at most, the furthest off. */
export const MOST_OFF_CURVE = 2000;

interface DrawnPoint {
  accession: number;
  position: number;
  point: number;
  energy: number;
  activity: number;
  expected: number;
  z: number;
  flag: OverlayPoints['flag'][number];
}

/** The overlay of everything that the filters select. */
export async function loadOverlay(
  actor: Actor,
  filters: DatasetFilters,
): Promise<Outcome<{ overlay: Overlay }>> {
  const decision = decide(actor, 'read-published');
  if (decision !== 'allowed') return { ok: false, failure: refusal(decision) };
  const selection = selectionOf(filters);
  const totals = await selectTotals(selection);
  const counts = { datasets: totals.datasets, ...countsOf(totals.points) };
  const [cells, missing, single] = await Promise.all([
    selectMergedCells(selection),
    selectOffCurve(selection, MOST_OFF_CURVE),
    counts.points <= MOST_SINGLE_POINTS ? loadSinglePoints(selection) : null,
  ]);
  const offCurve = missing.map((row): DrawnPoint => ({ ...row, flag: 'off-curve' }));
  const accessions = [...new Set([...offCurve, ...(single ?? [])].map(({ accession }) => accession))].sort(
    (a, b) => a - b,
  );
  const place = new Map(accessions.map((accession, index) => [accession, index]));
  return {
    ok: true,
    overlay: {
      counts,
      window: countedWindow(filters, selection.window),
      grid: { energy: ENERGY_CELL_KT, activity: ACTIVITY_CELL },
      cells: cellColumns(cells),
      points: single && pointColumns(single, place),
      offCurve: { total: counts.offCurve, shown: offCurve.length, points: pointColumns(offCurve, place) },
      datasets: await nameDatasets(accessions),
    },
  };
}

async function loadSinglePoints(selection: Selection): Promise<DrawnPoint[]> {
  const { window } = selection;
  const drawn: DrawnPoint[] = [];
  for (const row of await selectPointColumns(selection)) {
    const [energy, activity, expected, z] = [row.energy, row.activity, row.expected, row.z].map(
      decodeNumbers,
    );
    decodeFlags(row.flags).forEach((flag, point) => {
      const cell = energyCellOf(energy[point]);
      if (window && (cell < window.firstCell || cell >= window.endCell)) return;
      const { accession, position } = row;
      const numbers = {
        energy: energy[point],
        activity: activity[point],
        expected: expected[point],
        z: z[point],
      };
      drawn.push({ accession, position, point, ...numbers, flag });
    });
  }
  return drawn;
}

function pointColumns(points: DrawnPoint[], place: Map<number, number>): OverlayPoints {
  return {
    dataset: points.map(({ accession }) => place.get(accession) ?? 0),
    series: points.map(({ position }) => position),
    point: points.map(({ point }) => point),
    energy: points.map(({ energy }) => energy),
    activity: points.map(({ activity }) => activity),
    expected: points.map(({ expected }) => expected),
    z: points.map(({ z }) => z),
    flag: points.map(({ flag }) => flag),
  };
}

function cellColumns(cells: Awaited<ReturnType<typeof selectMergedCells>>): OverlayCells {
  return {
    energyCell: cells.map(({ energyCell }) => energyCell),
    activityCell: cells.map(({ activityCell }) => activityCell),
    flag: cells.map(({ flag }) => flag),
    points: cells.map(({ points }) => points),
  };
}

async function nameDatasets(accessions: number[]): Promise<Overlay['datasets']> {
  if (accessions.length === 0) return [];
  const [names, series] = await Promise.all([selectNamesOf(accessions), selectSeriesHeads(accessions)]);
  const labels = new Map<number, string[]>();
  for (const { accession, label } of series) labels.set(accession, [...(labels.get(accession) ?? []), label]);
  return names.map(({ accession, title, labSlug, labName, system, systemName }) => ({
    accession: formatAccession(accession),
    title,
    lab: { slug: labSlug, name: labName },
    system: { slug: system, name: systemName },
    series: labels.get(accession) ?? [],
  }));
}
