import { describe, expect, it, vi } from 'vitest';
import { readDatabase, write } from '@/db/client';
import { selectDecisions } from '@/db/queries/decisions';
import { removeDeposit, updateDocument, updateState } from '@/db/queries/deposits';
import { selectRevisions } from '@/db/queries/revisions';
import { type Actor, VISITOR } from '@/lib/auth/actor';
import { acceptDeposit } from '@/lib/curation/accept-deposit';
import { askForChanges } from '@/lib/curation/ask-for-changes';
import { declineDeposit } from '@/lib/curation/decline-deposit';
import { listQueue } from '@/lib/curation/list-queue';
import { loadDeposit } from '@/lib/deposits/load-deposit';
import { recallDeposit } from '@/lib/deposits/recall-deposit';
import type { DepositState } from '@/lib/deposits/states';
import { submitDeposit } from '@/lib/deposits/submit-deposit';
import { auditOf, codeOf, makeDeposit, stored, worked } from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';

const { cast } = collectionForTests();

const VERBS = {
  'accepting a deposit': (actor: Actor, id: string) => acceptDeposit({ actor, id }),
  'asking for changes': (actor: Actor, id: string) =>
    askForChanges({ actor, id, letter: 'State the temperature.' }),
  'declining a deposit': (actor: Actor, id: string) =>
    declineDeposit({ actor, id, letter: 'No point of it has an energy.' }),
};
const decisionsOf = async (id: string) => selectDecisions(await readDatabase(), id);

describe.each(Object.entries(VERBS))('%s', { timeout: 60_000 }, (_, decide) => {
  it.each(['submitted', 'in-review'] as DepositState[])('works for what is %s', async (state) => {
    const id = await makeDeposit(cast, state);
    worked(await decide(cast.curator, id));
    expect(await decisionsOf(id)).toMatchObject([{ revision: 1, decidedBy: `person:${cast.curator.id}` }]);
  });

  it('refuses the wrong role', async () => {
    const id = await makeDeposit(cast, 'submitted');
    expect(codeOf(await decide(VISITOR, id))).toBe('unauthenticated');
    expect(codeOf(await decide(cast.depositor, id))).toBe('forbidden');
    expect(codeOf(await decide(cast.token, id))).toBe('forbidden');
    expect(codeOf(await decide(cast.administrator, id))).toBe('forbidden');
    expect(codeOf(await decide(cast.outsider, id))).toBe('not-found');
    expect(await stored(id)).toMatchObject({ state: 'submitted' });
    expect(await decisionsOf(id)).toEqual([]);
  });

  it('refuses a curator of the depositing laboratory', async () => {
    const id = await makeDeposit(cast, 'submitted');
    expect(codeOf(await decide(cast.ownCurator, id))).toBe('forbidden');
    expect(await stored(id)).toMatchObject({ state: 'submitted' });
    expect((await auditOf(id)).at(-1)).toBe('refused: decide-deposit');
  });

  it.each(['changes-requested', 'accepted', 'published', 'declined', 'withdrawn'] as DepositState[])(
    'refuses the wrong state: %s',
    async (state) => {
      const id = await makeDeposit(cast, state);
      const before = await stored(id);
      expect(codeOf(await decide(cast.curator, id))).toBe('conflict');
      expect(await stored(id)).toEqual(before);
    },
  );

  it('knows nothing of drafts', async () => {
    expect(codeOf(await decide(cast.curator, await makeDeposit(cast)))).toBe('not-found');
  });
});

