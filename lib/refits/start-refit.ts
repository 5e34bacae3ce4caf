/**
 * The verb behind `POST /api/v1/refits`: anyone's document in, fitted values out. One that takes longer than a second
 * goes on as a job, and its answer is kept for an hour under an address that nobody can guess.
 */
import { randomBytes } from 'node:crypto';
import { setTimeout as sleep } from 'node:timers/promises';
import { write } from '@/db/client';
import { insertRefit } from '@/db/queries/refits';
import { addressKey } from '@/lib/assessments/address-key';
import {
  type Admission,
  admitComputation,
  endComputation,
  type Lease,
} from '@/lib/assessments/admit-computation';
import type { ComputationLimits, Quota } from '@/lib/assessments/computation-limits';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import { env } from '@/lib/env';
import type { Failure } from '@/lib/errors';
import { carryOut } from '@/lib/jobs/carry-out';
import { enqueueStartedJob } from '@/lib/jobs/enqueue-job';
import { log } from '@/lib/log';
import type { BodyResult } from '@/lib/serving/read-body';
import { finishOf, keepingProgress, tookTooLong } from './kept-refit';
import { refitJob } from './refit-job';
import { REFIT_PLACE_MS, refitLimits } from './refit-limits';
import { type RefitComputation, refitInPool } from './refit-pool';

/** How long a call waits for its answer, ms. */
const WAIT_MS = 1_000;

/** How long an answer is kept, ms. */
const KEPT_MS = 60 * 60_000;

/** Seconds after which a caller may try again when the queue is full. */
const BUSY_RETRY_SECONDS = 5;

export interface RefitCall {
  actor: Actor;
  /** network address of the caller */
  peer: string;
  /** reads the body, once the call is let in */
  readBody: () => Promise<BodyResult>;
  /** of the caller: where it aborts while it waits, the refit stops */
  signal: AbortSignal;
  /** how long it waits, ms */
  waitMs?: number;
}

export type RefitOutcome = { quota: Quota | null; retryAfterSeconds?: number } & (
  | { kind: 'answered'; status: number; body: Uint8Array<ArrayBuffer> }
  | { kind: 'running'; id: string; progress: number }
  | { kind: 'failed'; failure: Failure }
);

/** Checks and begins a refit within the limits of its caller's address; waits for it for a second. */
export async function startRefit(call: RefitCall): Promise<RefitOutcome> {
  if (!may(call.actor, 'refit-document')) return failedOutcome({ code: 'forbidden' }, null);
  const limits = refitLimits(env().demo);
  const admission = await admit(call.peer, limits);
  if (admission === null) return failedOutcome({ code: 'unavailable' }, null, BUSY_RETRY_SECONDS);
  const { quota } = admission;
  if (!admission.admitted)
    return failedOutcome({ code: admission.refusal }, quota, admission.retryAfterSeconds);
  const { lease } = admission;
  let ended: Ended = { kind: 'aborted' };
  try {
    ended = await begin(call, lease);
  } finally {
    // A refit that goes on keeps its place until its answer stands.
    if (ended.kind !== 'running') await giveBack(lease, limits);
  }
  return outcomeOf(ended, quota);
}

type Ended =
  | RefitComputation
  | { kind: 'no-body'; failure: Failure }
  | { kind: 'running'; id: string; progress: number };

/** Null where the limits cannot be asked: then nothing is computed, since nothing would bound it. */
async function admit(peer: string, limits: ComputationLimits): Promise<Admission | null> {
  try {
    // Refits are counted apart from assessments.
    const key = `refit ${await addressKey(peer)}`;
    return await admitComputation(key, limits, 0, Date.now(), REFIT_PLACE_MS);
  } catch (error) {
    log().error({ err: error }, 'the limits could not be asked');
    return null;
  }
}

async function begin({ readBody, signal, waitMs = WAIT_MS }: RefitCall, lease: Lease): Promise<Ended> {
  const read = await readBody();
  if (!read.ok) return { kind: 'no-body', failure: read.failure };
  const stop = new AbortController();
  let progress = 0;
  // The worker takes the bytes away; a refit that goes on as a job needs them still.
  const sent = read.bytes.slice();
  const computing = refitInPool(
    read.bytes,
    (now) => {
      progress = Math.max(progress, now);
    },
    stop.signal,
  );
  const leave = () => stop.abort();
  signal.addEventListener('abort', leave);
  if (signal.aborted) leave();
  const waited = new AbortController();
  const first = await Promise.race([computing, sleep(waitMs, null, { signal: waited.signal })]);
  waited.abort();
  signal.removeEventListener('abort', leave);
  if (first !== null) return first;
  try {
    const id = await goOn({ sent, lease, computing, stop, progress: () => progress });
    return { kind: 'running', id, progress };
  } catch (error) {
    stop.abort();
    throw error;
  }
}

interface Going {
  sent: Uint8Array;
  lease: Lease;
  computing: Promise<RefitComputation>;
  stop: AbortController;
  progress: () => number;
}

/** Makes a job of a refit that is being computed. */
async function goOn({ sent, lease, computing, stop, progress }: Going): Promise<string> {
  const id = randomBytes(16).toString('base64url');
  const now = Date.now();
  const job = await write('acknowledged', async (tx) => {
    const started = await enqueueStartedJob(tx, 'refit', { refitId: id });
    const row = { id, body: Buffer.from(sent), progress: progress(), leaseId: lease.id, jobId: started.id };
    await insertRefit(tx, { ...row, expiresAt: now + KEPT_MS });
    return started;
  });
  carryOut(job, refitJob, async (signal) => {
    signal.addEventListener('abort', () => stop.abort());
    return finishOf({ id, leaseId: lease.id }, await keepingProgress(id, progress, computing));
  }).catch((error: unknown) => log().error({ err: error }, 'a refit failed'));
  return id;
}

async function giveBack(lease: Lease, limits: ComputationLimits): Promise<void> {
  try {
    await endComputation(lease, limits, {});
  } catch (error) {
    // An answer that is ready is not thrown away because of this: the place ends by itself.
    log().error({ err: error }, 'the end of a refit was not noted');
  }
}

function outcomeOf(ended: Ended, quota: Quota): RefitOutcome {
  switch (ended.kind) {
    case 'answered':
    case 'running':
      return { ...ended, quota };
    case 'took-too-long':
      return { kind: 'answered', ...tookTooLong(), quota };
    case 'no-body':
      return failedOutcome(ended.failure, quota);
    case 'aborted':
      return failedOutcome({ code: 'incomplete-body' }, quota);
    case 'busy':
      return failedOutcome({ code: 'busy' }, quota, BUSY_RETRY_SECONDS);
  }
}

function failedOutcome(failure: Failure, quota: Quota | null, retryAfterSeconds?: number): RefitOutcome {
  return {
    kind: 'failed',
    failure,
    quota,
    ...(retryAfterSeconds === undefined ? {} : { retryAfterSeconds }),
  };
}
