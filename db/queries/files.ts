/** The SQL of the original files of a deposit; their bytes are objects. */
import { and, asc, count, eq } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import type { Reader } from '@/db/queries/deposits';
import { files } from '@/db/tables/deposits';

export type FileRow = typeof files.$inferSelect;

/** The files of a deposit, in the order in which they came. */
export async function selectFiles(reader: Reader, depositId: string): Promise<FileRow[]> {
  return reader
    .select()
    .from(files)
    .where(eq(files.depositId, depositId))
    .orderBy(asc(files.uploadedAt), asc(files.id));
}

/** One file of a deposit, or undefined. */
export async function selectFile(
  reader: Reader,
  depositId: string,
  id: string,
): Promise<FileRow | undefined> {
  const [row] = await reader
    .select()
    .from(files)
    .where(and(eq(files.depositId, depositId), eq(files.id, id)));
  return row;
}

/** How many files a deposit has. */
export async function countFiles(reader: Reader, depositId: string): Promise<number> {
  const [row] = await reader.select({ number: count() }).from(files).where(eq(files.depositId, depositId));
  return row?.number ?? 0;
}

/** Adds a file. */
export async function insertFile(tx: Transaction, row: FileRow): Promise<void> {
  await tx.insert(files).values(row);
}

/** Removes a file. Returns whether it was there. */
export async function deleteFile(tx: Transaction, depositId: string, id: string): Promise<boolean> {
  const removed = await tx
    .delete(files)
    .where(and(eq(files.depositId, depositId), eq(files.id, id)))
    .returning({ id: files.id });
  return removed.length === 1;
}

/** Removes all files of a deposit. */
export async function deleteFiles(tx: Transaction, depositId: string): Promise<void> {
  await tx.delete(files).where(eq(files.depositId, depositId));
}
