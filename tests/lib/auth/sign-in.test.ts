import { createHash } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { readDatabase, write } from '@/db/client';
import { selectAuditOf } from '@/db/queries/audit';
import { memberships } from '@/db/tables/laboratories';
import { people, sessions, signInAttempts, signInPlaces } from '@/db/tables/people';
import type { Actor } from '@/lib/auth/actor';
import { actorOfRequest } from '@/lib/auth/current-actor';
import { forgetEndedSessions } from '@/lib/auth/session';
import { signIn } from '@/lib/auth/sign-in';
import { signOut } from '@/lib/auth/sign-out';
import { ensureLaboratory, ensureMembership, ensurePerson } from '@/lib/people/ensure-demo-accounts';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();

const EMAIL = 'dana@demo.example';
const PASSWORD = 'eight or more';
const DAY_MS = 86_400_000;

let personId = '';
let labId = '';
beforeAll(async () => {
  personId = await ensurePerson({ email: EMAIL, name: 'D. Example', password: PASSWORD, role: 'curator' });
  labId = await ensureLaboratory({ slug: 'ambervale', name: 'Ambervale', institution: 'Invented Institute' });
  await ensureMembership(personId, labId, 'member');
});
afterEach(() => {
  vi.useRealTimers();
});

function attempt(email: unknown, password: unknown, peer = '192.0.2.1', heldSessionId: string | null = null) {
  return signIn({ input: { email, password }, peer, heldSessionId });
}

async function sessionId(held: string | null = null): Promise<string> {
  const outcome = await attempt(EMAIL, PASSWORD, '192.0.2.1', held);
  if (!outcome.ok) throw new Error(`not signed in: ${outcome.failure.code}`);
  return outcome.cookie.value;
}

function actorWith(id: string): Promise<Actor> {
  const headers = { cookie: `theme=dark; curvekeep-session=${id}` };
  return actorOfRequest(new Request('http://localhost/', { headers }));
}

/** Days later; the clock alone, since the database's timers must go on. */
function inDays(days: number): void {
  vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + days * DAY_MS });
}

describe('signing in', () => {
  it('gives a cookie that no script reads, and with it the person as the database has them', async () => {
    const outcome = await attempt(' Dana@Demo.Example ', PASSWORD);
    expect(outcome.ok && outcome.cookie).toMatchObject({
      name: 'curvekeep-session',
      attributes: { path: '/', httpOnly: true, sameSite: 'lax', secure: false, maxAge: 30 * 86_400 },
    });
    expect(await actorWith(outcome.ok ? outcome.cookie.value : '')).toEqual({
      kind: 'person',
      id: personId,
      name: 'D. Example',
      email: EMAIL,
      role: 'curator',
      memberships: [{ labId, labSlug: 'ambervale', labName: 'Ambervale', role: 'member' }],
    });
  });

  it('keeps of the session id, which has 128 random bits or more, its hash alone', async () => {
    const id = await sessionId();
    expect(id).toMatch(/^[a-z2-7]{40}$/); // 40 letters of five bits
    const database = await readDatabase();
    const rows = await database.select().from(sessions);
    expect(rows.map(({ idHash }) => idHash)).toContain(createHash('sha256').update(id).digest('hex'));
    expect(JSON.stringify(rows)).not.toContain(id);
  });

  it('makes a new session and ends the one that the browser held', async () => {
    const first = await sessionId();
    const second = await sessionId(first);
    expect(second).not.toBe(first);
    expect((await actorWith(first)).kind).toBe('visitor');
    expect((await actorWith(second)).kind).toBe('person');
  });

  it('answers alike for an unknown address, a wrong password and a disabled account', async () => {
    const gone = {
      email: 'gone@demo.example',
      name: 'G. Example',
      password: PASSWORD,
      role: 'depositor',
    } as const;
    const goneId = await ensurePerson(gone);
    await write('acknowledged', async (tx) => {
      await tx.update(people).set({ disabledAt: Date.now() }).where(eq(people.id, goneId));
    });
    const answers = [
      await attempt('nobody@demo.example', PASSWORD),
      await attempt(EMAIL, 'not the password'),
      await attempt(EMAIL, ` ${PASSWORD}`),
      await attempt(gone.email, PASSWORD),
    ];
    const [first] = answers;
    expect(first).toMatchObject({ ok: false, failure: { code: 'unauthenticated' } });
    for (const answer of answers) expect(answer).toEqual(first);
  });

  it.each([
    ['', PASSWORD, '/email'],
    ['no address', PASSWORD, '/email'],
    [EMAIL, '', '/password'],
    [EMAIL, 'x'.repeat(129), '/password'],
    [undefined, PASSWORD, '/email'],
  ])('says at the field what would be right: %j', async (email, password, pointer) => {
    const outcome = await attempt(email, password);
    expect(outcome).toMatchObject({ ok: false, failure: { code: 'invalid-input' } });
    expect(outcome.ok ? [] : outcome.failure.members?.errors?.map((error) => error.pointer)).toEqual([
      pointer,
    ]);
  });

  it('is in the audit trail, as are failures and signing out; what was typed is not', async () => {
    const id = await sessionId();
    await attempt(EMAIL, 'not the password');
    await signOut(await actorWith(id), id);
    const entries = await selectAuditOf(`person:${personId}`);
    expect(entries.slice(0, 3).map(({ actor, action }) => [actor, action])).toEqual([
      [`person:${personId}`, 'signed-out'],
      ['visitor', 'sign-in-failed'],
      [`person:${personId}`, 'signed-in'],
    ]);
    expect(JSON.stringify(entries)).not.toMatch(/not the password|192\.0\.2/);
  });
});

