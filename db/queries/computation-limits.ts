/** The SQL behind the limits on open computation; the rules themselves are in lib/assessments/computation-limits.ts. */
import { randomBytes } from 'node:crypto';
import { and, eq, gt, lte, sql } from 'drizzle-orm';
import { readDatabase, type Transaction, write } from '@/db/client';
import { computationLeases, computationUse, installKeys } from '@/db/tables/computation-limits';

export interface SecondOfUse {
  /** Unix time, s */
  second: number;
  calls: number;
  points: number;
}

/** Removes what no longer counts: use up to and including `oldestSecond`, leases that ended before `nowMs`. */
export async function purgeComputationUse(
  tx: Transaction,
  oldestSecond: number,
  nowMs: number,
): Promise<void> {
  await tx.delete(computationUse).where(lte(computationUse.second, oldestSecond));
  await tx.delete(computationLeases).where(lte(computationLeases.expiresAt, nowMs));
}

/** Use of one address after `oldestSecond`, oldest first. */
export async function selectComputationUse(
  tx: Transaction,
  addressKey: string,
  oldestSecond: number,
): Promise<SecondOfUse[]> {
  return tx
    .select({ second: computationUse.second, calls: computationUse.calls, points: computationUse.points })
    .from(computationUse)
    .where(and(eq(computationUse.addressKey, addressKey), gt(computationUse.second, oldestSecond)))
    .orderBy(computationUse.second);
}

/** How many computations of an address are under way, and the points set aside for them. */
export async function selectLeases(
  tx: Transaction,
  addressKey: string,
): Promise<{ count: number; reservedPoints: number }> {
  const [row] = await tx
    .select({
      count: sql<number>`count(*)`,
      reservedPoints: sql<number>`coalesce(sum(${computationLeases.reservedPoints}), 0)`,
    })
    .from(computationLeases)
    .where(eq(computationLeases.addressKey, addressKey));
  return row ?? { count: 0, reservedPoints: 0 };
}

/** Adds to what an address used in a second. */
export async function addComputationUse(
  tx: Transaction,
  addressKey: string,
  { second, calls, points }: SecondOfUse,
): Promise<void> {
  await tx
    .insert(computationUse)
    .values({ addressKey, second, calls, points })
    .onConflictDoUpdate({
      target: [computationUse.addressKey, computationUse.second],
      set: {
        calls: sql`${computationUse.calls} + ${calls}`,
        points: sql`${computationUse.points} + ${points}`,
      },
    });
}

/** Notes a computation as under way. */
export async function insertLease(
  tx: Transaction,
  lease: typeof computationLeases.$inferInsert,
): Promise<void> {
  await tx.insert(computationLeases).values(lease);
}

/** Notes a computation as ended. */
export async function deleteLease(tx: Transaction, id: string): Promise<void> {
  await tx.delete(computationLeases).where(eq(computationLeases.id, id));
}

/** The random key of that name of this installation: 32 bytes, made at the first call and the same ever after. */
export async function installKey(name: string): Promise<Buffer> {
  const database = await readDatabase();
  const select = database
    .select({ value: installKeys.value })
    .from(installKeys)
    .where(eq(installKeys.name, name));
  const [found] = await select;
  if (found) return found.value;
  const value = randomBytes(32);
  await write('acknowledged', async (tx) => {
    await tx.insert(installKeys).values({ name, value }).onConflictDoNothing();
  });
  // Read back: another process may have been first.
  const [kept] = await select;
  return kept?.value ?? value;
}