describe('a decision', { timeout: 60_000 }, () => {
  it('to accept publishes at once, under an accession that nobody had', async () => {
    const id = await makeDeposit(cast, 'submitted');
    const { deposit, accession } = worked(
      await acceptDeposit({ actor: cast.curator, id, letter: 'Thank you.' }),
    );
    expect(deposit).toMatchObject({ state: 'published', accession });
    expect(await decisionsOf(id)).toMatchObject([{ kind: 'accepted', letter: 'Thank you.' }]);
    const [revision] = await selectRevisions(await readDatabase(), id);
    expect(revision?.publishedAt).toBeTypeOf('number');
    const number = `CK-${String(accession).padStart(6, '0')}.1`;
    expect((await auditOf(id)).slice(-2)).toEqual(['accepted: revision 1', `published: ${number}`]);
    const next = worked(
      await acceptDeposit({ actor: cast.curator, id: await makeDeposit(cast, 'submitted') }),
    );
    expect(next.accession).toBe((accession ?? Number.NaN) + 1);
  });

  it('to decline is final, and tells the laboratory why', async () => {
    const id = await makeDeposit(cast, 'submitted');
    const letter = 'Averages over variants have no energy.';
    expect(worked(await declineDeposit({ actor: cast.curator, id, letter })).deposit).toMatchObject({
      state: 'declined',
      accession: null,
    });
    expect(worked(await loadDeposit({ actor: cast.depositor, id })).decisions).toMatchObject([
      { kind: 'declined', letter, revision: 1 },
    ]);
    expect((await auditOf(id)).at(-1)).toBe('declined: revision 1');
    expect(codeOf(await submitDeposit({ actor: cast.depositor, id }))).toBe('conflict');
    expect(codeOf(await recallDeposit({ actor: cast.depositor, id }))).toBe('conflict');
    expect(codeOf(await acceptDeposit({ actor: cast.curator, id }))).toBe('conflict');
  });

  it.each([askForChanges, declineDeposit])(
    'that is an answer needs a letter of at most 20,000 characters (%o)',
    async (answer) => {
      const id = await makeDeposit(cast, 'submitted');
      for (const letter of ['', ' \n ', 'x'.repeat(20_001)]) {
        const outcome = await answer({ actor: cast.curator, id, letter });
        expect(codeOf(outcome)).toBe('invalid-input');
        expect(outcome.ok || outcome.failure.members?.errors?.[0]?.pointer).toBe('/letter');
      }
      expect(codeOf(await acceptDeposit({ actor: cast.curator, id, letter: 'x'.repeat(20_001) }))).toBe(
        'invalid-input',
      );
      worked(await answer({ actor: cast.curator, id, letter: 'x'.repeat(20_000) }));
      expect(['changes-requested', 'declined']).toContain((await stored(id))?.state);
    },
  );

  it('about a revision that is not the newest any more is refused', async () => {
    const id = await makeDeposit(cast, 'submitted');
    worked(await recallDeposit({ actor: cast.depositor, id }));
    worked(await submitDeposit({ actor: cast.depositor, id }));
    expect(codeOf(await acceptDeposit({ actor: cast.curator, id, revision: 1 }))).toBe('conflict');
    worked(await acceptDeposit({ actor: cast.curator, id, revision: 2 }));
  });

  it('is one of fifty that are made at once', async () => {
    const id = await makeDeposit(cast, 'submitted');
    const outcomes = await Promise.all(
      Array.from({ length: 50 }, (_, i) =>
        [acceptDeposit, askForChanges, declineDeposit][i % 3]?.({
          actor: cast.curator,
          id,
          letter: `number ${i}`,
        }),
      ),
    );
    expect(outcomes.filter((outcome) => outcome?.ok)).toHaveLength(1);
    expect(
      outcomes.filter((outcome) => outcome?.ok === false && outcome.failure.code === 'conflict'),
    ).toHaveLength(49);
    const [decision, ...others] = await decisionsOf(id);
    expect(others).toEqual([]);
    const state = decision?.kind === 'accepted' ? 'published' : decision?.kind;
    expect(await stored(id)).toMatchObject({ state });
  });

  it('has one effect under one key', async () => {
    const id = await makeDeposit(cast, 'submitted');
    const call = { actor: cast.curator, id, idempotencyKey: 'decide-once' };
    const first = worked(await acceptDeposit(call));
    expect(worked(await acceptDeposit(call))).toEqual(first);
    expect(codeOf(await acceptDeposit({ ...call, letter: 'another' }))).toBe('idempotency-mismatch');
    expect(await decisionsOf(id)).toHaveLength(1);
  });

  it.each([acceptDeposit, askForChanges, declineDeposit])(
    'about another revision under the same key is another one (%o)',
    async (verb) => {
      const id = await makeDeposit(cast, 'submitted');
      const call = { actor: cast.curator, id, letter: 'x', idempotencyKey: 'a revision' };
      worked(await verb({ ...call, revision: 1 }));
      worked(await verb({ ...call, revision: 1 }));
      for (const revision of [2, undefined])
        expect(codeOf(await verb({ ...call, revision }))).toBe('idempotency-mismatch');
    },
  );

  it('is made of the state and version that were read, and of no other', async () => {
    const id = await makeDeposit(cast, 'submitted');
    const before = await stored(id);
    const version = before?.version ?? 0;
    const to = { state: 'declined', updatedAt: 1, updatedBy: 'system' } as const;
    const content = { document: '{}', title: '', system: '', errors: '[]', errorCount: 0 };
    await write('acknowledged', async (tx) => {
      for (const expected of [
        { id, version: version - 1, from: 'submitted' as const },
        { id, version, from: 'in-review' as const },
      ]) {
        expect(await updateState(tx, expected, to)).toBe(false);
        expect(await updateDocument(tx, expected, { ...content, updatedAt: 1, updatedBy: 'x' })).toBe(false);
        expect(await removeDeposit(tx, expected)).toBe(false);
      }
    });
    expect(await stored(id)).toEqual(before);
  });

  it.each(['\u0000', 'a\u0007', 'half \ud800'])(
    'keeps no letter that cannot be read back: %j',
    async (letter) => {
      const id = await makeDeposit(cast, 'submitted');
      for (const verb of [acceptDeposit, askForChanges, declineDeposit])
        expect(codeOf(await verb({ actor: cast.curator, id, letter: `Dear ${letter}` }))).toBe(
          'invalid-input',
        );
      worked(await acceptDeposit({ actor: cast.curator, id, letter: 'Line\n\tline\r\n– µ' }));
      expect(await decisionsOf(id)).toMatchObject([{ letter: 'Line\n\tline\r\n– µ' }]);
    },
  );

  it('gives many deposits at once accessions of their own, without a gap', async () => {
    const ids: string[] = [];
    for (let i = 0; i < 8; i++) ids.push(await makeDeposit(cast, 'submitted'));
    const outcomes = await Promise.all(ids.map((id) => acceptDeposit({ actor: cast.curator, id })));
    const accessions = outcomes
      .map((outcome) => worked(outcome).accession ?? Number.NaN)
      .toSorted((a, b) => a - b);
    expect(accessions).toEqual(accessions.map((_, i) => (accessions[0] ?? 0) + i));
  });
});

