import { like } from 'drizzle-orm';
import { describe, expect, it, vi } from 'vitest';
import { readDatabase } from '@/db/client';
import { selectAuditOf } from '@/db/queries/audit';
import { auditTrail } from '@/db/tables/deposits';
import { noteLimited } from '@/lib/audit/audit-refusals';
import { admitNote } from '@/lib/audit/bounded-notes';
import { type Actor, VISITOR } from '@/lib/auth/actor';
import { listQueue } from '@/lib/curation/list-queue';
import { createDeposit } from '@/lib/deposits/create-deposit';
import { listDeposits } from '@/lib/deposits/list-deposits';
import { loadDeposit } from '@/lib/deposits/load-deposit';
import { createToken } from '@/lib/labs/create-token';
import { listOwnLabs } from '@/lib/labs/list-own-labs';
import { listTokens } from '@/lib/labs/list-tokens';
import { revokeToken } from '@/lib/labs/revoke-token';
import { auditOf, codeOf, makeDeposit, makeLab, makePerson, worked } from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';

const { cast } = collectionForTests();
const HOUR_MS = 3_600_000;
const linesOf = async (subject: string) =>
  (await selectAuditOf(subject)).map(({ actor, action, detail }) => `${actor} ${action}: ${detail}`);

async function refusedOf(subject: string) {
  const database = await readDatabase();
  return database
    .select()
    .from(auditTrail)
    .where(like(auditTrail.subject, `${subject}%`));
}

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
    const actors = [VISITOR, cast.administrator, cast.curator];
    const call = (actor: Actor, lab: string) =>
      createDeposit({ actor, lab, readBody: async () => ({ ok: true, bytes: new Uint8Array() }) });
    for (const [i, id] of ['x'.repeat(5_000), 'a b\n', '<script>'].entries()) await call(actors[i], id);
    expect((await linesOf('laboratory:?')).length).toBe(3);
  });

  it('of visitors is noted up to a number an hour; a flood leaves its size', async () => {
    vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + HOUR_MS });
    try {
      for (let i = 0; i < 230; i++) await loadDeposit({ actor: VISITOR, id: `flooded-${i}` });
      const flood = async () => (await refusedOf('deposit:flooded')).length;
      expect(await flood()).toBe(200);
      vi.setSystemTime(Date.now() + HOUR_MS);
      await loadDeposit({ actor: VISITOR, id: 'flooded-last' });
      expect((await auditOf('flooded-last')).at(-1)).toBe(
        'refused: read-deposit; 30 more before it left out',
      );
    } finally {
      vi.useRealTimers();
    }
    expect(await refusedOf('deposit:flooded')).toHaveLength(201);
  });

  it('of the same to the same is noted once a minute', async () => {
    const attempt = () => loadDeposit({ actor: cast.outsider, id: own });
    const own = await makeDeposit(cast);
    for (let i = 0; i < 20; i++) await attempt();
    await loadDeposit({ actor: cast.curator, id: own });
    expect(await auditOf(own)).toEqual(['created: draft', ...Array(2).fill('refused: read-deposit')]);
    vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 61_000 });
    try {
      await attempt();
    } finally {
      vi.useRealTimers();
    }
    expect((await auditOf(own)).slice(1)).toEqual(Array(3).fill('refused: read-deposit'));
  });

  it('to see tokens is noted, but not that a member who looks at their laboratory sees none', async () => {
    const lab = await makeLab('looked-at');
    const member = await makePerson('depositor', lab);
    const { labs } = worked(await listOwnLabs(member));
    expect(labs.map(({ tokens }) => tokens)).toEqual([null]);
    expect(await linesOf(`laboratory:${lab.labId}`)).toEqual([]);
    expect(codeOf(await listTokens(member, lab.labId))).toBe('forbidden');
    expect(await linesOf(`laboratory:${lab.labId}`)).toEqual([`person:${member.id} refused: manage-tokens`]);
  });
});

it('that somebody has to wait is on the audit trail', async () => {
  await noteLimited(cast.depositor, 'read-deposit');
  await noteLimited(cast.depositor, 'read-deposit');
  await noteLimited(VISITOR, 'sign-in');
  expect(await linesOf('limit:read-deposit')).toEqual([`person:${cast.depositor.id} limited: read-deposit`]);
  expect(await linesOf('limit:sign-in')).toEqual(['visitor limited: sign-in']);
});

it('kinds of notes are bounded each by itself', () => {
  const now = Date.now();
  for (let i = 0; i < 200; i++) expect(admitNote('one', now)).toBe('');
  expect(admitNote('one', now)).toBeNull();
  expect(admitNote('another', now)).toBe('');
  expect(admitNote('one', now + HOUR_MS)).toBe('1 more before it left out');
});
