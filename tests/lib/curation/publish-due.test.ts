import { describe, expect, it } from 'vitest';
import { readDatabase } from '@/db/client';
import { selectRevisions } from '@/db/queries/revisions';
import { VISITOR } from '@/lib/auth/actor';
import { acceptDeposit } from '@/lib/curation/accept-deposit';
import { publishDue } from '@/lib/curation/publish-due';
import { loadDeposit } from '@/lib/deposits/load-deposit';
import { headAnswer } from '@/lib/deposits/write-answer';
import { auditOf, codeOf, makeDeposit, stored, worked } from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';

const { cast } = collectionForTests();
const DAY = '2029-03-01';
/** Midnight in Oslo, an hour ahead of UTC in winter. */
const MIDNIGHT = Date.parse('2029-02-28T23:00:00Z');
const publication = { day: DAY, timeZone: 'Europe/Oslo' };

async function accepted(): Promise<string> {
  const id = await makeDeposit(cast, 'submitted');
  const outcome = worked(await acceptDeposit({ actor: cast.curator, id, publication }));
  expect(outcome.accession).toBeNull();
  return id;
}

describe('publication on a later day', { timeout: 60_000 }, () => {
  it('rests as accepted until then, says so, and is seen by nobody else', async () => {
    const id = await accepted();
    const { deposit } = worked(await loadDeposit({ actor: cast.depositor, id }));
    expect(headAnswer(deposit)).toMatchObject({ state: 'accepted', accession: null, publication });
    expect(codeOf(await loadDeposit({ actor: VISITOR, id }))).toBe('unauthenticated');
    expect(codeOf(await loadDeposit({ actor: cast.outsider, id }))).toBe('not-found');
    expect(await auditOf(id)).toContain(`accepted: revision 1, to be published on ${DAY}`);
  });

  it('comes at the first midnight of its day, once', async () => {
    const id = await accepted();
    await publishDue(MIDNIGHT - 1);
    expect(await stored(id)).toMatchObject({ state: 'accepted' });
    const published = await Promise.all([publishDue(MIDNIGHT), publishDue(MIDNIGHT)]);
    expect(published.reduce((sum, number) => sum + number)).toBeGreaterThanOrEqual(1);
    expect(await stored(id)).toMatchObject({ state: 'published', accession: expect.any(Number) });
    const [revision] = await selectRevisions(await readDatabase(), id);
    expect(revision?.publishedAt).toBe(MIDNIGHT);
    expect((await auditOf(id)).filter((line) => line.startsWith('published'))).toHaveLength(1);
    expect(await publishDue(MIDNIGHT)).toBe(0);
  });

  it('is for a day to come', async () => {
    const id = await makeDeposit(cast, 'submitted');
    const call = { actor: cast.curator, id, publication, now: MIDNIGHT };
    expect(codeOf(await acceptDeposit(call))).toBe('invalid-input');
    expect(await stored(id)).toMatchObject({ state: 'submitted' });
    worked(await acceptDeposit({ ...call, now: MIDNIGHT - 1 }));
  });
});
