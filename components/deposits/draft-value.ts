/** A draft as a value: any JSON object, read and changed by JSON Pointer (RFC 6901), valid or not. */
import { MINUS } from '@/components/ui/format-quantity';
import { readNumber } from '@/components/ui/read-number';
import { membersOf } from '@/lib/documents/json-pointer';

export type JsonObject = Record<string, unknown>;

export function isObject(value: unknown): value is JsonObject {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** The value as a list; an empty one where it is none. */
export function listOf(value: unknown): unknown[] {
  return Array.isArray(value) ? value : [];
}

/** The value as an object; an empty one where it is none. */
export function objectOf(value: unknown): JsonObject {
  return isObject(value) ? value : {};
}

/** The value as text; empty where it is none. */
export function textOf(value: unknown): string {
  return typeof value === 'string' ? value : '';
}

/** What stands at a pointer; undefined where nothing does. */
export function valueAt(root: unknown, pointer: string): unknown {
  let value = root;
  for (const member of membersOf(pointer)) {
    if (typeof value !== 'object' || value === null || !Object.hasOwn(value, member)) return undefined;
    value = (value as JsonObject)[member];
  }
  return value;
}

/**
 * The draft with another value at a pointer; all that is not on the way there stays the very same object.
 *
 * @param next undefined takes the member or entry away
 */
export function withValueAt(root: JsonObject, pointer: string, next: unknown): JsonObject {
  return changed(root, membersOf(pointer), next) as JsonObject;
}

function changed(value: unknown, [member, ...rest]: string[], next: unknown): unknown {
  if (member === undefined) return next;
  if (Array.isArray(value)) return changedList(value, Number(member), rest, next);
  const { [member]: before, ...others } = objectOf(value);
  const after = changed(before, rest, next);
  if (after === undefined) return others;
  // Spread anew, so that a member keeps its place among the others.
  return { ...objectOf(value), [member]: after };
}

function changedList(list: readonly unknown[], index: number, rest: string[], next: unknown): unknown[] {
  const after = changed(list[index], rest, next);
  if (after === undefined) return list.filter((_, i) => i !== index);
  return index < list.length ? list.map((one, i) => (i === index ? after : one)) : [...list, after];
}

/** What a typed text is in the draft: a number, nothing, or the text itself, for the server to say what is wrong. */
export function readEntry(text: string): unknown {
  return text.trim() === '' ? undefined : (readNumber(text) ?? text);
}

/** What stands in a field for a number. */
export function entryText(value: unknown): string {
  return value === undefined || value === null
    ? ''
    : typeof value === 'object'
      ? JSON.stringify(value)
      : String(value).replace(/^-(?=\d)/, MINUS);
}

/** Reads a document's text as a draft, or says why it is none; a byte order mark is passed over. */
export function readDraft(text: string): JsonObject | null {
  try {
    const value: unknown = JSON.parse(text.replace(/^\uFEFF/, ''));
    return isObject(value) ? value : null;
  } catch {
    return null;
  }
}