describe('failed sign-ins', () => {
  const target = 'target@demo.example';

  it('of twenty at once from one address, five are looked at; from elsewhere the owner gets in', async () => {
    await ensurePerson({ email: target, name: 'T. Example', password: PASSWORD, role: 'depositor' });
    const from = '198.51.100.7';
    const tries = await Promise.all(Array.from({ length: 20 }, () => attempt(target, 'a wrong guess', from)));
    const codes = tries.map((outcome) => (outcome.ok ? 'in' : outcome.failure.code));
    expect(codes.filter((code) => code === 'unauthenticated')).toHaveLength(5);
    const refused = tries.find((outcome) => !outcome.ok && outcome.failure.code === 'too-many-calls');
    expect(refused).toMatchObject({ retryAfterSeconds: 1 });
    // The right password has to wait as well: otherwise the wait would tell which guess was right.
    expect(await attempt(target, PASSWORD, from)).toMatchObject({
      ok: false,
      failure: { code: 'too-many-calls' },
    });
    expect((await attempt(target, PASSWORD, '203.0.113.9')).ok).toBe(true);
  });

  it('are forgotten where the owner then signs in, and keep no address as it is', async () => {
    const from = '198.51.100.8';
    for (let i = 0; i < 4; i++) await attempt(target, 'a wrong guess', from);
    expect((await attempt(target, PASSWORD, from)).ok).toBe(true);
    for (let i = 0; i < 4; i++)
      expect(await attempt(target, 'a wrong guess', from)).toMatchObject({
        failure: { code: 'unauthenticated' },
      });
    const rows = await (await readDatabase()).select().from(signInAttempts);
    expect(rows.length).toBeGreaterThan(4);
    expect(JSON.stringify(rows)).not.toMatch(/198\.51|demo\.example/);
  });
});

describe('a laboratory behind one address', () => {
  it('goes on signing in where it did before, whatever somebody there tries', async () => {
    const from = '198.51.100.99';
    const email = 'colleague@test.example';
    await ensurePerson({ email, name: 'C. Example', password: PASSWORD, role: 'depositor' });
    const entered = await attempt(email, PASSWORD, from);
    expect(entered.ok).toBe(true);
    for (let i = 0; i < 32; i++) await attempt(`guess-${i}@test.example`, 'a wrong guess', from);
    expect(await attempt('fresh@test.example', PASSWORD, from)).toMatchObject({
      failure: { code: 'too-many-calls' },
    });
    expect((await attempt(email, PASSWORD, from)).ok).toBe(true);
    const limited = await selectAuditOf('limit:sign-in');
    expect(limited.map(({ action }) => action)).toContain('limited');
    const places = await (await readDatabase()).select().from(signInPlaces);
    expect(JSON.stringify(places)).not.toMatch(/198\.51|test\.example|colleague/);
  });
});

