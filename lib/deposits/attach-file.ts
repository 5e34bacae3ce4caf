/** The verb that keeps an original file with a draft: streamed to the store, its SHA-256 checked on the way. */
import { createHash } from 'node:crypto';
import type { Readable } from 'node:stream';
import { readDatabase, type Transaction, write } from '@/db/client';
import type { DepositHead, Reader } from '@/db/queries/deposits';
import { countFiles, type FileRow, insertFile } from '@/db/queries/files';
import { auditingRefusals } from '@/lib/audit/audit-refusals';
import { recordAudit } from '@/lib/audit/record';
import { type Actor, actorKey } from '@/lib/auth/actor';
import { newId } from '@/lib/auth/hash-token';
import { failed, type Outcome } from '@/lib/errors';
import { MOST_FILE_BYTES } from '@/lib/serving/body-bounds';
import { earlierOutcome, idempotencyOf, isKeyUsed, once } from '@/lib/serving/idempotency';
import { forgetObjects, keepObject, newObjectKey } from './loose-objects';
import { auditSubject, reachDeposit } from './reach-deposit';
import { isEditable, stateWords } from './states';
import { type StoredUpload, storeUpload } from './store-upload';

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
    const database = await readDatabase();
    const reached = await reachDeposit(database, call.actor, 'attach-file', call.id);
    if (!reached.ok) return reached;
    // A repeated call is answered as the first was, whatever has become of the deposit since.
    if (await isKeyUsed(database, keyOf(call, ''))) return answerRepeated(call);
    const beforehand = await reachForFiles(database, call);
    return beforehand.ok ? storeAndNote(call) : beforehand;
  });
}

/** What the call came to the first time, where the same bytes come again; they are read and not stored. */
async function answerRepeated(call: Attachment): Promise<Attached> {
  const hash = createHash('sha256');
  let size = 0;
  try {
    for await (const chunk of call.stream as AsyncIterable<Buffer>) {
      size += chunk.byteLength;
      if (size > MOST_FILE_BYTES) return failed('file-too-large');
      hash.update(chunk);
    }
  } catch {
    return failed('incomplete-body');
  }
  const sha256 = hash.digest('hex');
  if ((call.sha256 ?? sha256) !== sha256) return failed('digest-mismatch');
  const earlier = await earlierOutcome<Extract<Attached, { ok: true }>>(
    await readDatabase(),
    keyOf(call, sha256),
  );
  return earlier ?? failed('conflict');
}

/** What stands for the call under its key; the key's own hash does not depend on the bytes. */
function keyOf({ actor, id, name, idempotencyKey = null }: Attachment, sha256: string) {
  return idempotencyOf(actor, `attach-file ${id}`, idempotencyKey, name, sha256);
}

async function storeAndNote(call: Attachment): Promise<Attached> {
  const objectKey = await newObjectKey();
  const stored = await storeUpload(call, objectKey);
  const noted = stored.ok ? await noteStored(call, fileOf(call, objectKey, stored)) : stored;
  // Refused, broken off, or kept already by an earlier call under the same key. What throws may have been kept: where
  // it was not, the object is swept as a loose one.
  const isKept = noted.ok && noted.file.objectKey === objectKey;
  if (!isKept) await forgetObjects([objectKey]);
  return noted;
}

function noteStored(call: Attachment, file: FileRow): Promise<Attached> {
  return write('acknowledged', (tx) => note(tx, call, file));
}

function fileOf({ actor, id, name }: Attachment, objectKey: string, stored: StoredUpload): FileRow {
  const { size, sha256, mediaType } = stored;
  return {
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
}

function note(tx: Transaction, call: Attachment, file: FileRow): Promise<Attached> {
  const { actor, id } = call;
  return once(tx, keyOf(call, file.sha256), async () => {
    const reached = await reachForFiles(tx, call);
    if (!reached.ok) return reached;
    if (!(await keepObject(tx, file.objectKey))) return failed('unavailable');
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
