/** The SQL behind the slowing of failed sign-ins; the rules themselves are in lib/auth/sign-in-limits. */
import { and, eq, lte, or } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { signInAttempts } from '@/db/tables/people';

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
