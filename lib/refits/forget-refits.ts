/** The chore that removes refits whose hour is over, with what was sent and what was answered. */
import { deleteExpiredRefits } from '@/db/queries/refits';

/** Removes the refits that nobody can ask for any more. */
export async function forgetExpiredRefits(): Promise<void> {
  await deleteExpiredRefits(Date.now());
}
