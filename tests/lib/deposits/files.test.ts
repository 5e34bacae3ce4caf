import { createHash, randomBytes } from 'node:crypto';
import { readdir } from 'node:fs/promises';
import path from 'node:path';
import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { describe, expect, it, vi } from 'vitest';
import { type Actor, VISITOR } from '@/lib/auth/actor';
import { acceptDeposit } from '@/lib/curation/accept-deposit';
import { askForChanges } from '@/lib/curation/ask-for-changes';
import { attachFile } from '@/lib/deposits/attach-file';
import { detectMediaType } from '@/lib/deposits/detect-media-type';
import { listFiles, openFile } from '@/lib/deposits/open-file';
import { removeFile } from '@/lib/deposits/remove-file';
import type { DepositState } from '@/lib/deposits/states';
import { submitDeposit } from '@/lib/deposits/submit-deposit';
import { codeOf, forceState, makeDeposit, tokenOf, worked } from '@/tests/support/collection';
import { collectionForTests } from '@/tests/support/collection-test';

/** Of the writes that attach a file, so many lose their answer after the commit. */
const losing = { answers: 0 };
vi.mock('@/db/client', async (original) => {
  const client = await original<typeof import('@/db/client')>();
  const write: typeof client.write = async (durability, work) => {
    const outcome = await client.write(durability, work);
    const attached = outcome !== null && typeof outcome === 'object' && 'file' in outcome;
    if (attached && losing.answers-- > 0) throw new Error('The answer was lost.');
    return outcome;
  };
  return { ...client, write };
});

const { cast, dataDir } = collectionForTests({ storage: true });

const sha256 = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');

const attach = (actor: Actor, id: string, bytes = Buffer.from('x'), more: Record<string, string> = {}) =>
  attachFile({ actor, id, name: 'raw data.csv', stream: Readable.from([bytes]), ...more });

async function objectCount(): Promise<number> {
  const names = await readdir(path.join(dataDir(), 'objects'), { recursive: true });
  return names.filter((name) => name.endsWith('_object')).length;
}

