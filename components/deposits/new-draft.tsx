'use client';

import type { Route } from 'next';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { createDraft } from './deposit-calls';
import { emptyDocument } from './empty-document';
import { type DepositingLab, LabChoice } from './lab-choice';
import { ProblemNotice } from './problem-notice';
import { useCall } from './use-call';
import { useCallKey } from './use-call-key';

interface NewDraftProps {
  labs: readonly DepositingLab[];
  /** name of whoever begins it */
  person: string;
}

/** Begins an empty draft, for one of the person’s laboratories. */
export function NewDraft({ labs, person }: NewDraftProps) {
  const router = useRouter();
  const key = useCallKey();
  const [lab, setLab] = useState(labs[0]?.slug ?? '');
  const { mutate, isPending, isSuccess, error } = useCall({
    mutationFn: () => createDraft(JSON.stringify(emptyDocument(person), null, 2), lab, key.current()),
    onError: key.after,
    onSuccess: ({ id }) => router.push(`/deposits/${id}` as Route),
  });
  return (
    <div className="space-y-3">
      <LabChoice labs={labs} lab={lab} onLab={setLab} />
      <Button variant="primary" disabled={isPending || isSuccess} onClick={() => mutate()}>
        {isPending || isSuccess ? 'Beginning …' : 'New draft'}
      </Button>
      <ProblemNotice error={error} />
    </div>
  );
}
