/** What a reader pasted or dropped: a JSON document, or a table of points. */

export type SourceKind = 'document' | 'table';

export interface Source {
  text: string;
  /** file name, or null where it was typed or pasted */
  name: string | null;
}

/** A document begins with a brace or a bracket; everything else is read as a table. */
export function kindOf({ text }: Source): SourceKind {
  return /^\uFEFF?\s*([{[]|$)/.test(text) ? 'document' : 'table';
}

/** Something to be mended, at its place. */
export interface SourceProblem {
  /** from 1; null where it has no place in the text (it is in the form, or is not about the text) */
  line: number | null;
  column: number | null;
  /** JSON Pointer into the document, where there is one */
  pointer: string | null;
  detail: string;
}

/** The largest document that is taken, bytes. */
export const LARGEST_SOURCE = 8 * 1024 * 1024;

/** Reads a dropped or chosen file, if it can be one. */
export async function readFile(file: File): Promise<Source | { refused: string }> {
  if (file.size > LARGEST_SOURCE)
    return { refused: `${file.name} is larger than 8 MiB, the most that is taken.` };
  const text = await file.text();
  if (text.includes('\u0000')) {
    return {
      refused: `${file.name} is not a text file. Save the sheet as CSV, or give the document as JSON.`,
    };
  }
  return { text, name: file.name };
}
