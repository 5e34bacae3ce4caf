/** Computes for somebody within limits of their own, which are those of an address that assesses documents. */
import { admitComputation, endComputation } from '@/lib/assessments/admit-computation';
import { computationLimits } from '@/lib/assessments/computation-limits';
import { noteLimited } from '@/lib/audit/audit-refusals';
import { type Actor, actorKey } from '@/lib/auth/actor';
import { MOST_POINTS } from '@/lib/documents/size-limits';
import type { AssessmentSummary } from '@/lib/engine/assessment';
import { env } from '@/lib/env';
import { failed, type Outcome } from '@/lib/errors';

/**
 * Runs a computation, or says how long to wait.
 *
 * @param compute told how many points it may have; where it worked, `summary` is that of its assessment
 */
export async function withinLimits<T extends { summary: string }>(
  actor: Actor,
  compute: (pointsBudget: number) => Promise<Outcome<T>>,
): Promise<Outcome<T>> {
  const limits = computationLimits(env().demo);
  const admission = await admitComputation(`actor ${actorKey(actor)}`, limits, MOST_POINTS);
  if (!admission.admitted) {
    const { refusal, retryAfterSeconds } = admission;
    await noteLimited(actor, 'read-deposit');
    return { ok: false, failure: { ...failed(refusal).failure, retryAfterSeconds } };
  }
  const { lease } = admission;
  let computedPoints = 0;
  try {
    const outcome = await compute(lease.pointsBudget);
    if (outcome.ok) computedPoints = (JSON.parse(outcome.summary) as AssessmentSummary).points;
    return outcome;
  } finally {
    await endComputation(lease, limits, { computedPoints });
  }
}
