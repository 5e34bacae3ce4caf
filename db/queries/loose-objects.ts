/** The SQL of objects that no file points to yet, or any more. */
import { and, eq, gt, inArray, lte } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import type { Reader } from '@/db/queries/deposits';
import { looseObjects } from '@/db/tables/deposits';

/** Notes objects as loose since a time (Unix time, ms). */
export async function insertLooseObjects(tx: Transaction, keys: string[], since: number): Promise<void> {
  if (keys.length === 0) return;
  await tx.insert(looseObjects).values(keys.map((objectKey) => ({ objectKey, since })));
}

/** Takes an object that is loose for less long from the list. Returns whether it was there. */
export async function takeLooseObject(tx: Transaction, key: string, after: number): Promise<boolean> {
  const taken = await tx
    .delete(looseObjects)
    .where(and(eq(looseObjects.objectKey, key), gt(looseObjects.since, after)))
    .returning({ key: looseObjects.objectKey });
  return taken.length === 1;
}

/** Objects that are loose since that time or longer. */
export async function selectLooseObjects(reader: Reader, upTo: number, limit: number): Promise<string[]> {
  const rows = await reader
    .select({ key: looseObjects.objectKey })
    .from(looseObjects)
    .where(lte(looseObjects.since, upTo))
    .limit(limit);
  return rows.map(({ key }) => key);
}

/** Takes objects from the list that are gone from the store. */
export async function deleteLooseObjects(tx: Transaction, keys: string[]): Promise<void> {
  await tx.delete(looseObjects).where(inArray(looseObjects.objectKey, keys));
}
