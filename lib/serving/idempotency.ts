/**
 * `Idempotency-Key`: a call that is repeated under the same key has its effect once and is answered the same. What a
 * call came to is noted in the transaction of its effect, so that a kill between the two is not possible.
 */
import { createHash } from 'node:crypto';
import type { Transaction } from '@/db/client';
import type { Reader } from '@/db/queries/deposits';
import { purgeKeys, selectKey, upsertKey } from '@/db/queries/idempotency';
import { type Actor, actorKey } from '@/lib/auth/actor';
import { failed, type Outcome } from '@/lib/errors';

/** How long a key is remembered. */
const KEPT_MS = 24 * 60 * 60 * 1000;

/** One key of one actor for one call, with the body that came with it; both as SHA-256, hex. */
export interface Idempotency {
  keyHash: string;
  bodyHash: string;
}

/**
 * The key that a request brings, or null where it brings none.
 *
 * @returns a failure where it is not 1 to 255 printable ASCII characters
 */
export function readIdempotencyKey(headers: Headers): Outcome<{ key: string | null }> {
  const key = headers.get('idempotency-key');
  if (key === null || /^[\x21-\x7e]{1,255}$/.test(key)) return { ok: true, key };
  return failed('bad-header', 'Idempotency-Key must be 1 to 255 printable ASCII characters without spaces.');
}

/**
 * What stands for a call under a key.
 *
 * @param call method and address, such as `POST /api/v1/deposits`
 * @param key null where the caller gave none; then the result is null as well
 * @param body everything that makes this call another one: its bytes, its parameters
 */
export function idempotencyOf(
  actor: Actor,
  call: string,
  key: string | null,
  ...body: (string | Uint8Array)[]
): Idempotency | null {
  if (key === null) return null;
  return { keyHash: hashOf(actorKey(actor), call, key), bodyHash: hashOf(...body) };
}

/** Whether the key was used for that call already, whatever came with it. */
export async function isKeyUsed(reader: Reader, idempotency: Idempotency | null): Promise<boolean> {
  if (idempotency === null) return false;
  return (await selectKey(reader, idempotency.keyHash, Date.now() - KEPT_MS)) !== undefined;
}

/** What the call came to earlier, or null where it was not made. To be asked before anything costly. */
export async function earlierOutcome<T>(
  reader: Reader,
  idempotency: Idempotency | null,
): Promise<Outcome<T> | null> {
  if (idempotency === null) return null;
  const found = await selectKey(reader, idempotency.keyHash, Date.now() - KEPT_MS);
  if (found === undefined) return null;
  if (found.bodyHash !== idempotency.bodyHash) return failed('idempotency-mismatch');
  return JSON.parse(found.outcome) as Outcome<T>;
}

/** Does `work` unless the key did it already; only what succeeded is noted, so that a failure can be tried again. */
export async function once<T>(
  tx: Transaction,
  idempotency: Idempotency | null,
  work: () => Promise<Outcome<T>>,
): Promise<Outcome<T>> {
  if (idempotency === null) return work();
  const earlier = await earlierOutcome<T>(tx, idempotency);
  if (earlier !== null) return earlier;
  const outcome = await work();
  if (!outcome.ok) return outcome;
  const now = Date.now();
  await purgeKeys(tx, now - KEPT_MS);
  await upsertKey(tx, { ...idempotency, outcome: JSON.stringify(outcome), createdAt: now });
  return outcome;
}

/** Each part with its length before it, so that no two lists of parts run together to the same bytes. */
function hashOf(...parts: (string | Uint8Array)[]): string {
  const hash = createHash('sha256');
  for (const part of parts) hash.update(`${Buffer.byteLength(part)}:`).update(part);
  return hash.digest('hex');
}
