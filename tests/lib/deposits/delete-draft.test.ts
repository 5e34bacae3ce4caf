import { Readable } from 'node:stream';
import { describe, expect, it } from 'vitest';
import { type Actor, VISITOR } from '@/lib/auth/actor';
import { attachFile } from '@/lib/deposits/attach-file';
import { deleteDraft } from '@/lib/deposits/delete-draft';
import { listDeposits } from '@/lib/deposits/list-deposits';
import { recallDeposit } from '@/lib/deposits/recall-deposit';
import type { DepositState } from '@/lib/deposits/states';
import { getObject } from '@/storage/objects';
import {
  auditOf,
  codeOf,
  makeDeposit,
  makeLab,
  makePerson,
  stored,
  tokenOf,
  worked,
} from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';

const { cast } = collectionForTests({ storage: true });

const remove = (actor: Actor, id: string, expected: readonly number[] | 'any' | null = 'any') =>
  deleteDraft({ actor, id, expected });

describe('deleting a draft', { timeout: 60_000 }, () => {
  it('works: the draft is gone, its files too, the audit trail stays', async () => {
    const id = await makeDeposit(cast);
    const stream = Readable.from([Buffer.from('x')]);
    const { file } = worked(await attachFile({ actor: cast.depositor, id, name: 'x.txt', stream }));
    worked(await remove(cast.token, id, [1]));
    expect(await stored(id)).toBeUndefined();
    await expect(getObject(file.objectKey)).rejects.toThrow();
    expect((await auditOf(id)).at(-1)).toBe('deleted: draft');
    expect(codeOf(await remove(cast.token, id))).toBe('not-found');
  });

  it('works for one that was submitted and recalled before anybody answered', async () => {
    const id = await makeDeposit(cast, 'submitted');
    worked(await recallDeposit({ actor: cast.depositor, id }));
    worked(await remove(cast.depositor, id));
    expect(await stored(id)).toBeUndefined();
  });

  it('needs the version, and refuses a stale one', async () => {
    const id = await makeDeposit(cast);
    expect(codeOf(await remove(cast.depositor, id, null))).toBe('precondition-required');
    expect(codeOf(await remove(cast.depositor, id, [2]))).toBe('stale');
    expect(await stored(id)).toBeDefined();
  });

  it('refuses the wrong role', async () => {
    const id = await makeDeposit(cast);
    expect(codeOf(await remove(VISITOR, id))).toBe('unauthenticated');
    expect(codeOf(await remove(cast.administrator, id))).toBe('not-found');
    expect(codeOf(await remove(tokenOf(cast.lab, 'read-drafts', 'submit'), id))).toBe('forbidden');
    expect(await stored(id)).toBeDefined();
  });

  it('refuses the wrong laboratory', async () => {
    const id = await makeDeposit(cast);
    expect(codeOf(await remove(cast.outsider, id))).toBe('not-found');
    expect(await stored(id)).toBeDefined();
  });

  it.each(['submitted', 'in-review', 'changes-requested', 'published'] as DepositState[])(
    'refuses the wrong state: %s',
    async (state) => {
      const id = await makeDeposit(cast, state);
      expect(codeOf(await remove(cast.depositor, id))).toBe('conflict');
      expect(await stored(id)).toMatchObject({ state });
    },
  );
});

describe('the list of deposits', { timeout: 60_000 }, () => {
  it('shows those of one’s laboratories, page by page, each once', async () => {
    const lab = await makeLab('listing');
    const depositor = await makePerson('depositor', lab);
    const made: string[] = [];
    for (let i = 0; i < 7; i++) made.push(await makeDeposit({ ...cast, depositor }));
    const seen: string[] = [];
    let cursor: string | undefined;
    do {
      const { deposits, next } = worked(
        await listDeposits({ actor: tokenOf(lab, 'read-drafts'), limit: 3, cursor }),
      );
      expect(deposits.length).toBeLessThanOrEqual(3);
      seen.push(...deposits.map(({ id }) => id));
      cursor = next ?? undefined;
    } while (cursor);
    expect(seen.toSorted()).toEqual(made.toSorted());
    expect(worked(await listDeposits({ actor: cast.outsider })).deposits).toEqual([]);
  });

  it('can be narrowed to a state', async () => {
    const lab = await makeLab('narrowing');
    const depositor = await makePerson('depositor', lab);
    await makeDeposit({ ...cast, depositor });
    const submitted = await makeDeposit({ ...cast, depositor }, 'submitted');
    const { deposits } = worked(await listDeposits({ actor: depositor, state: 'submitted' }));
    expect(deposits.map(({ id }) => id)).toEqual([submitted]);
  });

  it('is for those who belong to one, and for cursors that it gave', async () => {
    expect(codeOf(await listDeposits({ actor: VISITOR }))).toBe('unauthenticated');
    expect(codeOf(await listDeposits({ actor: cast.curator }))).toBe('forbidden');
    expect(codeOf(await listDeposits({ actor: tokenOf(cast.lab, 'submit') }))).toBe('forbidden');
    expect(codeOf(await listDeposits({ actor: cast.depositor, cursor: 'made up' }))).toBe('bad-parameter');
  });
});