describe('a session', () => {
  it('is written once when half of its time is over, not at every request; also near its end', async () => {
    const id = await sessionId();
    const idHash = createHash('sha256').update(id).digest('hex');
    const end = async () => {
      const rows = await (await readDatabase()).select().from(sessions).where(eq(sessions.idHash, idHash));
      return rows[0]?.expiresAt ?? 0;
    };
    for (const days of [8, 8, 8, 3]) {
      inDays(days);
      await actorWith(id);
      const moved = await end();
      vi.setSystemTime(Date.now() + 60_000);
      expect((await actorWith(id)).kind).toBe('person');
      expect(await end()).toBe(moved);
    }
  });

  it('that is over is forgotten by a chore, used or not', async () => {
    const [id, used] = [await sessionId(), await sessionId()];
    const there = async () =>
      (await (await readDatabase()).select().from(sessions)).map(({ idHash }) => idHash);
    const hashes = [id, used].map((one) => createHash('sha256').update(one).digest('hex'));
    inDays(10);
    await actorWith(used);
    inDays(10);
    await forgetEndedSessions();
    expect(await there()).not.toContain(hashes[0]);
    expect(await there()).toContain(hashes[1]);
    await actorWith(used);
    inDays(10.1);
    await forgetEndedSessions();
    expect(await there()).not.toContain(hashes[1]);
  });

  it('is dead after signing out, in the database and in the browser', async () => {
    const id = await sessionId();
    const cookie = await signOut(await actorWith(id), id);
    expect(cookie).toMatchObject({ value: '', attributes: { maxAge: 0 } });
    expect((await actorWith(id)).kind).toBe('visitor');
  });

  it('ends after fourteen days without use', async () => {
    const id = await sessionId();
    inDays(13.9);
    expect((await actorWith(id)).kind).toBe('person');
    const unused = await sessionId();
    inDays(14.1);
    expect((await actorWith(unused)).kind).toBe('visitor');
    const database = await readDatabase();
    const idHash = createHash('sha256').update(unused).digest('hex');
    expect(await database.select().from(sessions).where(eq(sessions.idHash, idHash))).toEqual([]);
  });

  it('ends thirty days after sign-in, however much it is used', async () => {
    const id = await sessionId();
    for (let day = 5; day < 30; day += 5) {
      inDays(5);
      expect((await actorWith(id)).kind, `day ${day}`).toBe('person');
    }
    inDays(5.1);
    expect((await actorWith(id)).kind).toBe('visitor');
  });

  it('is none with an id that was never given, or a broken cookie', async () => {
    expect((await actorWith('a'.repeat(40))).kind).toBe('visitor');
    expect((await actorWith('%E0%A4%A')).kind).toBe('visitor');
    expect((await actorWith('')).kind).toBe('visitor');
  });

  it('carries no right that was taken away: from the next request on', async () => {
    const id = await sessionId();
    await write('acknowledged', async (tx) => {
      await tx.delete(memberships).where(eq(memberships.personId, personId));
      await tx.update(people).set({ role: 'depositor' }).where(eq(people.id, personId));
    });
    expect(await actorWith(id)).toMatchObject({ role: 'depositor', memberships: [] });
    await write('acknowledged', async (tx) => {
      await tx.update(people).set({ disabledAt: Date.now() }).where(eq(people.id, personId));
    });
    expect((await actorWith(id)).kind).toBe('visitor');
    await write('acknowledged', async (tx) => {
      await tx.update(people).set({ disabledAt: null }).where(eq(people.id, personId));
    });
    // Enabled again, the account has to sign in again.
    expect((await actorWith(id)).kind).toBe('visitor');
  });
});
