import { describe, expect, it, vi } from 'vitest';
import { readDatabase } from '@/db/client';
import { selectAuditOf } from '@/db/queries/audit';
import { auditTrail } from '@/db/tables/deposits';
import { admitNote } from '@/lib/audit/bounded-notes';
import { VISITOR } from '@/lib/auth/actor';
import { listQueue } from '@/lib/curation/list-queue';
import { listDeposits } from '@/lib/deposits/list-deposits';
import { loadDeposit } from '@/lib/deposits/load-deposit';
import { createToken } from '@/lib/labs/create-token';
import { listOwnLabs } from '@/lib/labs/list-own-labs';
import { revokeToken } from '@/lib/labs/revoke-token';
import { auditOf } from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';

const { cast } = collectionForTests();
const HOUR_MS = 3_600_000;
const linesOf = async (subject: string) =>
  (await selectAuditOf(subject)).map(({ actor, action, detail }) => `${actor} ${action}: ${detail}`);

describe('a refusal', () => {
  it('is on the audit trail, whatever was refused', async () => {
    const depositor = `person:${cast.depositor.id}`;
    await listQueue({ actor: cast.depositor });
    await listDeposits({ actor: cast.curator });
    await listOwnLabs(cast.curator);
    await createToken(cast.depositor, cast.lab.labId, {});
    await revokeToken(cast.depositor, cast.lab.labId, 'some-token');
    expect(await linesOf('queue:')).toEqual([`${depositor} refused: see-queue`]);
    expect(await linesOf('deposits:')).toEqual([`person:${cast.curator.id} refused: see-own-deposits`]);
    expect(await linesOf('laboratories:')).toEqual([`person:${cast.curator.id} refused: see-lab`]);
    expect(await linesOf(`laboratory:${cast.lab.labId}`)).toEqual([`${depositor} refused: manage-tokens`]);
    expect(await linesOf('token:some-token')).toEqual([`${depositor} refused: manage-tokens`]);
  });

  it('keeps no text that somebody sent in the place of an id', async () => {
    for (const id of ['x'.repeat(5_000), 'a b\n', '<script>']) await loadDeposit({ actor: VISITOR, id });
    expect((await linesOf('deposit:?')).length).toBe(3);
  });

  it('of visitors is noted up to a number an hour; a flood leaves its size', async () => {
    vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + HOUR_MS });
    try {
      for (let i = 0; i < 230; i++) await loadDeposit({ actor: VISITOR, id: 'flooded' });
      expect(await auditOf('flooded')).toHaveLength(200);
      vi.setSystemTime(Date.now() + HOUR_MS);
      await loadDeposit({ actor: VISITOR, id: 'flooded' });
      expect((await auditOf('flooded')).at(-1)).toBe('refused: read-deposit; 30 more before it left out');
    } finally {
      vi.useRealTimers();
    }
    const rows = await (await readDatabase()).select().from(auditTrail);
    expect(rows.filter(({ subject }) => subject === 'deposit:flooded')).toHaveLength(201);
  });
});

it('kinds of notes are bounded each by itself', () => {
  const now = Date.now();
  for (let i = 0; i < 200; i++) expect(admitNote('one', now)).toBe('');
  expect(admitNote('one', now)).toBeNull();
  expect(admitNote('another', now)).toBe('');
  expect(admitNote('one', now + HOUR_MS)).toBe('1 more before it left out');
});
