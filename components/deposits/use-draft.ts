'use client';

import { useState } from 'react';
import type { DocumentError } from '@/lib/documents/document-error';
import { findSyntaxError, type SyntaxProblem } from '@/lib/documents/find-syntax-error';
import { type JsonObject, readDraft, withValueAt } from './draft-value';

/** A draft as it stands on the server. */
export interface SavedDraft {
  version: number;
  /** Unix time, ms */
  updatedAt: number;
  errors: readonly DocumentError[];
  content: DraftContent;
}

/** A document as a value; with its text where that is known to the byte. */
export interface DraftContent {
  value: JsonObject;
  text?: string;
}

/** The document while it is edited as text. */
interface TextEdit {
  text: string;
  /** what it was when the editing began, or when it was last saved */
  from: string;
}

export interface Draft {
  saved: SavedDraft;
  content: DraftContent;
  /** null while the form is shown */
  edit: TextEdit | null;
  isDirty: boolean;
  /** the document as it would be sent */
  toText: () => string;
  set: (pointer: string, value: unknown) => void;
  replace: (content: DraftContent) => void;
  setText: (text: string) => void;
  openText: () => void;
  /** back to the form, or why the text is no document */
  closeText: () => SyntaxProblem | null;
  /** what is on the server now is this */
  settle: (saved: SavedDraft, sent: SentDraft) => void;
}

/** What was sent: as long as it was not changed since, it is what is saved. */
export interface SentDraft {
  content: DraftContent;
  text: string;
}

function textOfContent({ value, text }: DraftContent): string {
  return text ?? JSON.stringify(value, null, 2);
}

/** The document as it would be sent. */
export function textToSend(content: DraftContent, edit: TextEdit | null): string {
  return edit?.text ?? textOfContent(content);
}

/** The draft in the editor: what is saved, what became of it here, as a form's value or as text. */
export function useDraft(initial: SavedDraft): Draft {
  const [saved, setSaved] = useState(initial);
  const [content, setContent] = useState(initial.content);
  const [edit, setEdit] = useState<TextEdit | null>(null);
  const toText = () => textToSend(content, edit);

  const closeText = () => {
    if (edit === null) return null;
    if (edit.text !== textOfContent(content)) {
      const value = readDraft(edit.text);
      if (value === null) return whyNoDraft(edit.text);
      setContent({ value, text: edit.text });
    }
    setEdit(null);
    return null;
  };
  const settle = (next: SavedDraft, sent: SentDraft) => {
    setSaved(next);
    setContent((present) => (present === sent.content ? next.content : present));
    setEdit((present) => (present === null ? null : { ...present, from: sent.text }));
  };
  return {
    saved,
    content,
    edit,
    isDirty: content !== saved.content || (edit !== null && edit.text !== edit.from),
    toText,
    set: (pointer, value) => setContent((before) => ({ value: withValueAt(before.value, pointer, value) })),
    replace: (next) => {
      setContent(next);
      setEdit(null);
    },
    setText: (text) => setEdit((before) => before && { ...before, text }),
    openText: () => {
      const text = textOfContent(content);
      setEdit({ text, from: text });
    },
    closeText,
    settle,
  };
}

function whyNoDraft(text: string): SyntaxProblem {
  try {
    JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch {
    return findSyntaxError(text);
  }
  return { line: 1, column: 1, detail: 'a document is a JSON object, from { to }' };
}
