import { createHash } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { readDatabase, write } from '@/db/client';
import { addComputationUse, selectComputationUse, selectLeases } from '@/db/queries/computation-limits';
import { selectNewestRevision, selectRevisions } from '@/db/queries/revisions';
import { laboratories } from '@/db/tables/laboratories';
import { systems } from '@/db/tables/systems';
import { type Actor, VISITOR } from '@/lib/auth/actor';
import { deleteDraft } from '@/lib/deposits/delete-draft';
import { loadAssessment } from '@/lib/deposits/load-assessment';
import { loadDeposit } from '@/lib/deposits/load-deposit';
import { recallDeposit } from '@/lib/deposits/recall-deposit';
import { saveDraft } from '@/lib/deposits/save-draft';
import type { DepositState } from '@/lib/deposits/states';
import { submitDeposit } from '@/lib/deposits/submit-deposit';
import { depositEtag, depositJson } from '@/lib/deposits/write-answer';
import { parseDocument } from '@/lib/documents/parse-document';
import { assess } from '@/lib/engine/assess';
import { auditOf, bodyOf, codeOf, makeDeposit, stored, tokenOf, worked } from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';
import { exampleDocument } from '@/tests/support/example-document';

const { cast } = collectionForTests();

const submit = (actor: Actor, id: string) => submitDeposit({ actor, id });
const revisionsOf = async (id: string) => selectRevisions(await readDatabase(), id);

