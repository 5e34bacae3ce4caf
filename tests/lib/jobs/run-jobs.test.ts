/** Jobs on a real database: begun once, retried with growing pauses, given up, taken over, handed back. */
import { eq } from 'drizzle-orm';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { readDatabase, write } from '@/db/client';
import { claimDueJob, deleteJob, extendLease, hasDueJob } from '@/db/queries/jobs';
import { jobs } from '@/db/tables/jobs';
import { carryOut } from '@/lib/jobs/carry-out';
import { enqueueJob, enqueueStartedJob } from '@/lib/jobs/enqueue-job';
import { forgetGivenUpJobs } from '@/lib/jobs/forget-given-up';
import { type JobHandler, NoRoom } from '@/lib/jobs/job-kinds';
import { stopJobsUnderWay, stopRemovedJob } from '@/lib/jobs/jobs-under-way';
import { GIVEN_UP_KEPT_MS, HEARTBEAT_MS, LEASE_MS, NO_ROOM_PAUSE_MS, pauseAfter } from '@/lib/jobs/lease';
import { runJobs } from '@/lib/jobs/run-jobs';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();
afterEach(async () => {
  await write('acknowledged', async (tx) => {
    await tx.delete(jobs);
  });
});

const KINDS = ['refit'];
const rows = async () => (await readDatabase()).select().from(jobs);
const enqueue = (refitId: string, runAt?: number) =>
  write('acknowledged', (tx) => enqueueJob(tx, 'refit', { refitId }, runAt));
const claim = (nowMs = Date.now(), token = 'token') => claimDueJob(KINDS, token, nowMs, nowMs + LEASE_MS);
const never: JobHandler['run'] = (_, signal) =>
  new Promise((_, reject) => {
    signal.addEventListener('abort', () => reject(new Error(String(signal.reason))));
  });

/** Claims the job that is due and carries it out. */
async function attempt(handler: JobHandler, nowMs?: number): Promise<void> {
  const job = await claim(nowMs);
  if (job === null) throw new Error('no job is due');
  await carryOut(job, handler);
}

