import { describe, expect, it } from 'vitest';
import { readJsonBody } from '@/lib/serving/read-body';

function request(body: BodyInit | null, headers: Record<string, string> = {}): Request {
  const init = {
    method: 'POST',
    body,
    headers: { 'Content-Type': 'application/json', ...headers },
    duplex: 'half',
  };
  return new Request('http://localhost/', init);
}

/** An endless body that counts what is taken from it. */
function endless(): { stream: ReadableStream<Uint8Array>; taken: () => number } {
  let taken = 0;
  const pull = (controller: ReadableStreamDefaultController<Uint8Array>) => {
    taken += 1000;
    controller.enqueue(new Uint8Array(1000));
  };
  return { stream: new ReadableStream({ pull }), taken: () => taken };
}

describe('reading a body', () => {
  it('gives its bytes', async () => {
    const read = await readJsonBody(request('{"a":"µ"}'));
    expect(read.ok && new TextDecoder().decode(read.bytes)).toBe('{"a":"µ"}');
  });

  it('reads exactly as much as is allowed', async () => {
    expect((await readJsonBody(request('x'.repeat(100)), 100)).ok).toBe(true);
    expect(await readJsonBody(request('x'.repeat(101)), 100)).toEqual({
      ok: false,
      failure: { code: 'body-too-large' },
    });
  });

  it('does not touch a body that declares too much', async () => {
    const { stream, taken } = endless();
    const read = await readJsonBody(request(stream, { 'Content-Length': '20000' }), 10_000);
    expect(read).toEqual({ ok: false, failure: { code: 'body-too-large' } });
    expect(taken()).toBeLessThanOrEqual(1000);
  });

  it('gives up a body without a length as soon as it passes the cap', async () => {
    const { stream, taken } = endless();
    expect((await readJsonBody(request(stream), 10_000)).ok).toBe(false);
    expect(taken()).toBeLessThan(15_000);
  });

  it.each([
    ['text/plain', undefined],
    ['application/x-www-form-urlencoded', undefined],
    ['application/json; charset=latin1', undefined],
    ['application/json', 'gzip'],
    ['', undefined],
  ])('refuses the type %j with encoding %j', async (type, encoding) => {
    const headers = { 'Content-Type': type, ...(encoding ? { 'Content-Encoding': encoding } : {}) };
    expect(await readJsonBody(request('{}', headers))).toEqual({
      ok: false,
      failure: { code: 'not-json-type' },
    });
  });

  it('takes the type with a charset of UTF-8', async () => {
    expect(
      (await readJsonBody(request('{}', { 'Content-Type': 'Application/JSON; charset=UTF-8' }))).ok,
    ).toBe(true);
  });
});
