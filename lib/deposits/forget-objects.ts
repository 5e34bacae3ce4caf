/** Removes the bytes of files whose rows are gone. */
import { log } from '@/lib/log';
import { deleteObject } from '@/storage/objects';

/** Removes objects. One that cannot be removed stays behind unseen: nothing points to it any more. */
export async function forgetObjects(keys: string[]): Promise<void> {
  const removed = await Promise.allSettled(keys.map((key) => deleteObject(key)));
  for (const result of removed) {
    if (result.status === 'rejected') log().error({ err: result.reason }, 'an object could not be removed');
  }
}
