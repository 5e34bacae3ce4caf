/** The verbs of refits on a real database and in real threads. */
import { afterAll, afterEach, describe, expect, it, vi } from 'vitest';
import { readDatabase, write } from '@/db/client';
import { claimDueJob } from '@/db/queries/jobs';
import { computationLeases } from '@/db/tables/computation-limits';
import { jobs } from '@/db/tables/jobs';
import { refits } from '@/db/tables/refits';
import { VISITOR } from '@/lib/auth/actor';
import { JOB_HANDLERS } from '@/lib/jobs/handlers';
import { stopJobsUnderWay } from '@/lib/jobs/jobs-under-way';
import { runJobs } from '@/lib/jobs/run-jobs';
import { cancelRefit } from '@/lib/refits/cancel-refit';
import { forgetExpiredRefits } from '@/lib/refits/forget-refits';
import { loadRefit } from '@/lib/refits/load-refit';
import { closeRefitPool, refitInPool } from '@/lib/refits/refit-pool';
import { type RefitOutcome, startRefit } from '@/lib/refits/start-refit';
import { refitAnswerSchema } from '@/schemas/refit';
import { bytesOf, quickRefit, slowRefit } from '@/tests/support/refit-calls';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();
afterAll(closeRefitPool);

const ALIVE = new AbortController().signal;
let callers = 0;
/** Each test calls from an address of its own. */
afterEach(() => {
  callers++;
});

/** Waits long enough for a quick refit on a machine that is busy; the calls of the API wait for a second. */
const PATIENT_MS = 40_000;

const call = (body: unknown, waitMs = PATIENT_MS, signal = ALIVE): Promise<RefitOutcome> =>
  startRefit({
    actor: VISITOR,
    peer: `192.0.2.${callers}`,
    readBody: async () => ({ ok: true, bytes: bytesOf(body) }),
    signal,
    waitMs,
  });

async function begun(): Promise<string> {
  const outcome = await call(slowRefit(), 50);
  if (outcome.kind !== 'running') throw new Error(`was ${outcome.kind}`);
  return outcome.id;
}

const load = (id: string) => loadRefit({ actor: VISITOR, id });
const leases = async () => (await readDatabase()).select().from(computationLeases);
const decoded = (body: Uint8Array) => JSON.parse(new TextDecoder().decode(body));

async function answered(id: string): Promise<unknown> {
  return vi.waitFor(
    async () => {
      const loaded = await load(id);
      if (!loaded.ok || loaded.refit.kind !== 'answered') throw new Error('not yet');
      expect(loaded.refit.status).toBe(200);
      return decoded(loaded.refit.body);
    },
    { timeout: 60_000, interval: 100 },
  );
}

