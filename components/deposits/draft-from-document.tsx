'use client';

import type { Route } from 'next';
import { useRouter } from 'next/navigation';
import { useRef } from 'react';
import { Button } from '@/components/ui/button';
import { newKey } from './call-api';
import { createDraft } from './deposit-calls';
import { ProblemNotice } from './problem-notice';
import { useCall } from './use-call';

interface DraftFromDocumentProps {
  /** the document as it was sent */
  text: string;
  /** slug of the laboratory that deposits */
  lab: string;
}

/** Begins a new draft from the document of a deposit that cannot be changed any more. */
export function DraftFromDocument({ text, lab }: DraftFromDocumentProps) {
  const router = useRouter();
  const key = useRef(newKey());
  const { mutate, isPending, isSuccess, error } = useCall({
    mutationFn: () => createDraft(text, lab, key.current),
    onSuccess: ({ id }) => router.push(`/deposits/${id}` as Route),
  });
  return (
    <section aria-label="A new draft from it" className="mt-5 border-ink border-t pt-3">
      <h2 className="font-semibold">If the reasons can be met</h2>
      <p className="mt-1 text-sm text-soft">
        Begin a new draft from this document, change it, and submit that. Files are attached anew.
      </p>
      <Button className="mt-1.5" disabled={isPending || isSuccess} onClick={() => mutate()}>
        {isPending || isSuccess ? 'Beginning …' : 'New draft from this document'}
      </Button>
      <ProblemNotice error={error} />
    </section>
  );
}
