import { afterAll, describe, expect, it } from 'vitest';
import { closeAssessmentPool, computeInPool, probeComputation } from '@/lib/assessments/assessment-pool';
import { assessmentSchema } from '@/schemas/assessment';
import { exampleDocument } from '@/tests/support/example-document';

const ALIVE = new AbortController().signal;

function bytesOf(value: unknown): Uint8Array<ArrayBuffer> {
  return new TextEncoder().encode(typeof value === 'string' ? value : JSON.stringify(value));
}

afterAll(closeAssessmentPool);

// Threads start and documents are computed: on a loaded machine that can take longer than a unit test usually may.
describe('the assessment pool', { timeout: 30_000 }, () => {
  it('shows a sign of life', async () => {
    expect(await probeComputation()).toBe('ok');
  });

  it('assesses a document and takes its bytes without copying them', async () => {
    const bytes = bytesOf(exampleDocument());
    const outcome = await computeInPool(bytes, 20_000, ALIVE);
    expect(bytes.byteLength).toBe(0);
    if (outcome.kind !== 'assessed') throw new Error(outcome.kind);
    expect(outcome.points).toBe(2);
    expect(() => assessmentSchema.parse(JSON.parse(new TextDecoder().decode(outcome.body)))).not.toThrow();
  });

  it('does not compute a document with more points than are left', async () => {
    const outcome = await computeInPool(bytesOf(exampleDocument({ pointsPerSeries: 10 })), 9, ALIVE);
    expect(outcome).toEqual({ kind: 'over-budget', points: 10 });
  });

  it.each([
    ['{"a":', 400],
    ['{}', 422],
    ['['.repeat(20_000) + ']'.repeat(20_000), 422],
    [`${'{"series":'.repeat(20_000)}1${'}'.repeat(20_000)}`, 422],
    ['['.repeat(20_000), 400],
  ])('answers what is no document with a problem', async (text, status) => {
    expect(await computeInPool(bytesOf(text), 20_000, ALIVE)).toMatchObject({ kind: 'refused', status });
  });

  it('stops where the caller goes away, and works on', async () => {
    const caller = new AbortController();
    const computing = computeInPool(
      bytesOf(exampleDocument({ series: 200, pointsPerSeries: 100 })),
      20_000,
      caller.signal,
    );
    setTimeout(() => caller.abort(), 20);
    expect(await computing).toEqual({ kind: 'aborted' });
    expect(await computeInPool(bytesOf(exampleDocument()), 20_000, ALIVE)).toMatchObject({
      kind: 'assessed',
    });
  });

  it('stops what takes too long', async () => {
    const bytes = bytesOf(exampleDocument({ series: 200, pointsPerSeries: 100 }));
    expect(await computeInPool(bytes, 20_000, ALIVE, 20)).toEqual({ kind: 'took-too-long' });
  });

  it('takes no more than it can hold', async () => {
    const bytes = () => bytesOf(exampleDocument({ series: 20, pointsPerSeries: 20 }));
    const outcomes = await Promise.all(
      Array.from({ length: 60 }, () => computeInPool(bytes(), 20_000, ALIVE)),
    );
    const kinds = outcomes.map((outcome) => outcome.kind);
    expect(kinds.filter((kind) => kind === 'busy').length).toBeGreaterThan(10);
    expect(kinds.filter((kind) => kind === 'assessed').length).toBeGreaterThan(30);
  });
});
