import { createHash } from 'node:crypto';
import { afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { readDatabase } from '@/db/client';
import { selectAuditOf } from '@/db/queries/audit';
import { labTokens } from '@/db/tables/laboratories';
import { type Actor, type Person, VISITOR } from '@/lib/auth/actor';
import { actorOfRequest } from '@/lib/auth/current-actor';
import { createToken } from '@/lib/labs/create-token';
import { listOwnLabs } from '@/lib/labs/list-own-labs';
import { listTokens } from '@/lib/labs/list-tokens';
import { revokeToken } from '@/lib/labs/revoke-token';
import { ensureLaboratory, ensureMembership, ensurePerson } from '@/lib/people/ensure-demo-accounts';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();

const DAY_MS = 86_400_000;
const INPUT = { name: 'plate reader', scopes: ['write-drafts', 'submit'], days: '30' };

let lab = '';
let otherLab = '';
let manager: Person;
let member: Person;
let otherManager: Person;
let curator: Person;
let administrator: Person;

beforeAll(async () => {
  lab = await ensureLaboratory({ slug: 'ambervale', name: 'Ambervale', institution: 'Invented Institute' });
  otherLab = await ensureLaboratory({ slug: 'tarn', name: 'Tarn', institution: 'Invented Institute' });
  manager = await personIn('manager', 'depositor', lab, 'manager');
  member = await personIn('member', 'depositor', lab, 'member');
  otherManager = await personIn('other', 'depositor', otherLab, 'manager');
  curator = await personIn('curator', 'curator');
  administrator = await personIn('administrator', 'administrator');
});
afterEach(() => {
  vi.useRealTimers();
});

async function personIn(
  name: string,
  role: Person['role'],
  labId?: string,
  labRole: 'member' | 'manager' = 'member',
): Promise<Person> {
  const email = `${name}@test.example`;
  const id = await ensurePerson({ email, name, role, password: 'eight or more' });
  if (labId === undefined) return { kind: 'person', id, name, email, role, memberships: [] };
  await ensureMembership(id, labId, labRole);
  const memberships = [{ labId, labSlug: labId, labName: labId, role: labRole }];
  return { kind: 'person', id, name, email, role, memberships };
}

async function made(actor: Actor = manager, input: unknown = INPUT) {
  const outcome = await createToken(actor, lab, input);
  if (!outcome.ok) throw new Error(outcome.failure.code);
  return outcome;
}

function actorWith(authorization: string, cookie = ''): Promise<Actor> {
  return actorOfRequest(new Request('http://localhost/', { headers: { authorization, cookie } }));
}

async function codeOf(outcome: Promise<{ ok: true } | { ok: false; failure: { code: string } }>) {
  const settled = await outcome;
  return settled.ok ? 'ok' : settled.failure.code;
}

describe('making a token', () => {
  it('works: 256 random bits that let a script in, of which only the hash is kept', async () => {
    const { id, token } = await made();
    expect(token).toMatch(/^ckt_[A-Za-z0-9_-]{43}$/);
    expect(await actorWith(`Bearer ${token}`)).toEqual({
      kind: 'token',
      id,
      labId: lab,
      scopes: ['write-drafts', 'submit'],
    });
    const rows = await (await readDatabase()).select().from(labTokens);
    expect(rows.map(({ tokenHash }) => tokenHash)).toContain(
      createHash('sha256').update(token).digest('hex'),
    );
    expect(JSON.stringify(rows)).not.toContain(token.slice(4));
    expect(await selectAuditOf(`token:${id}`)).toMatchObject([
      { actor: `person:${manager.id}`, action: 'token-created' },
    ]);
  });

  it('works for an administrator', async () => {
    expect(await codeOf(createToken(administrator, lab, INPUT))).toBe('ok');
  });

  it('is refused to wrong roles', async () => {
    const token: Actor = {
      kind: 'token',
      id: 't',
      labId: lab,
      scopes: ['read-drafts', 'write-drafts', 'submit'],
    };
    for (const actor of [member, curator, token])
      expect(await codeOf(createToken(actor, lab, INPUT))).toBe('forbidden');
    expect(await codeOf(createToken(VISITOR, lab, INPUT))).toBe('unauthenticated');
  });

  it('is refused to the manager of another laboratory', async () => {
    expect(await codeOf(createToken(otherManager, lab, INPUT))).toBe('forbidden');
    expect(await codeOf(createToken(administrator, 'no-such-lab', INPUT))).toBe('not-found');
  });

  it.each([
    ['/name', { ...INPUT, name: '  ' }],
    ['/name', { ...INPUT, name: 'x'.repeat(81) }],
    ['/scopes', { ...INPUT, scopes: [] }],
    ['/scopes/1', { ...INPUT, scopes: ['submit', 'decide-deposit'] }],
    ['/days', { ...INPUT, days: '366' }],
    ['/days', { ...INPUT, days: '0' }],
    ['/days', { ...INPUT, days: '1.5' }],
    ['/days', { ...INPUT, days: 'soon' }],
  ])('says what would be right at %s', async (pointer, input) => {
    const outcome = await createToken(manager, lab, input);
    expect(outcome).toMatchObject({ ok: false, failure: { code: 'invalid-input' } });
    expect(outcome.ok ? [] : outcome.failure.members?.errors?.map((error) => error.pointer)).toEqual([
      pointer,
    ]);
  });
});

describe('a token', () => {
  it('ends by itself', async () => {
    const { token, expiresAt } = await made();
    expect(Math.abs(expiresAt - (Date.now() + 30 * DAY_MS))).toBeLessThan(60_000);
    vi.useFakeTimers({ toFake: ['Date'], now: expiresAt - 1000 });
    expect((await actorWith(`Bearer ${token}`)).kind).toBe('token');
    vi.setSystemTime(expiresAt);
    expect((await actorWith(`Bearer ${token}`)).kind).toBe('visitor');
  });

  it.each(['Bearer ckt_nothing', 'Bearer', 'Basic abc', '', 'ckt_bare'])(
    'lets nobody in as %j',
    async (authorization) => {
      expect((await actorWith(authorization)).kind).toBe('visitor');
    },
  );

  it('shows when it was last used', async () => {
    const { id, token } = await made();
    const lastUse = async () => {
      const listed = await listTokens(manager, lab);
      return listed.ok ? listed.tokens.find((one) => one.id === id)?.lastUsedAt : undefined;
    };
    expect(await lastUse()).toBeNull();
    await actorWith(`Bearer ${token}`);
    expect(Math.abs(Number(await lastUse()) - Date.now())).toBeLessThan(60_000);
  });
});

describe('revoking a token', () => {
  it('works: from the next call on it lets nobody in', async () => {
    const { id, token } = await made();
    expect(await codeOf(revokeToken(manager, lab, id))).toBe('ok');
    expect((await actorWith(`Bearer ${token}`)).kind).toBe('visitor');
    expect((await selectAuditOf(`token:${id}`)).map(({ action }) => action)).toEqual([
      'token-revoked',
      'token-created',
    ]);
  });

  it('is refused to wrong roles', async () => {
    const { id, token } = await made();
    for (const actor of [member, curator, await actorWith(`Bearer ${token}`)])
      expect(await codeOf(revokeToken(actor, lab, id))).toBe('forbidden');
    expect(await codeOf(revokeToken(VISITOR, lab, id))).toBe('unauthenticated');
    expect((await actorWith(`Bearer ${token}`)).kind).toBe('token');
  });

  it('is refused to another laboratory, under its own address and under that of the token', async () => {
    const { id, token } = await made();
    expect(await codeOf(revokeToken(otherManager, lab, id))).toBe('forbidden');
    expect(await codeOf(revokeToken(otherManager, otherLab, id))).toBe('not-found');
    expect((await actorWith(`Bearer ${token}`)).kind).toBe('token');
  });

  it('is done once: of ten at a time one succeeds', async () => {
    const { id } = await made();
    const codes = await Promise.all(Array.from({ length: 10 }, () => codeOf(revokeToken(manager, lab, id))));
    expect(codes.filter((code) => code === 'ok')).toHaveLength(1);
    expect(codes.filter((code) => code === 'conflict')).toHaveLength(9);
  });
});

describe('what is listed', () => {
  it('tokens: to managers and administrators, with their state and never with the token', async () => {
    const { id } = await made(manager, { ...INPUT, name: 'short-lived', days: 1 });
    const revoked = await made(manager, { ...INPUT, name: 'taken away' });
    await revokeToken(manager, lab, revoked.id);
    const listed = await listTokens(administrator, lab, Date.now() + 2 * DAY_MS);
    const states = Object.fromEntries(listed.ok ? listed.tokens.map((one) => [one.id, one.state]) : []);
    expect(states).toMatchObject({ [id]: 'expired', [revoked.id]: 'revoked' });
    expect(JSON.stringify(listed)).not.toMatch(/ckt_|[0-9a-f]{64}/);
    expect(listed.ok && listed.tokens.find((one) => one.id === id)).toMatchObject({ createdBy: 'manager' });
    for (const actor of [member, curator, otherManager])
      expect(await codeOf(listTokens(actor, lab))).toBe('forbidden');
  });

  it('laboratories: the own ones with their members, tokens for managers only; all for an administrator', async () => {
    const slugsOf = async (actor: Actor) => {
      const listed = await listOwnLabs(actor);
      return listed.ok
        ? listed.labs.map(({ slug, tokens }) => `${slug} ${tokens ? 'tokens' : ''}`)
        : listed.failure.code;
    };
    expect(await slugsOf(member)).toEqual(['ambervale ']);
    expect(await slugsOf(otherManager)).toEqual(['tarn tokens']);
    expect(await slugsOf(administrator)).toEqual(['ambervale tokens', 'tarn tokens']);
    expect(await slugsOf(curator)).toBe('forbidden');
    expect(await slugsOf(VISITOR)).toBe('unauthenticated');
    const listed = await listOwnLabs(member);
    expect(listed.ok && listed.labs[0]?.members.map(({ name, role }) => [name, role])).toEqual([
      ['manager', 'manager'],
      ['member', 'member'],
    ]);
  });
});
