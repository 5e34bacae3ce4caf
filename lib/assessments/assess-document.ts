/** The verb behind `POST /api/v1/assessments`: anyone's document in, its assessment out, nothing stored. */
import { noteLimited } from '@/lib/audit/audit-refusals';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import { MOST_POINTS } from '@/lib/documents/size-limits';
import { env } from '@/lib/env';
import type { Failure } from '@/lib/errors';
import { log } from '@/lib/log';
import type { BodyResult } from '@/lib/serving/read-body';
import { addressKey } from './address-key';
import { type Admission, admitComputation, endComputation, type Lease } from './admit-computation';
import { type ComputationOutcome, computeInPool } from './assessment-pool';
import { type ComputationLimits, computationLimits, type Quota } from './computation-limits';

/** The shortest point, `{"ligands":{},"activity":0},`, has 28 bytes: a body cannot hold more points than that allows. */
const LEAST_BYTES_PER_POINT = 28;

/** Seconds after which a caller may try again when the queue is full. */
const BUSY_RETRY_SECONDS = 2;

export interface AssessmentCall {
  actor: Actor;
  /** network address of the caller */
  peer: string;
  /** most bytes that the body can have */
  mostBytes: number;
  /** reads the body, once the call is let in */
  readBody: () => Promise<BodyResult>;
  signal: AbortSignal;
}

export type AssessmentOutcome = { quota: Quota | null; retryAfterSeconds?: number } & (
  | { kind: 'answered'; status: number; body: Uint8Array<ArrayBuffer> }
  | { kind: 'failed'; failure: Failure }
);

/** Checks and computes a document within the limits of its caller's address. */
export async function assessDocument(call: AssessmentCall): Promise<AssessmentOutcome> {
  if (!may(call.actor, 'check-document'))
    return { kind: 'failed', failure: { code: 'forbidden' }, quota: null };
  const limits = computationLimits(env().demo);
  const mostPoints = Math.min(MOST_POINTS, Math.ceil(call.mostBytes / LEAST_BYTES_PER_POINT));
  const admission = await admit(call.peer, limits, mostPoints);
  if (admission === null)
    return {
      kind: 'failed',
      failure: { code: 'unavailable' },
      quota: null,
      retryAfterSeconds: BUSY_RETRY_SECONDS,
    };
  if (!admission.admitted) {
    await noteLimited(call.actor, 'check-document');
    return refusedOutcome(admission);
  }
  let computed: Computed = { kind: 'aborted' };
  try {
    computed = await compute(call, admission.lease);
  } catch (error) {
    await end(admission, limits, computed);
    throw error;
  }
  return outcomeOf(computed, await end(admission, limits, computed));
}

type Computed = ComputationOutcome | { kind: 'no-body'; failure: Failure };
type Admitted = Extract<Admission, { admitted: true }>;
type Ended = Awaited<ReturnType<typeof endComputation>>;

/** Null where the limits cannot be asked: then nothing is computed, since nothing would bound it. */
async function admit(peer: string, limits: ComputationLimits, mostPoints: number): Promise<Admission | null> {
  try {
    return await admitComputation(await addressKey(peer), limits, mostPoints);
  } catch (error) {
    log().error({ err: error }, 'the limits could not be asked');
    return null;
  }
}

async function compute(call: AssessmentCall, lease: Lease): Promise<Computed> {
  const body = await call.readBody();
  if (!body.ok) return { kind: 'no-body', failure: body.failure };
  return computeInPool(body.bytes, lease.pointsBudget, call.signal);
}

/** Gives the place back. An answer that is ready is not thrown away because this failed: the place ends by itself. */
async function end(
  { lease, quota }: Admitted,
  limits: ComputationLimits,
  computed: Computed,
): Promise<Ended> {
  try {
    return await endComputation(lease, limits, {
      computedPoints: computed.kind === 'assessed' ? computed.points : 0,
      neededPoints: computed.kind === 'over-budget' ? computed.points : 1,
    });
  } catch (error) {
    log().error({ err: error }, 'the end of a computation was not noted');
    return { quota, retryAfterSeconds: 1 };
  }
}

function refusedOutcome({
  refusal,
  quota,
  retryAfterSeconds,
}: Exclude<Admission, Admitted>): AssessmentOutcome {
  return { kind: 'failed', failure: { code: refusal }, quota, retryAfterSeconds };
}

function outcomeOf(computed: Computed, { quota, retryAfterSeconds }: Ended): AssessmentOutcome {
  switch (computed.kind) {
    case 'assessed':
    case 'refused':
      return { kind: 'answered', status: computed.status, body: computed.body, quota };
    case 'over-budget': {
      const detail = `The document has ${computed.points} points; ${quota.points.left} are left for this minute.`;
      return { kind: 'failed', failure: { code: 'too-many-points', detail }, quota, retryAfterSeconds };
    }
    case 'no-body':
      return { kind: 'failed', failure: computed.failure, quota };
    case 'aborted':
      return { kind: 'failed', failure: { code: 'incomplete-body' }, quota };
    case 'busy':
    case 'took-too-long':
      return {
        kind: 'failed',
        failure: { code: computed.kind },
        quota,
        retryAfterSeconds: BUSY_RETRY_SECONDS,
      };
  }
}