describe('submitting a deposit', { timeout: 60_000 }, () => {
  it('works: a revision that is the document, with its assessment', async () => {
    const text = JSON.stringify(exampleDocument({ series: 3, pointsPerSeries: 9 }), null, 1);
    const id = await makeDeposit(cast, 'draft', text);
    const { deposit, revision } = worked(await submit(cast.token, id));
    expect(deposit).toMatchObject({ state: 'submitted', version: 2 });
    expect(revision).toBe(1);
    const kept = await selectNewestRevision(await readDatabase(), id);
    expect(kept?.document).toBe(text);
    expect(kept?.sha256).toBe(createHash('sha256').update(text).digest('hex'));
    const parsed = parseDocument(text);
    if (!parsed.ok) throw new Error('not valid');
    const assessment = assess(parsed.document);
    expect(JSON.parse(kept?.assessment ?? '')).toEqual(JSON.parse(JSON.stringify(assessment)));
    expect(JSON.parse(kept?.summary ?? '')).toEqual(JSON.parse(JSON.stringify(assessment.summary)));
    expect(kept).toMatchObject({ engine: assessment.engine, policy: assessment.policy, publishedAt: null });
    expect(await auditOf(id)).toEqual(['created: draft', 'submitted: revision 1']);
  });

  it('refuses what is not valid, with all that is wrong and the system besides', async () => {
    const bad = {
      ...exampleDocument(),
      licence: 'none',
      temperature: { value: 9999, unit: 'K' },
      system: 'not-listed',
    };
    const id = await makeDeposit(cast, 'draft', bad);
    const outcome = await submit(cast.depositor, id);
    expect(codeOf(outcome)).toBe('invalid-document');
    const pointers = outcome.ok ? [] : outcome.failure.members?.errors?.map(({ pointer }) => pointer);
    expect(pointers).toEqual(expect.arrayContaining(['/licence', '/system']));
    expect(pointers?.filter((pointer) => pointer === '/system')).toHaveLength(1);
    expect(await stored(id)).toMatchObject({ state: 'draft', version: 1 });
    expect(await revisionsOf(id)).toEqual([]);
  });

  it('refuses a system that is not listed', async () => {
    const id = await makeDeposit(cast, 'draft', { ...exampleDocument(), system: 'not-listed' });
    const outcome = await submit(cast.depositor, id);
    expect(outcome.ok || outcome.failure.members?.errors).toEqual([
      { pointer: '/system', detail: expect.stringContaining('“not-listed”') },
    ]);
    const { errors } = worked(await loadDeposit({ actor: cast.depositor, id }));
    expect(errors.map(({ pointer }) => pointer)).toEqual(['/system']);
  });

  it('refuses the wrong role', async () => {
    const id = await makeDeposit(cast);
    expect(codeOf(await submit(VISITOR, id))).toBe('unauthenticated');
    expect(codeOf(await submit(cast.curator, id))).toBe('not-found');
    expect(codeOf(await submit(tokenOf(cast.lab, 'read-drafts', 'write-drafts'), id))).toBe('forbidden');
    expect(await stored(id)).toMatchObject({ state: 'draft' });
  });

  it('refuses the wrong laboratory', async () => {
    const id = await makeDeposit(cast);
    expect(codeOf(await submit(cast.outsider, id))).toBe('not-found');
    expect(codeOf(await submit(tokenOf(cast.otherLab, 'submit'), id))).toBe('not-found');
    expect(await stored(id)).toMatchObject({ state: 'draft' });
  });

  it.each(['submitted', 'in-review', 'published', 'declined', 'withdrawn'] as DepositState[])(
    'refuses the wrong state: %s',
    async (state) => {
      const id = await makeDeposit(cast, state);
      expect(codeOf(await submit(cast.depositor, id))).toBe('conflict');
      expect(await revisionsOf(id)).toHaveLength(1);
    },
  );

  it('makes revision 2 once changes were asked for, and leaves revision 1 as it was', async () => {
    const id = await makeDeposit(cast, 'changes-requested');
    const [first] = await revisionsOf(id);
    const readBody = bodyOf({ ...exampleDocument(), title: 'Second try' });
    worked(await saveDraft({ actor: cast.depositor, id, expected: 'any', readBody }));
    expect(worked(await submit(cast.depositor, id)).revision).toBe(2);
    const revisions = await revisionsOf(id);
    expect(revisions.map(({ number }) => number)).toEqual([2, 1]);
    expect(revisions[1]).toEqual(first);
  });

  it('makes one revision of sixteen submissions at once', async () => {
    const id = await makeDeposit(cast);
    const outcomes = await Promise.all(Array.from({ length: 16 }, () => submit(cast.depositor, id)));
    expect(outcomes.filter(({ ok }) => ok)).toHaveLength(1);
    expect(
      new Set(outcomes.filter(({ ok }) => !ok).map((outcome) => outcome.ok || outcome.failure.code)),
    ).toEqual(new Set(['conflict']));
    expect(await revisionsOf(id)).toHaveLength(1);
  });

  it('is answered the same under the same key', async () => {
    const id = await makeDeposit(cast);
    const call = { actor: cast.token, id, idempotencyKey: 'submit-once' };
    const first = worked(await submitDeposit(call));
    expect(worked(await submitDeposit(call))).toEqual(first);
    expect(await revisionsOf(id)).toHaveLength(1);
  });

  it('is not told again under its key of what has come back since', async () => {
    const id = await makeDeposit(cast);
    const call = { actor: cast.token, id, idempotencyKey: 'and again' };
    worked(await submitDeposit(call));
    worked(await recallDeposit({ actor: cast.token, id }));
    const again = await submitDeposit(call);
    expect(codeOf(again)).toBe('idempotency-mismatch');
    expect(again.ok || again.failure.detail).toContain('revision 1');
    expect(worked(await submitDeposit({ ...call, idempotencyKey: 'anew' })).revision).toBe(2);
    expect(codeOf(await submitDeposit({ ...call, idempotencyKey: 'anew', expected: [9] }))).toBe(
      'idempotency-mismatch',
    );
  });

  it('never snapshots another document than the one that was assessed', async () => {
    const id = await makeDeposit(cast);
    const readBody = bodyOf({ title: 'not valid at all' });
    const [submitted, saved] = await Promise.all([
      submit(cast.depositor, id),
      saveDraft({ actor: cast.depositor, id, expected: [1], readBody }),
    ]);
    expect([submitted.ok, saved.ok].filter(Boolean)).toHaveLength(1);
    const revisions = await revisionsOf(id);
    expect(revisions).toHaveLength(submitted.ok ? 1 : 0);
  });
});

