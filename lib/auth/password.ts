/** Passwords: kept as argon2id hashes, never as they are. */
import { hash, verify } from '@node-rs/argon2';

/** Costs of argon2id: 19 MiB, two passes, one lane (OWASP's minimum; its package takes argon2id by default). */
const COSTS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

const zeros = (bytes: number) => Buffer.alloc(bytes).toString('base64').replace(/=+$/, '');

/** A hash that no password has: what is compared where there is no account, so that the answer takes as long. */
const NOBODYS_HASH = `$argon2id$v=19$m=${COSTS.memoryCost},t=${COSTS.timeCost},p=${COSTS.parallelism}$${zeros(16)}$${zeros(32)}`;

/** The hash to keep of a password, with a salt of its own. */
export async function hashPassword(password: string): Promise<string> {
  return hash(sameBytes(password), COSTS);
}

/**
 * Whether it is the password of that hash. Without a hash the answer is no, after the same work.
 *
 * @param kept what `hashPassword` gave, or undefined where there is no such account
 */
export async function isPassword(password: string, kept: string | undefined): Promise<boolean> {
  const matches = await verify(kept ?? NOBODYS_HASH, sameBytes(password));
  return matches && kept !== undefined;
}

/** One letter with its accent has two spellings in Unicode, and keyboards differ in which they send (RFC 8265, 4.2). */
function sameBytes(password: string): string {
  return password.normalize('NFC');
}
