import { eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { readDatabase, write } from '@/db/client';
import { idempotencyKeys } from '@/db/tables/deposits';
import { SYSTEM, VISITOR } from '@/lib/auth/actor';
import {
  earlierOutcome,
  type Idempotency,
  idempotencyOf,
  once,
  readIdempotencyKey,
} from '@/lib/serving/idempotency';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();

const DAY_MS = 24 * 60 * 60 * 1000;

function keyed(key: string, body = 'body'): Idempotency {
  const made = idempotencyOf(SYSTEM, 'call', key, body);
  if (made === null) throw new Error('no key');
  return made;
}

async function age(key: Idempotency, ms: number): Promise<void> {
  await write('acknowledged', async (tx) => {
    const createdAt = Date.now() - ms;
    await tx.update(idempotencyKeys).set({ createdAt }).where(eq(idempotencyKeys.keyHash, key.keyHash));
  });
}

describe('an Idempotency-Key', () => {
  it.each(['', 'with space', 'é', 'x'.repeat(256)])('%j is refused', (key) => {
    const headers = { get: () => key } as unknown as Headers;
    expect(readIdempotencyKey(headers)).toMatchObject({ ok: false, failure: { code: 'bad-header' } });
  });

  it('tells actors, calls, keys and bodies apart, wherever one ends and the next begins', () => {
    const all = [
      idempotencyOf(SYSTEM, 'call', 'key', 'body'),
      idempotencyOf(VISITOR, 'call', 'key', 'body'),
      idempotencyOf(SYSTEM, 'callk', 'ey', 'body'),
      idempotencyOf(SYSTEM, 'call', 'key', 'bo', 'dy'),
    ].map((one) => `${one?.keyHash} ${one?.bodyHash}`);
    expect(new Set(all).size).toBe(4);
    expect(idempotencyOf(SYSTEM, 'call', null, 'body')).toBeNull();
  });

  it('has one effect for a day, then another', async () => {
    let effects = 0;
    const act = () =>
      write('acknowledged', (tx) =>
        once(tx, keyed('day'), async () => ({ ok: true as const, effect: ++effects })),
      );
    expect([await act(), await act()]).toEqual([
      { ok: true, effect: 1 },
      { ok: true, effect: 1 },
    ]);
    await age(keyed('day'), DAY_MS - 5_000);
    expect(await act()).toEqual({ ok: true, effect: 1 });
    await age(keyed('day'), DAY_MS + 1);
    expect(await earlierOutcome(await readDatabase(), keyed('day'))).toBeNull();
    expect(await act()).toEqual({ ok: true, effect: 2 });
  });

  it('is not used up by what fails or throws', async () => {
    const failing = () =>
      write('acknowledged', (tx) =>
        once(tx, keyed('fails'), async () => ({
          ok: false as const,
          failure: { code: 'conflict' as const },
        })),
      );
    await failing();
    const throwing = write('acknowledged', (tx) =>
      once(tx, keyed('fails'), async () => {
        throw new Error('on the way');
      }),
    );
    await expect(throwing).rejects.toThrow('on the way');
    expect(await earlierOutcome(await readDatabase(), keyed('fails'))).toBeNull();
  });
});
