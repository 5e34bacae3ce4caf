import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { checkDocument } from './check-document';
import type { DocumentError } from './document-error';
import { findSyntaxError, type SyntaxProblem } from './find-syntax-error';
import { readText } from './read-text';

export type ParsedDocument =
  | { ok: true; document: DatasetDocument }
  | ({ ok: false; reason: 'syntax' } & SyntaxProblem)
  | { ok: false; reason: 'invalid'; errors: DocumentError[] };

/**
 * Reads a dataset document from JSON text, or from its bytes in UTF-8; a byte order mark is passed over.
 *
 * @returns the document, or the line and column where it stops being JSON, or all that is wrong with it
 */
export function parseDocument(source: string | Uint8Array): ParsedDocument {
  const read = readText(source);
  if (!read.ok)
    return { ok: false, reason: 'syntax', line: read.line, column: read.column, detail: read.detail };
  let value: unknown;
  try {
    value = JSON.parse(read.text);
  } catch {
    return { ok: false, reason: 'syntax', ...findSyntaxError(read.text) };
  }
  const checked = checkDocument(value);
  return checked.ok ? checked : { ok: false, reason: 'invalid', errors: checked.errors };
}
