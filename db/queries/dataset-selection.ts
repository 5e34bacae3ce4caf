/** Which published datasets a reader asks for, as SQL. Every list, count and plot selects by these conditions. */
import { type AnyColumn, and, eq, gte, inArray, lt, ne, or, type SQL, sql } from 'drizzle-orm';
import type { Database } from '@/db/client';
import { datasetSeries, datasets, densityCells } from '@/db/tables/datasets';
import { deposits } from '@/db/tables/deposits';
import { laboratories } from '@/db/tables/laboratories';
import { systems } from '@/db/tables/systems';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { ENERGY_CELL_KT } from '@/schemas/density-grid';

/** Energies as cells of `density_cells`: from the first up to but without the end. */
export interface CellWindow {
  firstCell: number;
  endCell: number;
}

export interface Selection {
  filters: Omit<DatasetFilters, 'from' | 'to'>;
  window: CellWindow | null;
}

/** A filter with counts beside its choices. */
export type FacetName = 'system' | 'lab' | 'ligand' | 'flag';

type Flag = DatasetFilters['flag'][number];

/** The text of an accession, for the search. */
const ACCESSION = sql`printf('CK-%06d', ${datasets.accession})`;

/**
 * The conditions of a selection, for a query over `datasets` joined with laboratories, systems and deposits.
 *
 * @param without a filter to leave out, whose choices are being counted
 */
export function selectedBy({ filters, window }: Selection, without?: FacetName): SQL | undefined {
  const { system, lab, ligand, variant, flag, q } = filters;
  return and(
    ne(deposits.state, 'withdrawn'),
    system.length > 0 && without !== 'system' ? inArray(datasets.system, system) : undefined,
    lab.length > 0 && without !== 'lab' ? inArray(laboratories.slug, lab) : undefined,
    ligand.length > 0 && without !== 'ligand' ? holdsLigand(ligand) : undefined,
    variant.length > 0 ? holdsVariant(variant) : undefined,
    window ? hasPoints(window) : undefined,
    flag.length > 0 && without !== 'flag' ? or(...flag.map((one) => hasFlag(one, window))) : undefined,
    ...q.map(mentions),
  );
}

/** The accessions of a selection, as a subquery. */
export function accessionsOf(database: Database, selection: Selection) {
  return database
    .select({ accession: datasets.accession })
    .from(datasets)
    .innerJoin(deposits, eq(deposits.id, datasets.depositId))
    .innerJoin(laboratories, eq(laboratories.id, datasets.labId))
    .leftJoin(systems, eq(systems.slug, datasets.system))
    .where(selectedBy(selection));
}

/** Whether a cell lies in the window. */
export function inWindow(window: CellWindow | null): SQL | undefined {
  if (window === null) return undefined;
  return and(gte(densityCells.energyCell, window.firstCell), lt(densityCells.energyCell, window.endCell));
}

/** Whether an energy lies in a cell of the window: the quotient of which the cell's number is the floor. */
export function energyInWindow(energy: AnyColumn, window: CellWindow | null): SQL | undefined {
  if (window === null) return undefined;
  return sql`${energy} / ${ENERGY_CELL_KT} >= ${window.firstCell} and ${energy} / ${ENERGY_CELL_KT} < ${window.endCell}`;
}

/** Whether the dataset has a point of the flag, in the window where there is one. */
export function hasFlag(flag: Flag, window: CellWindow | null): SQL {
  if (window) return hasPoints(window, flag);
  const counts = { 'on-curve': datasets.onCurve, warning: datasets.warning, 'off-curve': datasets.offCurve };
  return sql`${counts[flag]} > 0`;
}

function hasPoints(window: CellWindow, flag?: Flag): SQL {
  const ofFlag = flag ? eq(densityCells.flag, flag) : undefined;
  const here = and(eq(densityCells.accession, datasets.accession), inWindow(window), ofFlag);
  return sql`exists (select 1 from ${densityCells} where ${here})`;
}

function holdsLigand(names: string[]): SQL {
  const any = or(...names.map((name) => sql`lower(ligand.value) = lower(${name})`));
  return sql`exists (select 1 from json_each(${datasets.ligands}) as ligand where ${any})`;
}

function holdsVariant(names: string[]): SQL {
  const any = or(...names.map((name) => sql`lower(${datasetSeries.variant}) = lower(${name})`));
  return sql`exists (select 1 from ${datasetSeries} where ${datasetSeries.accession} = ${datasets.accession} and (${any}))`;
}

/** Whether a word stands somewhere in what describes the dataset. Case is ignored for the letters a to z. */
function mentions(word: string): SQL {
  const holds = (text: unknown) => sql`instr(lower(${text}), lower(${word})) > 0`;
  const inVariant = sql`exists (select 1 from ${datasetSeries} where ${datasetSeries.accession} = ${datasets.accession} and ${holds(datasetSeries.variant)})`;
  const texts = [datasets.title, ACCESSION, datasets.system, laboratories.name, laboratories.slug];
  return sql`(${or(...texts.map(holds), holds(sql`coalesce(${systems.name}, '')`), inVariant)})`;
}
