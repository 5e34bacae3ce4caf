/** Original files over HTTP: streamed in and out byte for byte, checked, capped, and never shown by a browser. */
import { createHash, randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { readFile } from 'node:fs/promises';
import { connect } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { closeDatabase } from '@/db/client';
import { fileListSchema, fileSchema } from '@/schemas/file';
import { problemSchema } from '@/schemas/problem';
import { call, sessionHeader, settleIn, tokenHeader } from '@/tests/support/deposit-calls';
import { exampleDocument } from '@/tests/support/example-document';
import { type RunningApp, startApp } from '@/tests/support/start-app';

const MIB = 2 ** 20;
/** Well under the file; what the runtime and the parts on their way may take. */
const MOST_GROWTH_MIB = 70;

let app: RunningApp;
let token: Record<string, string>;
let id: string;
beforeAll(async () => {
  app = await startApp();
  token = await tokenHeader(await settleIn(app));
  id = await newDraft();
});
afterAll(async () => {
  await closeDatabase();
  await app.stop();
});

async function newDraft(): Promise<string> {
  const created = await call(app, 'POST', '/deposits', token, exampleDocument());
  return ((await created.json()) as { id: string }).id;
}

const send = (name: string, bytes: Uint8Array | string, headers: Record<string, string> = {}) =>
  call(
    app,
    'POST',
    `/deposits/${id}/files?name=${encodeURIComponent(name)}`,
    { ...token, ...headers },
    bytes,
  );
const digest = (bytes: Uint8Array | string) =>
  `sha-256=:${createHash('sha256').update(bytes).digest('base64')}:`;

async function codeOf(response: Response): Promise<string> {
  return problemSchema.parse(await response.json()).type.replace('/api/v1/problems/', '');
}

async function listed(): Promise<string[]> {
  const { files } = fileListSchema.parse(
    await (await call(app, 'GET', `/deposits/${id}/files`, token)).json(),
  );
  return files.map(({ name }) => name);
}

describe('a file', () => {
  it('is sent as it is: a form is refused, and so is nothing', async () => {
    const form = new FormData();
    form.set('file', new Blob(['a;b']), 'raw.csv');
    const address = `${app.url}/api/v1/deposits/${id}/files`;
    const refused = await fetch(address, { method: 'POST', headers: token, body: form });
    expect([refused.status, await codeOf(refused)]).toEqual([415, 'not-plain-file']);
    const empty = await send('empty.csv', '');
    expect([empty.status, await codeOf(empty)]).toEqual([422, 'empty-file']);
    expect(await listed()).toEqual([]);
    const list = await call(app, 'GET', `/deposits/${id}/files`, token);
    const etag = list.headers.get('etag') ?? '';
    const same = await call(app, 'GET', `/deposits/${id}/files`, { ...token, 'If-None-Match': etag });
    expect(same.status).toBe(304);
  });

  it('comes back byte for byte, as an attachment that runs nothing', async () => {
    const bytes = randomBytes(11 * MIB + 3);
    const attached = await send('Rohdaten µM "1".bin', bytes, { 'Content-Digest': digest(bytes) });
    expect(attached.status).toBe(201);
    const file = fileSchema.parse(await attached.json());
    expect(attached.headers.get('location')).toBe(file.links.self);
    expect(file).toMatchObject({ name: 'Rohdaten µM "1".bin', size: bytes.length });
    const back = await fetch(`${app.url}${file.links.self}`, { headers: token });
    expect(Buffer.from(await back.arrayBuffer()).equals(bytes)).toBe(true);
    expect(Object.fromEntries(back.headers)).toMatchObject({
      'content-type': 'application/octet-stream',
      'content-disposition': `attachment; filename="Rohdaten _M _1_.bin"; filename*=UTF-8''Rohdaten%20%C2%B5M%20%221%22.bin`,
      'content-security-policy': expect.stringMatching(/default-src 'none'.*; sandbox$/),
      'x-content-type-options': 'nosniff',
      'content-length': String(bytes.length),
      'repr-digest': digest(bytes),
    });
    const etag = back.headers.get('etag') ?? '';
    expect(etag).toMatch(/^"[\w-]{43}"$/);
    const same = await fetch(`${app.url}${file.links.self}`, {
      headers: { ...token, 'If-None-Match': etag },
    });
    expect([same.status, await same.text()]).toEqual([304, '']);
    const head = await fetch(`${app.url}${file.links.self}`, { method: 'HEAD', headers: token });
    expect([head.status, head.headers.get('etag'), await head.text()]).toEqual([200, etag, '']);
  });

  it('that looks like a page is text', async () => {
    const attached = await send('page.html', '<script>alert(1)</script>', { 'Content-Type': 'text/html' });
    const { links } = fileSchema.parse(await attached.json());
    const back = await fetch(`${app.url}${links.self}`, { headers: token });
    expect(back.headers.get('content-type')).toBe('text/plain; charset=utf-8');
    expect(back.headers.get('content-disposition')).toMatch(/^attachment; /);
  });

  it('whose bytes are not those declared is refused and not kept', async () => {
    for (const header of ['Content-Digest', 'Repr-Digest']) {
      const refused = await send('wrong.txt', 'changed on the way', { [header]: digest('as it was') });
      expect([refused.status, await codeOf(refused)]).toEqual([422, 'digest-mismatch']);
    }
    const unreadable = await send('wrong.txt', 'x', { 'Content-Digest': 'sha-256=:short:' });
    expect([unreadable.status, await codeOf(unreadable)]).toEqual([400, 'bad-header']);
    const others = await send('other-algorithm.txt', 'x', { 'Content-Digest': 'sha-512=:AAAA:' });
    expect(others.status).toBe(201);
    expect(await listed()).not.toContain('wrong.txt');
  });

  it.each([
    ['../../etc/passwd', 'passwd'],
    ['C:\\data\\curve.xlsx', 'curve.xlsx'],
    ['a\u202egnp.exe\r\nX: y', 'agnp.exeX: y'],
  ])('called %j is kept as %j', async (name, kept) => {
    expect((await (await send(name, 'x')).json()).name).toBe(kept);
  });

  it('takes its name from Content-Disposition as well, and needs one', async () => {
    const named = await call(
      app,
      'POST',
      `/deposits/${id}/files`,
      {
        ...token,
        'Content-Disposition': `attachment; filename="plain.csv"; filename*=UTF-8''%C3%A9t%C3%A9.csv`,
      },
      'a;b',
    );
    expect((await named.json()).name).toBe('été.csv');
    for (const name of ['', '..', '/']) expect(await codeOf(await send(name, 'x'))).toBe('bad-parameter');
  });

  it('is sent once under an Idempotency-Key', async () => {
    const key = { 'Idempotency-Key': 'one-file' };
    const [first, second] = [await send('once.txt', 'once', key), await send('once.txt', 'once', key)];
    expect(await second.json()).toEqual(await first.json());
    expect((await listed()).filter((name) => name === 'once.txt')).toHaveLength(1);
  });

  it('can be removed while its deposit is a draft, and read by others once it is submitted', async () => {
    const draft = await newDraft();
    const path = `/deposits/${draft}/files`;
    const attach = async (name: string) =>
      fileSchema.parse(await (await call(app, 'POST', `${path}?name=${name}`, token, 'x')).json());
    const [gone, kept] = [await attach('gone.txt'), await attach('kept.txt')];
    expect((await call(app, 'DELETE', `${path}/${gone.id}`, token)).status).toBe(204);
    expect((await call(app, 'GET', `${path}/${gone.id}`, token)).status).toBe(404);
    const curator = (await sessionHeader('curator')).headers;
    expect((await call(app, 'GET', `${path}/${kept.id}`, curator)).status).toBe(404);
    await call(app, 'POST', `/deposits/${draft}/submission`, token);
    expect(await (await call(app, 'GET', `${path}/${kept.id}`, curator)).text()).toBe('x');
    expect((await call(app, 'GET', `${path}/${kept.id}`)).status).toBe(404);
    const late = [
      await call(app, 'DELETE', `${path}/${kept.id}`, token),
      await call(app, 'POST', `${path}?name=late.txt`, token, 'x'),
    ];
    for (const response of late) expect([response.status, await codeOf(response)]).toEqual([409, 'conflict']);
    await call(app, 'POST', `/deposits/${draft}/decision`, curator, { kind: 'accepted' });
    expect(await (await call(app, 'GET', `${path}/${kept.id}`)).text()).toBe('x');
  });
});

async function residentMib(): Promise<number> {
  const status = await readFile(`/proc/${app.process.pid}/status`, 'utf8');
  return Number(/VmRSS:\s+(\d+) kB/.exec(status)?.[1]) / 1024;
}

/** Sends up to `mib` of noise through a bare socket, as fast as it is taken. */
async function sendRaw(mib: number, framing: 'declared' | 'chunked') {
  const { port, hostname } = new URL(app.url);
  const socket = connect(Number(port), hostname);
  let answer = '';
  socket.on('data', (chunk) => {
    answer += chunk.toString();
  });
  const closed = once(socket, 'close').catch(() => undefined);
  socket.on('error', () => undefined);
  const length = framing === 'declared' ? `Content-Length: ${mib * MIB}` : 'Transfer-Encoding: chunked';
  const authorization = `Authorization: ${token.Authorization}`;
  socket.write(
    `POST /api/v1/deposits/${id}/files?name=large.bin HTTP/1.1\r\nHost: ${hostname}:${port}\r\nConnection: close\r\n${authorization}\r\n${length}\r\n\r\n`,
  );
  const piece = randomBytes(MIB);
  const before = await residentMib();
  let peak = before;
  for (let sent = 0; sent < mib && !socket.destroyed; sent++) {
    const framed =
      framing === 'declared' ? piece : Buffer.concat([Buffer.from('100000\r\n'), piece, Buffer.from('\r\n')]);
    if (!socket.write(framed)) await Promise.race([once(socket, 'drain').catch(() => undefined), closed]);
    if (sent % 4 === 0) peak = Math.max(peak, await residentMib());
  }
  if (framing === 'chunked' && !socket.destroyed) socket.write('0\r\n\r\n');
  await closed;
  return { status: Number(/^HTTP\/1\.1 (\d+)/.exec(answer)?.[1]), growthMib: peak - before, answer };
}

describe('a large file', () => {
  it('of 100 MiB is taken with flat memory, its length declared or not', async () => {
    await sendRaw(30, 'declared');
    for (const framing of ['declared', 'chunked'] as const) {
      const { status, growthMib, answer } = await sendRaw(100, framing);
      expect(status).toBe(201);
      expect(answer).toContain(`"size":${100 * MIB}`);
      expect(growthMib).toBeLessThan(MOST_GROWTH_MIB);
    }
  });

  it('of more is refused, with flat memory, and not kept', async () => {
    const before = (await listed()).length;
    for (const framing of ['declared', 'chunked'] as const) {
      const { status, growthMib, answer } = await sendRaw(130, framing);
      expect(status).toBe(413);
      expect(answer).toContain('file-too-large');
      expect(growthMib).toBeLessThan(MOST_GROWTH_MIB);
    }
    expect((await listed()).length).toBe(before);
  });
});