describe('recalling a submission', { timeout: 60_000 }, () => {
  const recall = (actor: Actor, id: string) => recallDeposit({ actor, id });

  it('works: a draft again; the revision stays and its number is not used again', async () => {
    const id = await makeDeposit(cast, 'submitted');
    expect(worked(await recall(cast.token, id)).deposit).toMatchObject({ state: 'draft', version: 3 });
    expect(worked(await submit(cast.token, id)).revision).toBe(2);
    expect(await auditOf(id)).toEqual([
      'created: draft',
      'submitted: revision 1',
      'recalled: draft',
      'submitted: revision 2',
    ]);
  });

  it('goes back to changes requested where a curator has answered before', async () => {
    const id = await makeDeposit(cast, 'changes-requested');
    worked(await submit(cast.depositor, id));
    expect(worked(await recall(cast.depositor, id)).deposit.state).toBe('changes-requested');
    expect(codeOf(await deleteDraft({ actor: cast.depositor, id, expected: 'any' }))).toBe('conflict');
  });

  it('refuses the wrong role', async () => {
    const id = await makeDeposit(cast, 'submitted');
    expect(codeOf(await recall(VISITOR, id))).toBe('unauthenticated');
    expect(codeOf(await recall(cast.curator, id))).toBe('forbidden');
    expect(codeOf(await recall(tokenOf(cast.lab, 'read-drafts', 'write-drafts'), id))).toBe('forbidden');
    expect(await stored(id)).toMatchObject({ state: 'submitted' });
  });

  it('refuses the wrong laboratory', async () => {
    const id = await makeDeposit(cast, 'submitted');
    expect(codeOf(await recall(cast.outsider, id))).toBe('not-found');
    expect(await stored(id)).toMatchObject({ state: 'submitted' });
  });

  it.each(['draft', 'in-review', 'changes-requested', 'published'] as DepositState[])(
    'refuses the wrong state: %s',
    async (state) => {
      const id = await makeDeposit(cast, state);
      expect(codeOf(await recall(cast.depositor, id))).toBe('conflict');
      expect(await stored(id)).toMatchObject({ state });
    },
  );
});

describe('the assessment of a deposit', { timeout: 30_000 }, () => {
  it('is that of the draft as it stands, or says all that is wrong', async () => {
    const id = await makeDeposit(cast);
    const { assessment, revision } = worked(await loadAssessment({ actor: cast.depositor, id }));
    expect(revision).toBeNull();
    expect(JSON.parse(assessment).summary.points).toBe(2);
    worked(await saveDraft({ actor: cast.depositor, id, expected: 'any', readBody: bodyOf({}) }));
    expect(codeOf(await loadAssessment({ actor: cast.depositor, id }))).toBe('invalid-document');
  });

  it('is that of the revision for a curator, who does not see what is being changed', async () => {
    const id = await makeDeposit(cast, 'changes-requested');
    worked(await saveDraft({ actor: cast.depositor, id, expected: 'any', readBody: bodyOf({ secret: 1 }) }));
    expect(worked(await loadAssessment({ actor: cast.curator, id })).revision).toBe(1);
    expect(worked(await loadDeposit({ actor: cast.curator, id })).document).not.toContain('secret');
    expect(worked(await loadDeposit({ actor: cast.depositor, id })).document).toContain('secret');
    expect(codeOf(await loadAssessment({ actor: cast.outsider, id }))).toBe('not-found');
  });

  it('is not computed for whoever has it already', async () => {
    const id = await makeDeposit(cast);
    const { tag } = worked(await loadAssessment({ actor: cast.depositor, id }));
    const asked: string[] = [];
    const has = (one: string) => asked.push(one) > 0 && one === tag;
    expect(await loadAssessment({ actor: cast.depositor, id, has })).toEqual({ ok: true, unchanged: tag });
    worked(await saveDraft({ actor: cast.depositor, id, expected: 'any', readBody: bodyOf({}) }));
    expect(codeOf(await loadAssessment({ actor: cast.depositor, id, has }))).toBe('invalid-document');
    expect(asked[1]).not.toBe(tag);
  });

  it('of drafts is limited by actor, and says how long to wait', async () => {
    const id = await makeDeposit(cast);
    const busy = { ...cast.token, id: 'a busy script' };
    const key = `actor token:${busy.id}`;
    const second = Math.floor(Date.now() / 1000);
    await write('counter', (tx) => addComputationUse(tx, key, { second, calls: 120, points: 0 }));
    const refused = await loadAssessment({ actor: busy, id });
    expect(codeOf(refused)).toBe('too-many-calls');
    const wait = refused.ok ? 0 : (refused.failure.retryAfterSeconds ?? 0);
    expect(wait).toBeGreaterThan(50);
    expect(wait).toBeLessThanOrEqual(60);
    worked(await loadAssessment({ actor: cast.token, id }));
  });

  it('of a draft is counted with its points, and given back its place', async () => {
    const actor = { ...cast.token, id: 'a counted script' };
    const id = await makeDeposit(cast, 'draft', exampleDocument({ series: 3, pointsPerSeries: 9 }));
    for (let i = 0; i < 3; i++) worked(await loadAssessment({ actor, id }));
    const use = await write('counter', (tx) => selectComputationUse(tx, `actor token:${actor.id}`, 0));
    expect(use.reduce((sum, { points }) => sum + points, 0)).toBe(81);
    expect(await write('counter', (tx) => selectLeases(tx, `actor token:${actor.id}`))).toMatchObject({
      count: 0,
    });
  });
});

