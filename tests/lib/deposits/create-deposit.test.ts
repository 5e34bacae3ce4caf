import { describe, expect, it } from 'vitest';
import { VISITOR } from '@/lib/auth/actor';
import { createDeposit } from '@/lib/deposits/create-deposit';
import { listDeposits } from '@/lib/deposits/list-deposits';
import { listDepositsWithCounts } from '@/lib/deposits/list-deposits-with-counts';
import { loadDeposit } from '@/lib/deposits/load-deposit';
import { saveDraft } from '@/lib/deposits/save-draft';
import {
  auditOf,
  bodyOf,
  codeOf,
  listSystem,
  makeLab,
  makePerson,
  stored,
  tokenOf,
  worked,
} from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';
import { exampleDocument } from '@/tests/support/example-document';

const { cast } = collectionForTests();

const valid = bodyOf(exampleDocument());

describe('creating a deposit', { timeout: 30_000 }, () => {
  it('works: a draft of the laboratory, kept byte for byte', async () => {
    const text = `  {"format": "curvekeep-dataset/1",\n\t"title": "Zażółć \\u00e9 𝛿",  "x": 1.50, "x": 2e0 }\n`;
    const { deposit, errors } = worked(
      await createDeposit({ actor: cast.depositor, lab: null, readBody: bodyOf(text) }),
    );
    expect(deposit).toMatchObject({
      state: 'draft',
      version: 1,
      title: 'Zażółć é 𝛿',
      labSlug: cast.lab.labSlug,
    });
    expect(errors.map(({ pointer }) => pointer)).toContain('/x');
    expect(deposit.errorCount).toBe(errors.length);
    const row = await stored(deposit.id);
    expect(row?.document).toBe(text);
    expect(row?.createdBy).toBe(`person:${cast.depositor.id}`);
    expect(await auditOf(deposit.id)).toEqual(['created: draft']);
  });

  it('keeps a title that lists can show: no control character, cut between characters', async () => {
    const titled = async (title: string) => {
      const text = `{"title": ${JSON.stringify(title)}, "system": "a\\u0000b"}`;
      const made = await createDeposit({ actor: cast.token, lab: null, readBody: bodyOf(text) });
      const { deposit } = worked(made);
      expect((await stored(deposit.id))?.document).toBe(text);
      expect(deposit.system).toBe('a b');
      return deposit.title;
    };
    expect(await titled('Before\u0000after\nnext')).toBe('Before after next');
    expect(await titled(`${'x'.repeat(299)}𝛿y`)).toBe(`${'x'.repeat(299)}𝛿`);
    expect(await titled('half \ud800')).toBe('half');
  });

  it('counts a system that is not listed among what is wrong, in every answer', async () => {
    const unlisted = bodyOf({ ...exampleDocument(), system: 'nobody-knows' });
    const created = worked(await createDeposit({ actor: cast.token, lab: null, readBody: unlisted }));
    const { id } = created.deposit;
    const saved = worked(await saveDraft({ actor: cast.token, id, expected: 'any', readBody: unlisted }));
    const loaded = worked(await loadDeposit({ actor: cast.token, id }));
    const { deposits } = worked(await listDepositsWithCounts({ actor: cast.token, limit: 100 }));
    for (const { deposit, errors } of [created, saved, loaded]) {
      expect(errors.map(({ pointer }) => pointer)).toEqual(['/system']);
      expect(deposit.errorCount).toBe(1);
    }
    expect(deposits.find((one) => one.id === id)?.errorCount).toBe(1);
    await listSystem('nobody-knows');
    expect(worked(await loadDeposit({ actor: cast.token, id }))).toMatchObject({
      errors: [],
      deposit: { errorCount: 0 },
    });
    // Told once, not twice.
    const bad = bodyOf({ ...exampleDocument(), system: 'No Slug' });
    const both = worked(await saveDraft({ actor: cast.token, id, expected: 'any', readBody: bad }));
    expect(both.errors.map(({ pointer }) => pointer)).toEqual(['/system']);
    expect(both.deposit.errorCount).toBe(1);
  });

  it('works with a token, for its laboratory', async () => {
    const { deposit, errors } = worked(
      await createDeposit({ actor: cast.token, lab: null, readBody: valid }),
    );
    expect(deposit).toMatchObject({
      labId: cast.lab.labId,
      createdBy: `token:${cast.token.id}`,
      system: 'alrq-velline',
    });
    expect(errors).toEqual([]);
  });

  it('pays no heed to state, role and lab in the document', async () => {
    const sly = {
      ...exampleDocument(),
      state: 'published',
      role: 'curator',
      lab: cast.otherLab.labSlug,
      labId: 'x',
    };
    const { deposit } = worked(await createDeposit({ actor: cast.token, lab: null, readBody: bodyOf(sly) }));
    expect(deposit).toMatchObject({ labId: cast.lab.labId, state: 'draft', accession: null });
  });

  it('refuses who has no laboratory, and a token without the scope', async () => {
    const create = (actor: Parameters<typeof createDeposit>[0]['actor']) =>
      createDeposit({ actor, lab: null, readBody: valid });
    expect(codeOf(await create(VISITOR))).toBe('unauthenticated');
    expect(codeOf(await create(cast.curator))).toBe('forbidden');
    expect(codeOf(await create(tokenOf(cast.lab, 'read-drafts', 'submit')))).toBe('forbidden');
  });

  it('refuses another laboratory than one of one’s own', async () => {
    for (const actor of [cast.depositor, cast.token]) {
      const lab = cast.otherLab.labSlug;
      expect(codeOf(await createDeposit({ actor, lab, readBody: valid }))).toBe('forbidden');
      expect(codeOf(await createDeposit({ actor, lab: 'nowhere', readBody: valid }))).toBe('forbidden');
    }
  });

  it('asks a person of several laboratories which', async () => {
    const [first, second] = [await makeLab('first'), await makeLab('second')];
    const actor = await makePerson('depositor', first, second);
    const unclear = await createDeposit({ actor, lab: null, readBody: valid });
    expect(codeOf(unclear)).toBe('choose-laboratory');
    expect(unclear.ok || unclear.failure.detail).toContain('first, second');
    const { deposit } = worked(await createDeposit({ actor, lab: 'second', readBody: valid }));
    expect(deposit.labSlug).toBe('second');
  });

  it.each([
    ['not JSON', '{"title": ', 'malformed-json'],
    ['an array', '[]', 'invalid-document'],
    ['null', 'null', 'invalid-document'],
    ['a number', '1', 'invalid-document'],
  ])('refuses %s', async (_, text, code) => {
    expect(codeOf(await createDeposit({ actor: cast.token, lab: null, readBody: bodyOf(text) }))).toBe(code);
  });

  it('refuses bytes that are not UTF-8', async () => {
    const bytes = new Uint8Array([0x7b, 0x22, 0xff, 0x22, 0x3a, 0x31, 0x7d]);
    const outcome = await createDeposit({
      actor: cast.token,
      lab: null,
      readBody: async () => ({ ok: true, bytes }),
    });
    expect(codeOf(outcome)).toBe('malformed-json');
  });
});