describe('the queue', { timeout: 60_000 }, () => {
  it('holds what waits, with its assessment, the longest waiting first', async () => {
    const ids = [await makeDeposit(cast, 'submitted'), await makeDeposit(cast, 'in-review')];
    await makeDeposit(cast, 'changes-requested');
    await makeDeposit(cast);
    const { queue } = worked(await listQueue({ actor: cast.curator }));
    expect(queue.filter(({ id }) => ids.includes(id))).toMatchObject([
      { id: ids[0], state: 'submitted', revision: 1, labSlug: cast.lab.labSlug, blocked: false },
      { id: ids[1], state: 'in-review', summary: { points: 2 } },
    ]);
    expect(new Set(queue.map(({ state }) => state))).toEqual(new Set(['submitted', 'in-review']));
    expect(queue.map(({ submittedAt }) => submittedAt)).toEqual(
      queue.map(({ submittedAt }) => submittedAt).toSorted(),
    );
    vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 90_000 });
    try {
      const later = worked(await listQueue({ actor: cast.curator })).queue;
      for (const { ageMs, submittedAt } of later) expect(ageMs).toBe(Date.now() - submittedAt);
      expect(Math.min(...later.map(({ ageMs }) => ageMs))).toBeGreaterThanOrEqual(90_000);
    } finally {
      vi.useRealTimers();
    }
  });

  it('marks what a curator may not decide on', async () => {
    const id = await makeDeposit(cast, 'submitted');
    const { queue } = worked(await listQueue({ actor: cast.ownCurator }));
    expect(queue.find((entry) => entry.id === id)?.blocked).toBe(true);
  });

  it('shows a resubmission once, as its newest revision', async () => {
    const id = await makeDeposit(cast, 'changes-requested');
    worked(await submitDeposit({ actor: cast.depositor, id }));
    const { queue } = worked(await listQueue({ actor: cast.curator }));
    expect(queue.filter((entry) => entry.id === id)).toMatchObject([{ revision: 2 }]);
  });

  it('is for curators', async () => {
    expect(codeOf(await listQueue({ actor: VISITOR }))).toBe('unauthenticated');
    for (const actor of [cast.depositor, cast.token, cast.administrator])
      expect(codeOf(await listQueue({ actor }))).toBe('forbidden');
  });
});