describe('what a curator sees of a deposit that is being changed', { timeout: 60_000 }, () => {
  it('is the revision: title, system and errors as well', async () => {
    const id = await makeDeposit(cast, 'changes-requested');
    const title = worked(await loadDeposit({ actor: cast.curator, id })).deposit.title;
    const readBody = bodyOf({ title: 'Not yet told', system: 'not-yet-told' });
    worked(await saveDraft({ actor: cast.depositor, id, expected: 'any', readBody }));
    const own = worked(await loadDeposit({ actor: cast.depositor, id }));
    expect(own.deposit).toMatchObject({ title: 'Not yet told', system: 'not-yet-told' });
    expect(own.deposit.errorCount).toBe(own.errors.length);
    for (const actor of [cast.curator, cast.administrator]) {
      const seen = worked(await loadDeposit({ actor, id }));
      expect(seen.deposit).toMatchObject({ title, system: 'alrq-velline', errorCount: 0 });
      expect(depositJson(seen)).not.toMatch(/not.yet.told/i);
    }
  });

  it('bears another ETag than what its laboratory sees; each changes with all that stands in it', async () => {
    const id = await makeDeposit(cast, 'changes-requested');
    const tags = async () => {
      const [own, seen] = [
        worked(await loadDeposit({ actor: cast.depositor, id })),
        worked(await loadDeposit({ actor: cast.curator, id })),
      ];
      return [depositEtag(own), depositEtag(seen)];
    };
    const first = await tags();
    expect(await tags()).toEqual(first);
    expect(first[0]).toMatch(/^"3-w-[\w-]+"$/);
    expect(first[1]).toMatch(/^"3-r1-[\w-]+"$/);
    await write('acknowledged', async (tx) => {
      await tx.update(systems).set({ status: 'proposed' });
    });
    const unlisted = await tags();
    expect(unlisted[0]).not.toBe(first[0]);
    await write('acknowledged', async (tx) => {
      await tx.update(systems).set({ status: 'listed' });
      await tx
        .update(laboratories)
        .set({ name: 'Renamed (invented)' })
        .where(eq(laboratories.id, cast.lab.labId));
    });
    const renamed = await tags();
    expect(renamed[0]).not.toBe(first[0]);
    expect(renamed[1]).not.toBe(first[1]);
  });
});