describe('attaching a file', { timeout: 60_000 }, () => {
  it('works: the bytes come back as they were', async () => {
    const id = await makeDeposit(cast);
    const bytes = randomBytes(6_000_001);
    const { file } = worked(await attach(cast.token, id, bytes, { sha256: sha256(bytes) }));
    expect(file).toMatchObject({ name: 'raw data.csv', size: bytes.length, sha256: sha256(bytes) });
    const opened = worked(await openFile({ actor: cast.depositor, id, fileId: file.id }));
    expect((await buffer(await opened.open())).equals(bytes)).toBe(true);
    expect(worked(await listFiles({ actor: cast.depositor, id })).files).toEqual([file]);
  });

  it('refuses bytes that are not those declared, and keeps nothing of them', async () => {
    const id = await makeDeposit(cast);
    const before = await objectCount();
    const outcome = await attach(cast.token, id, Buffer.from('changed'), {
      sha256: sha256(Buffer.from('sent')),
    });
    expect(codeOf(outcome)).toBe('digest-mismatch');
    expect(worked(await listFiles({ actor: cast.token, id })).files).toEqual([]);
    expect(await objectCount()).toBe(before);
  });

  it('keeps nothing of a body that breaks off', async () => {
    const id = await makeDeposit(cast);
    const before = await objectCount();
    async function* breaking() {
      yield randomBytes(100);
      throw new Error('gone');
    }
    const stream = Readable.from(breaking());
    expect(codeOf(await attachFile({ actor: cast.token, id, name: 'x', stream }))).toBe('incomplete-body');
    expect(await objectCount()).toBe(before);
  });

  it('keeps one file of calls under one key', async () => {
    const id = await makeDeposit(cast);
    const before = await objectCount();
    const send = () => attach(cast.token, id, Buffer.from('once'), { idempotencyKey: 'file-once' });
    const files = [
      worked(await send()),
      worked(await send()),
      ...(await Promise.all([send(), send()])).map(worked),
    ];
    expect(new Set(files.map(({ file }) => file.id)).size).toBe(1);
    expect(await objectCount()).toBe(before + 1);
    const other = await attach(cast.token, id, Buffer.from('other'), { idempotencyKey: 'file-once' });
    expect(codeOf(other)).toBe('idempotency-mismatch');
    expect(await objectCount()).toBe(before + 1);
  });

  it('answers a repeated call as the first, also after the submission', async () => {
    const id = await makeDeposit(cast);
    const send = (text: string, more = {}) =>
      attach(cast.token, id, Buffer.from(text), { idempotencyKey: 'before submission', ...more });
    const first = worked(await send('the same'));
    worked(await submitDeposit({ actor: cast.depositor, id }));
    const before = await objectCount();
    expect(worked(await send('the same'))).toEqual(first);
    expect(codeOf(await send('another'))).toBe('idempotency-mismatch');
    expect(codeOf(await send('the same', { sha256: sha256(Buffer.from('another')) }))).toBe(
      'digest-mismatch',
    );
    expect(codeOf(await send('the same', { idempotencyKey: 'a new one' }))).toBe('conflict');
    expect(await objectCount()).toBe(before);
  });

  it('refuses the wrong role', async () => {
    const id = await makeDeposit(cast, 'submitted');
    expect(codeOf(await attach(VISITOR, id))).toBe('unauthenticated');
    expect(codeOf(await attach(cast.curator, id))).toBe('forbidden');
    expect(codeOf(await attach(tokenOf(cast.lab, 'read-drafts'), await makeDeposit(cast)))).toBe('forbidden');
  });

  it('refuses the wrong laboratory', async () => {
    expect(codeOf(await attach(cast.outsider, await makeDeposit(cast)))).toBe('not-found');
  });

  it.each(['submitted', 'in-review', 'published', 'withdrawn'] as DepositState[])(
    'refuses the wrong state: %s',
    async (state) => {
      expect(codeOf(await attach(cast.depositor, await makeDeposit(cast, state)))).toBe('conflict');
    },
  );

  it('keeps nothing where the deposit is submitted while the file arrives', async () => {
    const id = await makeDeposit(cast);
    const before = await objectCount();
    async function* slowly() {
      yield Buffer.from('first half, ');
      worked(await submitDeposit({ actor: cast.depositor, id }));
      yield Buffer.from('second half');
    }
    const stream = Readable.from(slowly());
    expect(codeOf(await attachFile({ actor: cast.token, id, name: 'x', stream }))).toBe('conflict');
    expect(await objectCount()).toBe(before);
  });
});

describe('removing a file', { timeout: 60_000 }, () => {
  const withFile = async () => {
    const id = await makeDeposit(cast);
    return { id, fileId: worked(await attach(cast.depositor, id)).file.id };
  };

  it('works', async () => {
    const place = await withFile();
    const before = await objectCount();
    worked(await removeFile({ actor: cast.token, ...place }));
    expect(codeOf(await openFile({ actor: cast.token, ...place }))).toBe('not-found');
    expect(await objectCount()).toBe(before - 1);
  });

  it('refuses the wrong role and the wrong laboratory', async () => {
    const place = await withFile();
    expect(codeOf(await removeFile({ actor: VISITOR, ...place }))).toBe('unauthenticated');
    expect(codeOf(await removeFile({ actor: tokenOf(cast.lab, 'submit'), ...place }))).toBe('forbidden');
    expect(codeOf(await removeFile({ actor: cast.outsider, ...place }))).toBe('not-found');
    const elsewhere = { id: await makeDeposit(cast), fileId: place.fileId };
    expect(codeOf(await removeFile({ actor: cast.depositor, ...elsewhere }))).toBe('not-found');
    worked(await openFile({ actor: cast.depositor, ...place }));
  });

  it.each(['submitted', 'changes-requested', 'published'] as DepositState[])(
    'refuses the wrong state: %s',
    async (state) => {
      const place = await withFile();
      await forceState(place.id, state);
      expect(codeOf(await removeFile({ actor: cast.depositor, ...place }))).toBe('conflict');
    },
  );
});

