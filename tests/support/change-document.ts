import { checkDocument } from '@/lib/documents/check-document';
import type { DocumentError } from '@/lib/documents/document-error';
import { membersOf } from '@/lib/documents/json-pointer';
import { contractDocument } from './contract-document';

/** Takes a member out of a document where it stands for a new value; an entry of a list becomes null. */
export const REMOVED = Symbol('removed');

/** The small complete document with other values at some places (JSON Pointer → value, or REMOVED). */
export function changedDocument(changes: Record<string, unknown>): unknown {
  const document: unknown = contractDocument();
  for (const [pointer, value] of Object.entries(changes)) {
    const members = membersOf(pointer);
    const last = members.pop() ?? '';
    const parent = members.reduce<unknown>(
      (place, member) => (place as Record<string, unknown>)[member],
      document,
    ) as Record<string, unknown>;
    if (value !== REMOVED) parent[last] = value;
    else if (Array.isArray(parent)) parent[Number(last)] = null;
    else delete parent[last];
  }
  return document;
}

/** What the check says of the small complete document with other values at some places. */
export function errorsOf(changes: Record<string, unknown>): DocumentError[] {
  const checked = checkDocument(changedDocument(changes));
  return checked.ok ? [] : checked.errors;
}
