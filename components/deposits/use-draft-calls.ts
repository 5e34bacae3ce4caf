'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import type { DepositAnswer } from '@/schemas/deposit';
import { CallFailed, type Complaint } from './call-api';
import { deleteDraft, loadDraft, saveDraft, submitDraft } from './deposit-calls';
import { readDraft } from './draft-value';
import { keepDraft } from './kept-draft';
import { useCall } from './use-call';
import { useCallKey } from './use-call-key';
import type { Draft, DraftContent, SentDraft } from './use-draft';

/** The calls that change a draft, with what is to be shown of each. */
export function useDraftCalls(id: string, draft: Draft) {
  const router = useRouter();
  /** what somebody else saved meanwhile */
  const [theirs, setTheirs] = useState<DepositAnswer | null>(null);

  const save = useCall({
    mutationFn: async (over: DepositAnswer | null) => {
      const sent = { content: draft.content, text: draft.toText(), isTyped: draft.edit !== null };
      const saved = await saveDraft(id, over?.version ?? draft.saved.version, sent.text);
      return { saved, sent };
    },
    onSuccess: ({ saved: { version, updatedAt, errors }, sent }) => {
      setTheirs(null);
      draft.settle({ version, updatedAt: Date.parse(updatedAt), errors, content: contentOf(sent) }, sent);
    },
    onError: async (error) => {
      if (isStale(error)) setTheirs(await loadDraft(id).catch(() => null));
    },
  });

  const submissionKey = useCallKey();
  const submit = useCall({
    mutationFn: () => submitDraft(id, draft.saved.version, submissionKey.current()),
    onSuccess: () => router.refresh(),
    onError: submissionKey.after,
  });

  const remove = useCall({
    mutationFn: () => deleteDraft(id, draft.saved.version),
    onSuccess: () => {
      keepDraft(id, null);
      router.push('/deposits');
      router.refresh();
    },
  });

  /** Takes up what somebody else saved; returns what stood here. */
  const loadTheirs = (): string | null => {
    if (theirs === null) return null;
    const mine = draft.toText();
    const content = { value: theirs.document };
    const { version, updatedAt, errors } = theirs;
    draft.settle({ version, updatedAt: Date.parse(updatedAt), errors, content }, { content, text: mine });
    draft.replace(content);
    setTheirs(null);
    save.reset();
    return mine;
  };

  const complaint = complaintOf(save.error, theirs !== null);
  return { save, submit, remove, theirs, loadTheirs, complaint };
}

function isStale(error: unknown): boolean {
  return error instanceof CallFailed && error.complaint.status === 412;
}

/** What went wrong with saving, unless both versions are shown beside it anyway. */
function complaintOf(error: unknown, bothShown: boolean): Complaint | null {
  return error instanceof CallFailed && !(bothShown && isStale(error)) ? error.complaint : null;
}

/** What is on the server now. The value stays the very object where it was not typed as text. */
function contentOf({ content, text, isTyped }: SentDraft & { isTyped: boolean }): DraftContent {
  return { value: isTyped ? (readDraft(text) ?? content.value) : content.value, text };
}