// Threads start and hundreds of iterations are computed, on a machine that may be busy.
describe('a refit', { timeout: 90_000 }, () => {
  it('that is quick is answered at once and leaves nothing behind', async () => {
    const outcome = await call(quickRefit());
    if (outcome.kind !== 'answered') throw new Error(outcome.kind);
    expect(outcome.status).toBe(200);
    refitAnswerSchema.parse(decoded(outcome.body));
    const database = await readDatabase();
    expect([
      await database.select().from(refits),
      await database.select().from(jobs),
      await leases(),
    ]).toEqual([[], [], []]);
    expect(outcome.quota?.limits).toMatchObject({ callsPerMinute: 30, atOnce: 1 });
  });

  it('that takes longer is answered under an address of its own', async () => {
    const id = await begun();
    expect(id).toMatch(/^[\w-]{22}$/);
    expect(await load(id)).toMatchObject({ ok: true, refit: { kind: 'running' } });
    // One at a time: its place is taken until its answer stands.
    expect(await call(quickRefit())).toMatchObject({ kind: 'failed', failure: { code: 'too-many-at-once' } });
    const seen: number[] = [];
    await vi.waitFor(
      async () => {
        const loaded = await load(id);
        if (loaded.ok && loaded.refit.kind === 'running') seen.push(loaded.refit.progress);
        expect(loaded).toMatchObject({ refit: { kind: 'answered' } });
      },
      { timeout: 60_000, interval: 100 },
    );
    expect(seen).toEqual([...seen].sort((a, b) => a - b));
    refitAnswerSchema.parse(await answered(id));
    const database = await readDatabase();
    expect(await database.select().from(jobs)).toEqual([]);
    expect(await database.select({ body: refits.body }).from(refits)).toEqual([{ body: null }]);
    expect(await call(quickRefit())).toMatchObject({ kind: 'answered', status: 200 });
  });

  it('is gone after an hour, and from the database by the next round of chores', async () => {
    const database = await readDatabase();
    const [row] = await database.select().from(refits);
    await forgetExpiredRefits();
    expect(await database.select().from(refits)).toHaveLength(1);
    vi.useFakeTimers({ now: row.expiresAt, toFake: ['Date'] });
    try {
      expect(await load(row.id)).toMatchObject({ ok: false, failure: { code: 'not-found' } });
      await forgetExpiredRefits();
      expect(await database.select().from(refits)).toEqual([]);
    } finally {
      vi.useRealTimers();
    }
  });

  it('that is cancelled stops, gives its place back, and is forgotten', async () => {
    const id = await begun();
    expect(await cancelRefit({ actor: VISITOR, id })).toMatchObject({ ok: true });
    expect(await load(id)).toMatchObject({ ok: false, failure: { code: 'not-found' } });
    expect(await cancelRefit({ actor: VISITOR, id })).toMatchObject({ failure: { code: 'not-found' } });
    expect(await leases()).toEqual([]);
    // The thread is free again well before the refit could have ended.
    expect(await call(quickRefit())).toMatchObject({ status: 200 });
  });

  it('that this process does not end is begun anew by another, to the same answer', async () => {
    const id = await begun();
    await stopJobsUnderWay();
    expect(await load(id)).toMatchObject({ ok: true, refit: { kind: 'running' } });
    const runner = runJobs(JOB_HANDLERS);
    const taken = (await answered(id)) as { estimates: unknown[] };
    await runner.stop();
    expect(await leases()).toEqual([]);
    const direct = await refitInPool(bytesOf(slowRefit()), () => undefined, ALIVE);
    if (direct.kind !== 'answered') throw new Error(direct.kind);
    expect(taken).toEqual(decoded(direct.body));
  });

  it('keeps its place as long as it gives signs of life', async () => {
    const id = await begun();
    const [before] = await leases();
    vi.useFakeTimers({ now: Date.now() + 100_000, toFake: ['Date'] });
    try {
      await JOB_HANDLERS.refit.onBeat?.({ refitId: id });
    } finally {
      vi.useRealTimers();
    }
    const [after] = await leases();
    expect(after.id).toBe(before.id);
    expect(after.expiresAt).toBeGreaterThanOrEqual(before.expiresAt + 90_000);
    await cancelRefit({ actor: VISITOR, id });
  });

  it('that ends the process each time is given up with a problem', async () => {
    const id = await begun();
    await stopJobsUnderWay();
    await write('acknowledged', async (tx) => {
      await tx.update(jobs).set({ attempts: JOB_HANDLERS.refit.mostAttempts });
    });
    const runner = runJobs(JOB_HANDLERS);
    await vi.waitFor(
      async () => expect(await load(id)).toMatchObject({ refit: { kind: 'answered', status: 500 } }),
      { timeout: 20_000 },
    );
    await runner.stop();
    // Its caller may ask for another.
    expect(await leases()).toEqual([]);
    expect(await claimDueJob(['refit'], 'x', Date.now() + 1e9, Date.now() + 2e9)).toBeNull();
  });

  it('stops where its caller goes away while waiting', async () => {
    const caller = new AbortController();
    setTimeout(() => caller.abort(), 100);
    expect(await call(slowRefit(), PATIENT_MS, caller.signal)).toMatchObject({
      kind: 'failed',
      failure: { code: 'incomplete-body' },
    });
    expect(await call(quickRefit())).toMatchObject({ status: 200 });
  });

  it('is stopped after its time, which begins when it does', async () => {
    expect(await refitInPool(bytesOf(slowRefit()), () => undefined, ALIVE, 100)).toEqual({
      kind: 'took-too-long',
    });
  });

  it('is let in thirty times a minute', async () => {
    for (let i = 0; i < 30; i++) expect(await call('[]')).toMatchObject({ status: 422 });
    const refused = await call('[]');
    expect(refused).toMatchObject({ kind: 'failed', failure: { code: 'too-many-calls' } });
    expect(refused.retryAfterSeconds).toBeGreaterThan(0);
  });
});
