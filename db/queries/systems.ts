/** The SQL of systems and of what laboratories published on each. */
import { type AnyColumn, and, asc, count, eq, gt, inArray, ne, or, sql } from 'drizzle-orm';
import { readDatabase, type Transaction } from '@/db/client';
import { datasets } from '@/db/tables/datasets';
import { deposits } from '@/db/tables/deposits';
import { laboratories } from '@/db/tables/laboratories';
import { systems } from '@/db/tables/systems';

export type SystemRow = typeof systems.$inferSelect;

/** Where a page of the list begins: after this system. */
export interface SystemPlace {
  name: string;
  slug: string;
}

/** Listed systems by name. */
export async function selectSystemPage(after: SystemPlace | null, limit: number): Promise<SystemRow[]> {
  const database = await readDatabase();
  const behind = after
    ? or(gt(systems.name, after.name), and(eq(systems.name, after.name), gt(systems.slug, after.slug)))
    : undefined;
  return database
    .select()
    .from(systems)
    .where(and(eq(systems.status, 'listed'), behind))
    .orderBy(asc(systems.name), asc(systems.slug))
    .limit(limit);
}

/** A listed system, or undefined. */
export async function selectSystem(slug: string): Promise<SystemRow | undefined> {
  const database = await readDatabase();
  const [row] = await database
    .select()
    .from(systems)
    .where(and(eq(systems.slug, slug), eq(systems.status, 'listed')));
  return row;
}

/** What is published on some systems or by some laboratories, one row for each pair of the two; most datasets first. */
export async function selectPublishedBy(of: { systems: string[] } | { lab: string }) {
  const database = await readDatabase();
  const total = (column: AnyColumn) => sql<number>`sum(${column})`.mapWith(Number);
  return database
    .select({
      system: datasets.system,
      systemName: sql<string>`coalesce(${systems.name}, ${datasets.system})`,
      labSlug: laboratories.slug,
      labName: laboratories.name,
      datasets: count(),
      points: total(datasets.points),
      onCurve: total(datasets.onCurve),
      warning: total(datasets.warning),
      offCurve: total(datasets.offCurve),
    })
    .from(datasets)
    .innerJoin(deposits, eq(deposits.id, datasets.depositId))
    .innerJoin(laboratories, eq(laboratories.id, datasets.labId))
    .leftJoin(systems, eq(systems.slug, datasets.system))
    .where(
      and(
        ne(deposits.state, 'withdrawn'),
        'lab' in of ? eq(laboratories.slug, of.lab) : inArray(datasets.system, of.systems),
      ),
    )
    .groupBy(datasets.system, laboratories.slug)
    .orderBy(sql`count(*) desc`, asc(laboratories.name), asc(datasets.system));
}

/** Lists a system, or gives the one of that slug the stated name, protein and ligands. */
export async function upsertListedSystem(tx: Transaction, row: Omit<SystemRow, 'status'>): Promise<void> {
  const { name, protein, ligands } = row;
  await tx
    .insert(systems)
    .values({ ...row, status: 'listed' })
    .onConflictDoUpdate({ target: systems.slug, set: { name, protein, ligands, status: 'listed' } });
}