describe('an Idempotency-Key', { timeout: 30_000 }, () => {
  const count = async () => worked(await listDeposits({ actor: cast.token, limit: 100 })).deposits.length;

  it('makes one deposit of any number of calls, one after the other or at once', async () => {
    const before = await count();
    const create = () =>
      createDeposit({ actor: cast.token, lab: null, readBody: valid, idempotencyKey: 'again' });
    const first = worked(await create());
    expect(worked(await create())).toEqual(first);
    expect(await count()).toBe(before + 1);
    const atOnce = await Promise.all(
      Array.from({ length: 8 }, () =>
        createDeposit({ actor: cast.token, lab: null, readBody: valid, idempotencyKey: 'at-once' }),
      ),
    );
    expect(new Set(atOnce.map((outcome) => worked(outcome).deposit.id)).size).toBe(1);
    expect(await count()).toBe(before + 2);
  });

  it('with another body is refused, and nothing is made', async () => {
    const create = (readBody: typeof valid) =>
      createDeposit({ actor: cast.token, lab: null, readBody, idempotencyKey: 'other-body' });
    worked(await create(valid));
    const before = await count();
    expect(codeOf(await create(bodyOf({ title: 'another' })))).toBe('idempotency-mismatch');
    expect(await count()).toBe(before);
  });

  it('belongs to one actor', async () => {
    const create = (actor: typeof cast.token | typeof cast.depositor) =>
      createDeposit({ actor, lab: null, readBody: valid, idempotencyKey: 'shared' });
    const [byToken, byPerson] = [worked(await create(cast.token)), worked(await create(cast.depositor))];
    expect(byToken.deposit.id).not.toBe(byPerson.deposit.id);
  });

  it('of a call that failed can be used again', async () => {
    const create = (readBody: typeof valid) =>
      createDeposit({ actor: cast.token, lab: null, readBody, idempotencyKey: 'mended' });
    expect(codeOf(await create(bodyOf('[')))).toBe('malformed-json');
    worked(await create(valid));
  });
});
