import { afterEach, describe, expect, it, vi } from 'vitest';
import { CallFailed, complaintIn, newKey } from '@/components/deposits/call-api';
import {
  createDraft,
  decideOn,
  deleteDraft,
  saveDraft,
  submitDraft,
} from '@/components/deposits/deposit-calls';

afterEach(() => vi.unstubAllGlobals());

function answering(status: number, body: string | null) {
  const fetched = vi.fn(async (_path: string, _init: RequestInit) => new Response(body, { status }));
  vi.stubGlobal('fetch', fetched);
  return () => {
    const [path, { method, headers, body: sent }] = fetched.mock.calls[0];
    return { path, method, headers: headers as Record<string, string>, sent };
  };
}

describe('the calls', () => {
  it('a draft is made for a laboratory, under a key', async () => {
    const call = answering(201, '{"id":"d1"}');
    expect(await createDraft('{"title":1}', 'lab a', 'k')).toEqual({ id: 'd1' });
    expect(call()).toMatchObject({
      path: '/api/v1/deposits?lab=lab%20a',
      method: 'POST',
      sent: '{"title":1}',
    });
    expect(call().headers).toMatchObject({ 'Idempotency-Key': 'k', 'Content-Type': 'application/json' });
  });

  it('a draft is saved over the version that was loaded, its text as it stands', async () => {
    const call = answering(200, '{"version":4}');
    await saveDraft('d1', 3, '{ "a": 1.0 }');
    expect(call()).toMatchObject({ path: '/api/v1/deposits/d1', method: 'PUT', sent: '{ "a": 1.0 }' });
    expect(call().headers['If-Match']).toBe('"3"');
  });

  it('a draft is submitted as the version that was loaded', async () => {
    const call = answering(200, '{}');
    await submitDraft('d1', 3, 'k');
    expect(call()).toMatchObject({ path: '/api/v1/deposits/d1/submission', method: 'POST' });
    expect(call().headers).toEqual({ 'If-Match': '"3"', 'Idempotency-Key': 'k' });
  });

  it('a draft is deleted, which has no answer', async () => {
    const call = answering(204, null);
    expect(await deleteDraft('d1', 3)).toBeUndefined();
    expect(call()).toMatchObject({ method: 'DELETE', headers: { 'If-Match': '"3"' } });
  });

  it('a decision names the revision that was read', async () => {
    const call = answering(200, '{}');
    await decideOn('d1', { kind: 'accepted', letter: '', revision: 2 }, 'k');
    expect(JSON.parse(String(call().sent))).toEqual({ kind: 'accepted', letter: '', revision: 2 });
  });
});

describe('what fails', () => {
  const problem = { type: '/api/v1/problems/stale', title: 'Changed', status: 412, detail: 'Load it again.' };

  it('comes as the server says it', async () => {
    answering(412, JSON.stringify(problem));
    const error = await saveDraft('d1', 3, '{}').catch((thrown: unknown) => thrown);
    expect(error).toBeInstanceOf(CallFailed);
    expect(complaintIn(error)).toMatchObject({ status: 412, title: 'Changed', detail: 'Load it again.' });
  });

  it('is said as well where no server answers, or something else does', async () => {
    answering(502, '<html>');
    expect(complaintIn(await saveDraft('d1', 3, '{}').catch((thrown: unknown) => thrown)).detail).toContain(
      '502',
    );
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('offline')));
    const { status, detail } = complaintIn(await saveDraft('d1', 3, '{}').catch((thrown: unknown) => thrown));
    expect(status).toBe(0);
    expect(detail).toContain('kept');
  });
});

it('every key is another one', () => {
  const keys = new Set(Array.from({ length: 50 }, newKey));
  expect(keys.size).toBe(50);
  for (const key of keys) expect(key).toMatch(/^[0-9a-f]{32}$/);
});
