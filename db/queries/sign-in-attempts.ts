/** The SQL behind the slowing of failed sign-ins; the rules themselves are in lib/auth/sign-in-limits. */
import { and, eq, gt, lte, or } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { signInAttempts, signInPlaces } from '@/db/tables/people';

export type SignInAttemptRow = typeof signInAttempts.$inferSelect;

/** Removes the attempts made at or before `beforeMs`. */
export async function purgeSignInAttempts(tx: Transaction, beforeMs: number): Promise<void> {
  await tx.delete(signInAttempts).where(lte(signInAttempts.at, beforeMs));
}

/** The attempts on an account from anywhere, and those from an address on any account. */
export async function selectSignInAttempts(
  tx: Transaction,
  accountKey: string,
  addressKey: string,
): Promise<SignInAttemptRow[]> {
  return tx
    .select()
    .from(signInAttempts)
    .where(or(eq(signInAttempts.accountKey, accountKey), eq(signInAttempts.addressKey, addressKey)));
}

/** Notes an attempt. */
export async function insertSignInAttempt(tx: Transaction, row: SignInAttemptRow): Promise<void> {
  await tx.insert(signInAttempts).values(row);
}

/** Forgets the attempts on an account from one address: its owner was there. */
export async function deleteSignInAttempts(
  tx: Transaction,
  accountKey: string,
  addressKey: string,
): Promise<void> {
  await tx
    .delete(signInAttempts)
    .where(and(eq(signInAttempts.accountKey, accountKey), eq(signInAttempts.addressKey, addressKey)));
}

/** Whether somebody signed in to the account from the address after `since` (Unix time, ms). */
export async function selectIsKnownPlace(
  tx: Transaction,
  accountKey: string,
  addressKey: string,
  since: number,
): Promise<boolean> {
  const rows = await tx
    .select({ at: signInPlaces.at })
    .from(signInPlaces)
    .where(
      and(
        eq(signInPlaces.accountKey, accountKey),
        eq(signInPlaces.addressKey, addressKey),
        gt(signInPlaces.at, since),
      ),
    );
  return rows.length > 0;
}

/** Notes that somebody signed in to the account from the address; forgets what was before `since`. */
export async function upsertSignInPlace(
  tx: Transaction,
  row: typeof signInPlaces.$inferInsert,
  since: number,
): Promise<void> {
  await tx.delete(signInPlaces).where(lte(signInPlaces.at, since));
  await tx
    .insert(signInPlaces)
    .values(row)
    .onConflictDoUpdate({ target: [signInPlaces.accountKey, signInPlaces.addressKey], set: { at: row.at } });
}
