/** The verb that keeps an original file with a draft: streamed to the store, its SHA-256 checked on the way. */
import { randomBytes } from 'node:crypto';
import { Readable } from 'node:stream';
import { readDatabase, type Transaction, write } from '@/db/client';
import type { DepositHead, Reader } from '@/db/queries/deposits';
import { countFiles, type FileRow, insertFile } from '@/db/queries/files';
import { recordAudit } from '@/lib/audit/record';
import { type Actor, actorKey } from '@/lib/auth/actor';
import { newId } from '@/lib/auth/hash-token';
import { failed, type Outcome } from '@/lib/errors';
import { log } from '@/lib/log';
import { MOST_FILE_BYTES } from '@/lib/serving/body-bounds';
import { idempotencyOf, once } from '@/lib/serving/idempotency';
import { ObjectTooLarge, putObject } from '@/storage/objects';
import { detectMediaType, HEAD_BYTES } from './detect-media-type';
import { forgetObjects } from './forget-objects';
import { auditingRefusals, auditSubject, reachDeposit } from './reach-deposit';
import { isEditable, stateWords } from './states';

/** Most files of one deposit. */
const MOST_FILES = 100;

export interface Attachment {
  actor: Actor;
  id: string;
  /** as `cleanFileName` gives it */
  name: string;
  stream: Readable;
  /** SHA-256 that the sender declares, hex; null or left out where none */
  sha256?: string | null;
  idempotencyKey?: string | null;
}

type Attached = Outcome<{ file: FileRow }>;

/** Keeps a file of at most 100 MiB. */
export function attachFile(call: Attachment): Promise<Attached> {
  const refusal = { actor: call.actor, action: 'attach-file', subject: auditSubject(call.id) } as const;
  return auditingRefusals(refusal, async () => {
    const beforehand = await reachForFiles(await readDatabase(), call);
    return beforehand.ok ? storeAndNote(call) : beforehand;
  });
}

async function storeAndNote(call: Attachment): Promise<Attached> {
  const objectKey = `file-${randomBytes(16).toString('hex')}`;
  const stored = await store(call, objectKey);
  if (!stored.ok) return stored;
  const { size, sha256, mediaType } = stored;
  const { actor, id, name } = call;
  const file: FileRow = {
    id: newId(),
    depositId: id,
    name,
    size,
    sha256,
    mediaType,
    objectKey,
    uploadedBy: actorKey(actor),
    uploadedAt: Date.now(),
  };
  let kept = false;
  try {
    const noted = await write('acknowledged', (tx) => note(tx, call, file));
    kept = noted.ok && noted.file.objectKey === objectKey;
    return noted;
  } finally {
    // Refused, or kept already by an earlier call under the same key.
    if (!kept) await forgetObjects([objectKey]);
  }
}

async function store(
  { stream, sha256: declared = null }: Attachment,
  objectKey: string,
): Promise<Outcome<{ size: number; sha256: string; mediaType: string }>> {
  const head = headOf(stream);
  try {
    const stored = await putObject(objectKey, Readable.from(head.passing()), MOST_FILE_BYTES);
    if (declared === null || declared === stored.sha256) {
      return { ok: true, ...stored, mediaType: detectMediaType(head.bytes()) };
    }
    await forgetObjects([objectKey]);
    return failed('digest-mismatch');
  } catch (error) {
    if (error instanceof ObjectTooLarge) return failed('file-too-large');
    if (head.brokeOff()) return failed('incomplete-body');
    log().error({ err: error }, 'a file could not be stored');
    return failed('unavailable');
  }
}

/** Hands a stream on and keeps its first bytes, and whether it was the stream itself that broke. */
function headOf(stream: Readable) {
  const pieces: Buffer[] = [];
  let length = 0;
  let broke = false;
  async function* passing(): AsyncGenerator<Buffer> {
    try {
      for await (const chunk of stream as AsyncIterable<Buffer>) {
        if (length < HEAD_BYTES) pieces.push(Buffer.from(chunk.subarray(0, HEAD_BYTES - length)));
        length += chunk.byteLength;
        yield chunk;
      }
    } catch (error) {
      broke = true;
      throw error;
    }
  }
  return { passing, bytes: () => Buffer.concat(pieces), brokeOff: () => broke };
}

function note(tx: Transaction, call: Attachment, file: FileRow): Promise<Attached> {
  const { actor, id, idempotencyKey = null } = call;
  const idempotency = idempotencyOf(actor, `attach-file ${id}`, idempotencyKey, file.name, file.sha256);
  return once(tx, idempotency, async () => {
    const reached = await reachForFiles(tx, call);
    if (!reached.ok) return reached;
    await insertFile(tx, file);
    const detail = `${file.id} sha256 ${file.sha256}`;
    await recordAudit(tx, { actor, action: 'file-attached', subject: auditSubject(id), detail });
    return { ok: true, file };
  });
}

async function reachForFiles(
  reader: Reader,
  { actor, id }: Attachment,
): Promise<Outcome<{ deposit: DepositHead }>> {
  const reached = await reachDeposit(reader, actor, 'attach-file', id);
  if (!reached.ok) return reached;
  const { state } = reached.deposit;
  if (!isEditable(state)) {
    return failed('conflict', `The deposit is ${stateWords(state)}; files can be added to a draft only.`);
  }
  return (await countFiles(reader, id)) < MOST_FILES
    ? reached
    : failed('conflict', `A deposit may have at most ${MOST_FILES} files; put several into one archive.`);
}
