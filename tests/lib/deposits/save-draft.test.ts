import { describe, expect, it } from 'vitest';
import { type Actor, VISITOR } from '@/lib/auth/actor';
import { loadDeposit } from '@/lib/deposits/load-deposit';
import { saveDraft } from '@/lib/deposits/save-draft';
import type { DepositState } from '@/lib/deposits/states';
import { headAnswer } from '@/lib/deposits/write-answer';
import { createToken } from '@/lib/labs/create-token';
import {
  auditOf,
  bodyOf,
  codeOf,
  makeDeposit,
  makePerson,
  stored,
  tokenOf,
  worked,
} from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';
import { exampleDocument } from '@/tests/support/example-document';

const { cast } = collectionForTests();

const save = (actor: Actor, id: string, value: unknown, expected: readonly number[] | 'any' | null = 'any') =>
  saveDraft({ actor, id, expected, readBody: bodyOf(value) });

describe('saving a draft', { timeout: 60_000 }, () => {
  it('works: the new document byte for byte, the next version, what is wrong beside it', async () => {
    const id = await makeDeposit(cast);
    const { deposit, errors } = worked(await save(cast.token, id, '{"title" : "unfinished"}', [1]));
    expect(deposit).toMatchObject({ version: 2, state: 'draft', title: 'unfinished', system: '' });
    expect(errors.map(({ pointer }) => pointer)).toContain('/format');
    const loaded = worked(await loadDeposit({ actor: cast.depositor, id }));
    expect(loaded.document).toBe('{"title" : "unfinished"}');
    expect(loaded.errors).toEqual(expect.arrayContaining(errors));
    expect(loaded.errors.map(({ pointer }) => pointer)).toContain('/system');
    expect(await auditOf(id)).toEqual(['created: draft', 'saved: version 2']);
  });

  it('needs the version, and refuses a stale one', async () => {
    const id = await makeDeposit(cast);
    expect(codeOf(await save(cast.depositor, id, {}, null))).toBe('precondition-required');
    worked(await save(cast.depositor, id, { title: 'kept' }, [1]));
    const late = await save(cast.token, id, { title: 'late' }, [1]);
    expect(codeOf(late)).toBe('stale');
    // It says who was quicker, and when.
    expect(late.ok || late.failure.detail).toMatch(
      new RegExp(`^Version 2 was saved by ${cast.depositor.name} on \\d{4}-\\d\\d-\\d\\d \\d\\d:\\d\\d UTC;`),
    );
    expect(await stored(id)).toMatchObject({ version: 2, title: 'kept' });
  });

  it('names its own people and tokens as those who saved it, and no curator', async () => {
    const savedBy = async (id: string) =>
      headAnswer(worked(await loadDeposit({ actor: cast.depositor, id })).deposit).updatedBy;
    const id = await makeDeposit(cast);
    expect(await savedBy(id)).toBe(cast.depositor.name);
    const manager = await makePerson('depositor', { ...cast.lab, role: 'manager' });
    const input = { name: 'plate reader', scopes: ['write-drafts'], days: 1 };
    const token = worked(await createToken(manager, cast.lab.labId, input));
    worked(await save({ ...tokenOf(cast.lab, 'write-drafts'), id: token.id }, id, {}));
    expect(await savedBy(id)).toBe('the token “plate reader”');
    expect(await savedBy(await makeDeposit(cast, 'changes-requested'))).toBeNull();
    const own = await makeDeposit({ ...cast, depositor: cast.ownCurator });
    expect(await savedBy(own)).toBe(cast.ownCurator.name);
  });

  it('refuses the wrong role: a curator learns nothing of a draft, a reading token may not write', async () => {
    const id = await makeDeposit(cast);
    expect(codeOf(await save(VISITOR, id, {}))).toBe('unauthenticated');
    expect(codeOf(await save(VISITOR, 'nothing', {}))).toBe('unauthenticated');
    expect(codeOf(await save(cast.curator, id, {}))).toBe('not-found');
    expect(codeOf(await save(cast.administrator, id, {}))).toBe('not-found');
    expect(codeOf(await save(tokenOf(cast.lab, 'read-drafts'), id, {}))).toBe('forbidden');
    const submitted = await makeDeposit(cast, 'submitted');
    expect(codeOf(await save(cast.curator, submitted, {}))).toBe('forbidden');
    expect(await stored(id)).toMatchObject({ version: 1 });
    expect(await auditOf(id)).toEqual(['created: draft', ...Array(4).fill('refused: edit-deposit')]);
  });

  it('refuses the wrong laboratory, to which there is no such draft', async () => {
    const id = await makeDeposit(cast);
    const outside = [cast.outsider, tokenOf(cast.otherLab, 'read-drafts', 'write-drafts')];
    for (const actor of outside) expect(codeOf(await save(actor, id, {}))).toBe('not-found');
    expect(codeOf(await save(cast.outsider, 'nothing', {}))).toBe('not-found');
    expect(await stored(id)).toMatchObject({ version: 1 });
  });

  it.each(['submitted', 'in-review', 'published', 'declined', 'withdrawn'] as DepositState[])(
    'refuses the wrong state: %s',
    async (state) => {
      const id = await makeDeposit(cast, state);
      const before = await stored(id);
      expect(codeOf(await save(cast.depositor, id, {}))).toBe('conflict');
      expect(await stored(id)).toEqual(before);
    },
  );

  it('works again once changes were asked for', async () => {
    const id = await makeDeposit(cast, 'changes-requested');
    worked(await save(cast.depositor, id, { ...exampleDocument(), title: 'second try' }));
    expect(await stored(id)).toMatchObject({ state: 'changes-requested', title: 'second try' });
  });

  it('loses no update of sixteen parallel writers', async () => {
    const id = await makeDeposit(cast, 'draft', { count: 0 });
    const increment = async (): Promise<number> => {
      for (let attempts = 1; ; attempts++) {
        const { document, deposit } = worked(await loadDeposit({ actor: cast.depositor, id }));
        const { count } = JSON.parse(document) as { count: number };
        const saved = await save(cast.depositor, id, { count: count + 1 }, [deposit.version]);
        if (saved.ok) return attempts;
        expect(saved.failure.code).toBe('stale');
      }
    };
    const attempts = await Promise.all(Array.from({ length: 16 }, increment));
    expect(JSON.parse((await stored(id))?.document ?? '')).toEqual({ count: 16 });
    expect((await stored(id))?.version).toBe(17);
    // Some of them met one another, else this test would show nothing.
    expect(Math.max(...attempts)).toBeGreaterThan(1);
  });
});
