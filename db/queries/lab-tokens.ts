/** The SQL of laboratory tokens, which are known here by the SHA-256 of the token alone. */
import { and, desc, eq, getTableColumns, gt, isNull } from 'drizzle-orm';
import { readDatabase, type Transaction } from '@/db/client';
import { labTokens } from '@/db/tables/laboratories';
import { people } from '@/db/tables/people';

export type LabTokenRow = typeof labTokens.$inferSelect;

/** A token that is neither revoked nor past its end, with the address of who made it, or undefined. */
export async function selectLiveToken(
  tokenHash: string,
  nowMs: number,
): Promise<(LabTokenRow & { createdByEmail: string | null }) | undefined> {
  const database = await readDatabase();
  const [row] = await database
    .select({ ...getTableColumns(labTokens), createdByEmail: people.email })
    .from(labTokens)
    .leftJoin(people, eq(people.id, labTokens.createdBy))
    .where(
      and(eq(labTokens.tokenHash, tokenHash), isNull(labTokens.revokedAt), gt(labTokens.expiresAt, nowMs)),
    );
  return row;
}

/** All tokens of a laboratory with the name of who made each, newest first. Without their hashes. */
export async function selectTokensOf(
  labId: string,
): Promise<(Omit<LabTokenRow, 'tokenHash' | 'createdBy'> & { createdBy: string | null })[]> {
  const database = await readDatabase();
  return database
    .select({
      id: labTokens.id,
      labId: labTokens.labId,
      name: labTokens.name,
      scopes: labTokens.scopes,
      createdBy: people.name,
      createdAt: labTokens.createdAt,
      expiresAt: labTokens.expiresAt,
      lastUsedAt: labTokens.lastUsedAt,
      revokedAt: labTokens.revokedAt,
    })
    .from(labTokens)
    .leftJoin(people, eq(people.id, labTokens.createdBy))
    .where(eq(labTokens.labId, labId))
    .orderBy(desc(labTokens.createdAt), desc(labTokens.id));
}

/** The token of that id in that laboratory, or undefined. */
export async function selectTokenOf(
  tx: Transaction,
  labId: string,
  id: string,
): Promise<LabTokenRow | undefined> {
  const [row] = await tx
    .select()
    .from(labTokens)
    .where(and(eq(labTokens.id, id), eq(labTokens.labId, labId)));
  return row;
}

/** Adds a token. */
export async function insertToken(tx: Transaction, row: typeof labTokens.$inferInsert): Promise<void> {
  await tx.insert(labTokens).values(row);
}

/** Revokes a token that is not revoked yet. Returns whether this call did it. */
export async function updateTokenRevoked(tx: Transaction, id: string, nowMs: number): Promise<boolean> {
  const changed = await tx
    .update(labTokens)
    .set({ revokedAt: nowMs })
    .where(and(eq(labTokens.id, id), isNull(labTokens.revokedAt)))
    .returning({ id: labTokens.id });
  return changed.length > 0;
}

/** Notes when a token was last used. */
export async function updateTokenUsed(tx: Transaction, id: string, nowMs: number): Promise<void> {
  await tx.update(labTokens).set({ lastUsedAt: nowMs }).where(eq(labTokens.id, id));
}
