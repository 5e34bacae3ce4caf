/** What the fields of the form know of the draft: what stands at a place, how to change it, what is wrong with it. */
import type { DocumentError } from '@/lib/documents/document-error';
import { type JsonObject, valueAt } from './draft-value';

export interface DraftAccess {
  at: (pointer: string) => unknown;
  set: (pointer: string, value: unknown) => void;
  /** the first thing that is wrong with one of these places, as far as they are as they were when it was found */
  errorAt: (...pointers: string[]) => string | undefined;
}

/**
 * @param judged the draft that the errors are of: once a place was changed, what was wrong with it is no news
 */
export function accessTo(
  value: JsonObject,
  judged: JsonObject,
  errors: readonly DocumentError[],
  set: DraftAccess['set'],
): DraftAccess {
  const byPointer = new Map(errors.map(({ pointer, detail }) => [pointer, detail]));
  return {
    at: (pointer) => valueAt(value, pointer),
    set,
    errorAt: (...pointers) => {
      const found = pointers.find((pointer) => byPointer.has(pointer) && isUnchanged(value, judged, pointer));
      return found === undefined ? undefined : byPointer.get(found);
    },
  };
}

/** Whether a place is as it was when the draft was judged. */
export function isUnchanged(value: JsonObject, judged: JsonObject, pointer: string): boolean {
  return valueAt(value, pointer) === valueAt(judged, pointer);
}
