import { describe, expect, it } from 'vitest';
import { admitComputation, endComputation } from '@/lib/assessments/admit-computation';
import { temporaryDatabase } from '@/tests/support/temporary-database';

temporaryDatabase();

const LIMITS = { callsPerMinute: 5, pointsPerMinute: 1000, atOnce: 2 };
const START = 1_800_000_000_000;

async function admitted(key: string, mostPoints = 100, nowMs = START) {
  const admission = await admitComputation(key, LIMITS, mostPoints, nowMs);
  if (!admission.admitted) throw new Error(`refused: ${admission.refusal}`);
  return admission;
}

describe('admitting computations', () => {
  it('takes two at a time, and a third once one has ended', async () => {
    const first = await admitted('a');
    const second = await admitted('a');
    const third = await admitComputation('a', LIMITS, 100, START);
    expect(third).toMatchObject({ admitted: false, refusal: 'too-many-at-once', retryAfterSeconds: 1 });
    await endComputation(first.lease, LIMITS, {}, START);
    await endComputation((await admitted('a')).lease, LIMITS, {}, START);
    await endComputation(second.lease, LIMITS, {}, START);
  });

  it('counts addresses apart', async () => {
    await admitted('b');
    await admitted('b');
    await admitted('c');
  });

  it('refuses the sixth call within a minute and takes it after', async () => {
    for (let i = 0; i < 5; i++) {
      const at = START + i * 1000;
      await endComputation((await admitted('d', 100, at)).lease, LIMITS, {}, at);
    }
    const sixth = await admitComputation('d', LIMITS, 100, START + 10_000);
    expect(sixth).toMatchObject({ admitted: false, refusal: 'too-many-calls', retryAfterSeconds: 50 });
    await admitted('d', 100, START + 60_000);
  });

  it('gives at most the points that are left, less those set aside for calls under way', async () => {
    const first = await admitted('e', 900);
    expect(first.lease.pointsBudget).toBe(900);
    const second = await admitted('e', 900);
    expect(second.lease.pointsBudget).toBe(100);
    const ended = await endComputation(first.lease, LIMITS, { computedPoints: 300 }, START);
    expect(ended.quota.points.left).toBe(600);
    const { quota } = await endComputation(second.lease, LIMITS, { computedPoints: 100 }, START);
    expect(quota.points.left).toBe(600);
  });

  it('says when a document that has too many points would fit', async () => {
    const { lease } = await admitted('f', 1000);
    await endComputation(lease, LIMITS, { computedPoints: 900 }, START);
    const later = START + 20_000;
    const { lease: tooLarge } = await admitted('f', 1000, later);
    expect(tooLarge.pointsBudget).toBe(100);
    const { retryAfterSeconds } = await endComputation(tooLarge, LIMITS, { neededPoints: 200 }, later);
    expect(retryAfterSeconds).toBe(40);
  });

  it('frees the places of a process that was killed', async () => {
    await admitted('g');
    await admitted('g');
    expect((await admitComputation('g', LIMITS, 1, START + 60_000)).admitted).toBe(false);
    expect((await admitComputation('g', LIMITS, 1, START + 121_000)).admitted).toBe(true);
  });

  it('lets in exactly as many of fifty parallel calls as the limit allows', async () => {
    const many = await Promise.all(Array.from({ length: 50 }, () => admitComputation('h', LIMITS, 1, START)));
    expect(many.filter((admission) => admission.admitted)).toHaveLength(2);
  });

  it('costs a few milliseconds', async () => {
    const generous = { callsPerMinute: 1e6, pointsPerMinute: 1e9, atOnce: 10 };
    const started = performance.now();
    for (let i = 0; i < 100; i++) {
      const admission = await admitComputation('i', generous, 1);
      if (admission.admitted) await endComputation(admission.lease, generous, { computedPoints: 1 });
    }
    // A hundred pairs; the bound leaves room for a loaded machine.
    expect((performance.now() - started) / 100).toBeLessThan(100);
  });
});
