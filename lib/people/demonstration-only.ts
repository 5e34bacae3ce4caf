/** Keeps the accounts of the demonstration, whose password everybody knows, inside the demonstration. */
import { write } from '@/db/client';
import { deleteSessionsOfAddresses } from '@/db/queries/sessions';
import { env } from '@/lib/env';
import { DEMO_ACCOUNTS } from './demo-accounts';

const ADDRESSES: readonly string[] = DEMO_ACCOUNTS.map(({ email }) => email);

/** Whether an account of that address (lower case) lets somebody in here. */
export function isOpenHere(email: string): boolean {
  return env().demo || !ADDRESSES.includes(email);
}

/** Ends the sessions that began while the same database served the demonstration. */
export async function endDemonstrationSessions(): Promise<void> {
  await write('acknowledged', (tx) => deleteSessionsOfAddresses(tx, ADDRESSES));
}
