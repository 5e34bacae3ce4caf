'use client';

import { useEffect, useRef, useState } from 'react';
import { type KeptDraft, keepDraft, keptDraft } from './kept-draft';
import { type Draft, textToSend } from './use-draft';

const PAUSE_MS = 400;

/** Keeps unsaved changes in this tab, and hands back once what an earlier visit left unsaved. */
export function useKeptDraft(id: string, draft: Draft) {
  const [left, setLeft] = useState<KeptDraft | null>(null);
  const opened = useRef(false);
  useEffect(() => {
    if (opened.current) return;
    opened.current = true;
    const kept = keptDraft(id);
    if (kept !== null && kept.text !== draft.toText()) setLeft(kept);
  });
  const { isDirty, content, edit } = draft;
  const { version } = draft.saved;
  useEffect(() => {
    if (!isDirty) {
      if (left === null && opened.current) keepDraft(id, null);
      return;
    }
    const timer = setTimeout(() => keepDraft(id, { version, text: textToSend(content, edit) }), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [id, isDirty, version, left, content, edit]);
  return { left, forget: () => setLeft(null) };
}
