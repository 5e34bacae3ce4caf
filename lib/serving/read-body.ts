/** Reads a request's body into memory up to a cap and not a byte further. */
import type { Failure } from '@/lib/errors';

/** Most bytes of a document, 8 MiB. */
export const MOST_BODY_BYTES = 8 * 1024 * 1024;

export type BodyResult = { ok: true; bytes: Uint8Array<ArrayBuffer> } | { ok: false; failure: Failure };

/**
 * The bytes of a JSON body. A body that declares more than `mostBytes` is not read at all; one that declares no
 * length is given up as soon as it passes them.
 */
export async function readJsonBody(request: Request, mostBytes = MOST_BODY_BYTES): Promise<BodyResult> {
  if (!isPlainJson(request.headers)) return { ok: false, failure: { code: 'not-json-type' } };
  if (declaredBytes(request.headers) > mostBytes) return { ok: false, failure: { code: 'body-too-large' } };
  try {
    return await collect(request.body, mostBytes);
  } catch {
    return { ok: false, failure: { code: 'incomplete-body' } };
  }
}

/** The length that a request declares, or 0 where it declares none. */
export function declaredBytes(headers: Headers): number {
  return Number(headers.get('content-length') ?? 0);
}

function isPlainJson(headers: Headers): boolean {
  const [type = '', ...parameters] = (headers.get('content-type') ?? '').toLowerCase().split(';');
  const charset = parameters.find((parameter) => parameter.trim().startsWith('charset='));
  const encoding = headers.get('content-encoding') ?? 'identity';
  const utf8 = charset === undefined || /^\s*charset="?utf-?8"?\s*$/.test(charset);
  return type.trim() === 'application/json' && utf8 && encoding === 'identity';
}

async function collect(body: ReadableStream<Uint8Array> | null, mostBytes: number): Promise<BodyResult> {
  const reader = body?.getReader();
  const chunks: Uint8Array[] = [];
  let length = 0;
  for (let read = await reader?.read(); read && !read.done; read = await reader?.read()) {
    length += read.value.byteLength;
    if (length > mostBytes) {
      // What was read is dropped; not awaited, since the rest may never come.
      reader?.cancel().catch(() => undefined);
      return { ok: false, failure: { code: 'body-too-large' } };
    }
    chunks.push(read.value);
  }
  return { ok: true, bytes: joined(chunks, length) };
}

function joined(chunks: Uint8Array[], length: number): Uint8Array<ArrayBuffer> {
  const bytes = new Uint8Array(length);
  let offset = 0;
  for (const chunk of chunks) {
    bytes.set(chunk, offset);
    offset += chunk.byteLength;
  }
  return bytes;
}