describe('a job', () => {
  it('exists exactly where what it follows was written', async () => {
    const failing = write('acknowledged', async (tx) => {
      await enqueueJob(tx, 'refit', { refitId: 'a' });
      throw new Error('what it follows failed');
    });
    await expect(failing).rejects.toThrow('what it follows failed');
    expect(await hasDueJob(KINDS, Date.now())).toBe(false);
    await enqueue('b');
    expect(await hasDueJob(KINDS, Date.now())).toBe(true);
  });

  it('is begun when its time has come, the one that has waited longest first', async () => {
    const now = Date.now();
    const [late, early] = [await enqueue('late', now + 50_000), await enqueue('early', now - 10)];
    expect((await claim(now))?.id).toBe(early);
    expect(await claim(now)).toBeNull();
    await write('acknowledged', (tx) => deleteJob(tx, early));
    expect((await claim(now + 50_000))?.id).toBe(late);
  });

  it('is begun by one of many that ask at once', async () => {
    await enqueue('a');
    const claims = await Promise.all(Array.from({ length: 8 }, (_, i) => claim(Date.now(), `token ${i}`)));
    expect(claims.filter((job) => job !== null)).toHaveLength(1);
  });

  it('ends together with what it writes', async () => {
    await enqueue('a');
    let next = '';
    await attempt({
      mostAttempts: 3,
      run: async ({ refitId }) => {
        expect(refitId).toBe('a');
        return async (tx) => {
          next = await enqueueJob(tx, 'refit', { refitId: 'b' });
        };
      },
    });
    expect((await rows()).map(({ id }) => id)).toEqual([next]);
  });

  it('stays where what it writes fails, and is tried again after a pause', async () => {
    const id = await enqueue('a');
    const before = Date.now();
    const failingEnd: JobHandler = {
      mostAttempts: 3,
      run: async () => async (tx) => {
        await enqueueJob(tx, 'refit', { refitId: 'half' });
        throw new Error('the disk is full');
      },
    };
    await attempt(failingEnd);
    const [row, ...others] = await rows();
    expect(others).toEqual([]);
    expect(row).toMatchObject({ id, attempts: 1, leaseToken: null, givenUpAt: null });
    expect(row.lastError).toContain('the disk is full');
    expect(row.runAt).toBeGreaterThanOrEqual(before + pauseAfter(1));
    expect(await claim()).toBeNull();
  });

  it('is given up after its last attempt, its error kept', async () => {
    await enqueue('a');
    const gaveUp = vi.fn();
    const handler: JobHandler = {
      mostAttempts: 2,
      run: async () => {
        throw new Error('nobody answers');
      },
      giveUp: (payload) => async () => gaveUp(payload),
    };
    await attempt(handler);
    expect(gaveUp).not.toHaveBeenCalled();
    const later = Date.now() + pauseAfter(1) + 1;
    await attempt(handler, later);
    expect(gaveUp).toHaveBeenCalledExactlyOnceWith({ refitId: 'a' });
    const [row] = await rows();
    expect(row.givenUpAt).not.toBeNull();
    expect(row.lastError).toContain('nobody answers');
    expect(await claim(later + 24 * 3600_000)).toBeNull();
  });

  it('is given up where it ends the process that is at work on it, each time', async () => {
    await enqueue('a');
    let now = Date.now();
    for (let i = 0; i < 2; i++) {
      expect(await claim(now, `dead ${i}`)).not.toBeNull();
      now += LEASE_MS + 1;
    }
    const run = vi.fn();
    await attempt({ mostAttempts: 2, run }, now);
    expect(run).not.toHaveBeenCalled();
    expect((await rows())[0]).toMatchObject({ lastError: expect.stringContaining('process') });
    expect((await rows())[0].givenUpAt).not.toBeNull();
  });

  it('is taken over when its lease has run out, and the first that had it writes nothing', async () => {
    await enqueue('a');
    const now = Date.now();
    const first = await claim(now, 'first');
    expect(await claim(now + LEASE_MS - 1, 'second')).toBeNull();
    const second = await claim(now + LEASE_MS, 'second');
    expect(second).toMatchObject({ id: first?.id, attempts: 2 });
    if (!first || !second) throw new Error('not claimed');
    const wrote: string[] = [];
    const handler = (name: string): JobHandler => ({
      mostAttempts: 3,
      run: async () => async () => void wrote.push(name),
    });
    await carryOut(first, handler('first'));
    await carryOut(second, handler('second'));
    expect(wrote).toEqual(['second']);
    expect(await extendLease(first, now)).toBe(false);
  });

  it('that is removed stops whoever is at work on it', { timeout: 3 * HEARTBEAT_MS }, async () => {
    await enqueue('a');
    const job = await claim();
    if (job === null) throw new Error('not claimed');
    const working = carryOut(job, { mostAttempts: 3, run: never });
    await write('acknowledged', (tx) => deleteJob(tx, job.id));
    await working;
    expect(await rows()).toEqual([]);
  });

  it('that is removed by the process that is at work on it stops at once', async () => {
    await enqueue('a');
    const job = await claim();
    if (job === null) throw new Error('not claimed');
    const working = carryOut(job, { mostAttempts: 3, run: never });
    stopRemovedJob('another');
    stopRemovedJob(job.id);
    await working;
    // Nothing is noted on a job that is no longer this process's.
    expect((await rows())[0]).toMatchObject({ attempts: 1, lastError: null, leaseToken: 'token' });
  });

  it('is handed back at once where the process ends, and the attempt does not count', async () => {
    await enqueue('a');
    const job = await claim();
    if (job === null) throw new Error('not claimed');
    const working = carryOut(job, { mostAttempts: 3, run: never });
    await stopJobsUnderWay();
    await working;
    expect((await rows())[0]).toMatchObject({ attempts: 0, leaseToken: null, lastError: null });
    expect(await claim()).not.toBeNull();
  });

  it('that finds no room is tried again soon, and the attempt does not count', async () => {
    await enqueue('a');
    const full: JobHandler = {
      mostAttempts: 1,
      run: async () => {
        throw new NoRoom('the queue is full');
      },
    };
    await attempt(full);
    expect((await rows())[0]).toMatchObject({ attempts: 0, leaseToken: null, givenUpAt: null });
    expect(await claim()).toBeNull();
    expect(await claim(Date.now() + NO_ROOM_PAUSE_MS)).not.toBeNull();
  });

  it('of a kind that a process does not know is left to others', async () => {
    await write('acknowledged', (tx) => enqueueJob(tx, 'letter' as 'refit', { refitId: 'a' }));
    expect(await claim()).toBeNull();
    expect(await claimDueJob(['letter'], 'token', Date.now(), Date.now() + LEASE_MS)).not.toBeNull();
  });

  it('that was given up is removed after a month', async () => {
    await enqueue('young');
    const old = await enqueue('old');
    const aMonthAgo = Date.now() - GIVEN_UP_KEPT_MS;
    await write('acknowledged', async (tx) => {
      await tx.update(jobs).set({ givenUpAt: aMonthAgo + 60_000 });
      await tx
        .update(jobs)
        .set({ givenUpAt: aMonthAgo - 1 })
        .where(eq(jobs.id, old));
    });
    await enqueue('waiting');
    await forgetGivenUpJobs();
    expect((await rows()).map(({ payload }) => JSON.parse(payload).refitId).sort()).toEqual([
      'waiting',
      'young',
    ]);
  });

  it('tells its handler of every sign of life', { timeout: 4 * HEARTBEAT_MS }, async () => {
    await enqueue('a');
    const onBeat = vi.fn(async (): Promise<void> => undefined);
    let beaten: () => void = () => undefined;
    const first = new Promise<void>((resolve) => {
      beaten = resolve;
    });
    onBeat.mockImplementation(async () => beaten());
    await attempt({
      mostAttempts: 3,
      onBeat,
      run: async () => {
        await first;
        return async () => undefined;
      },
    });
    expect(onBeat).toHaveBeenCalledWith({ refitId: 'a' });
  });

  it('is begun however much work of calls is under way', async () => {
    const working: Promise<void>[] = [];
    for (let i = 0; i < 6; i++) {
      const held = await write('acknowledged', (tx) => enqueueStartedJob(tx, 'refit', { refitId: 'call' }));
      const handler: JobHandler = { mostAttempts: 3, run: never };
      working.push(carryOut(held, handler, (signal) => never({ refitId: 'call' }, signal)));
    }
    await enqueue('waiting');
    const run = vi.fn(async () => async () => undefined);
    const runner = runJobs({ refit: { mostAttempts: 3, run } });
    await vi.waitFor(() => expect(run).toHaveBeenCalledOnce(), { timeout: 5_000 });
    await runner.stop();
    await Promise.all(working);
  });

  it('may be under way already when it is added', async () => {
    const held = await write('acknowledged', (tx) => enqueueStartedJob(tx, 'refit', { refitId: 'a' }));
    expect(await claim()).toBeNull();
    const handler: JobHandler = { mostAttempts: 3, run: never };
    await carryOut(held, handler, async () => async () => undefined);
    expect(await rows()).toEqual([]);
  });
});

it('pauses grow to an hour', () => {
  expect([1, 2, 3].map(pauseAfter)).toEqual([2_000, 8_000, 32_000]);
  expect(pauseAfter(30)).toBe(3_600_000);
});

it('two processes do every job once between them', async () => {
  const done: string[] = [];
  const handlers = {
    refit: {
      mostAttempts: 3,
      run:
        async ({ refitId }: { refitId: string }) =>
        async () =>
          void done.push(refitId),
    },
  };
  const runners = [runJobs(handlers), runJobs(handlers)];
  const names = Array.from({ length: 12 }, (_, i) => `job ${i}`);
  await Promise.all(names.map((name) => enqueue(name)));
  await vi.waitFor(async () => expect(await rows()).toEqual([]), { timeout: 20_000 });
  await Promise.all(runners.map((runner) => runner.stop()));
  expect(done.sort()).toEqual(names.sort());
  await enqueue('after the end');
  await new Promise((resolve) => setTimeout(resolve, 800));
  expect(await rows()).toHaveLength(1);
});
