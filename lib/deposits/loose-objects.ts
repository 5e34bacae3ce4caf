/**
 * Objects that are no file's yet, or no file's any more. Each is noted before it is stored and until it is a file's
 * or gone, so that a kill at any moment leaves nothing in the store that is not swept later.
 */
import { randomBytes } from 'node:crypto';
import { readDatabase, type Transaction, write } from '@/db/client';
import {
  deleteLooseObjects,
  insertLooseObjects,
  selectLooseObjects,
  takeLooseObject,
} from '@/db/queries/loose-objects';
import { log } from '@/lib/log';
import { LONGEST_BODY_MS } from '@/lib/serving/body-bounds';
import { deleteObject } from '@/storage/objects';

/** An upload that takes longer than this has been given up. */
const MOST_LOOSE_MS = 2 * LONGEST_BODY_MS;

/** Objects swept in one go. */
const SWEPT_AT_ONCE = 100;

/** A key to store an object under, noted as loose. */
export async function newObjectKey(): Promise<string> {
  const key = `file-${randomBytes(16).toString('hex')}`;
  await write('acknowledged', (tx) => insertLooseObjects(tx, [key], Date.now()));
  return key;
}

/** Notes that an object is a file's now. Returns whether it may be: not where it has been swept, or will be. */
export function keepObject(tx: Transaction, key: string): Promise<boolean> {
  return takeLooseObject(tx, key, Date.now() - MOST_LOOSE_MS);
}

/** Notes that objects are no file's any more. */
export function loosenObjects(tx: Transaction, keys: string[]): Promise<void> {
  return insertLooseObjects(tx, keys, Date.now());
}

/** Removes loose objects. One that cannot be removed now stays noted and is swept later. */
export async function forgetObjects(keys: string[]): Promise<void> {
  if (keys.length === 0) return;
  const results = await Promise.allSettled(keys.map((key) => deleteObject(key)));
  const gone = keys.filter((_, i) => results[i]?.status === 'fulfilled');
  for (const result of results) {
    if (result.status === 'rejected') log().error({ err: result.reason }, 'an object could not be removed');
  }
  await write('counter', (tx) => deleteLooseObjects(tx, gone));
}

/**
 * The chore that removes what was given up: uploads that a kill cut off, and objects that could not be removed at once.
 *
 * @param now Unix time, ms
 * @returns how many it found
 */
export async function sweepObjects(now = Date.now()): Promise<number> {
  const keys = await selectLooseObjects(await readDatabase(), now - MOST_LOOSE_MS, SWEPT_AT_ONCE);
  await forgetObjects(keys);
  return keys.length;
}