describe('reading a file', { timeout: 60_000 }, () => {
  it('is for the laboratory; for a curator once it is submitted; for anybody once it is published', async () => {
    const id = await makeDeposit(cast);
    const { file } = worked(await attach(cast.depositor, id));
    const open = async (actor: Actor) => {
      const opened = await openFile({ actor, id, fileId: file.id });
      return opened.ok ? 'open' : opened.failure.code;
    };
    const all = async () => [
      await open(cast.depositor),
      await open(cast.curator),
      await open(cast.outsider),
      await open(VISITOR),
    ];
    expect(await all()).toEqual(['open', 'not-found', 'not-found', 'not-found']);
    worked(await submitDeposit({ actor: cast.depositor, id }));
    expect(await all()).toEqual(['open', 'open', 'not-found', 'not-found']);
    worked(await acceptDeposit({ actor: cast.curator, id }));
    expect(await all()).toEqual(['open', 'open', 'open', 'open']);
  });
});

describe('files that came after a submission', { timeout: 60_000 }, () => {
  it('are seen by the laboratory alone, until they are submitted and published as well', async () => {
    const id = await makeDeposit(cast);
    const { file: first } = worked(await attach(cast.depositor, id));
    worked(await submitDeposit({ actor: cast.depositor, id }));
    worked(await askForChanges({ actor: cast.curator, id, letter: 'Please add.' }));
    await new Promise((resolve) => setTimeout(resolve, 5));
    const { file: second } = worked(await attach(cast.depositor, id, Buffer.from('y')));
    const seen = async (actor: Actor) => {
      const { files } = worked(await listFiles({ actor, id }));
      const opened = await openFile({ actor, id, fileId: second.id });
      return [...files.map((file) => file.id), opened.ok];
    };
    expect(await seen(cast.depositor)).toEqual([first.id, second.id, true]);
    for (const actor of [cast.curator, cast.administrator])
      expect(await seen(actor)).toEqual([first.id, false]);
    // As if only the first revision were published.
    await forceState(id, 'published');
    expect(codeOf(await openFile({ actor: VISITOR, id, fileId: first.id }))).toBe('not-found');
    await forceState(id, 'changes-requested');
    worked(await submitDeposit({ actor: cast.depositor, id }));
    expect(await seen(cast.curator)).toEqual([first.id, second.id, true]);
    worked(await acceptDeposit({ actor: cast.curator, id }));
    expect(await seen(VISITOR)).toEqual([first.id, second.id, true]);
  });
});

describe('an upload', { timeout: 60_000 }, () => {
  it('of nothing is refused, and nothing of it is kept', async () => {
    const id = await makeDeposit(cast);
    const before = await objectCount();
    expect(codeOf(await attach(cast.depositor, id, Buffer.alloc(0)))).toBe('empty-file');
    expect(await objectCount()).toBe(before);
  });

  it('keeps its object where the commit was made and its answer lost', async () => {
    const id = await makeDeposit(cast);
    const before = await objectCount();
    losing.answers = 1;
    await expect(attach(cast.depositor, id, Buffer.from('kept'))).rejects.toThrow('The answer was lost.');
    const { files } = worked(await listFiles({ actor: cast.depositor, id }));
    expect(files).toHaveLength(1);
    const { open } = worked(await openFile({ actor: cast.depositor, id, fileId: files[0]?.id ?? '' }));
    expect((await buffer(await open())).toString()).toBe('kept');
    expect(await objectCount()).toBe(before + 1);
  });
});

describe('the media type', () => {
  it.each([
    ['%PDF-1.7 …', 'application/pdf'],
    ['PK\x03\x04rest', 'application/zip'],
    ['<html><script>', 'text/plain; charset=utf-8'],
    ['c;a\n1;0,5\n', 'text/plain; charset=utf-8'],
    ['', 'application/octet-stream'],
    ['MZ\x00\x01', 'application/octet-stream'],
  ])('of %j is judged by its bytes', (head, type) => {
    expect(detectMediaType(Buffer.from(head, 'latin1'))).toBe(type);
  });

  it('is text also where the first bytes end within a character', () => {
    expect(detectMediaType(Buffer.from('µM', 'utf8').subarray(0, 1))).toBe('text/plain; charset=utf-8');
    expect(detectMediaType(Buffer.from([0x61, 0xff, 0x62]))).toBe('application/octet-stream');
  });
});
