'use client';

import type { Route } from 'next';
import { useRouter } from 'next/navigation';
import { useRef, useState } from 'react';
import { newKey } from '@/components/deposits/call-api';
import { createDraft } from '@/components/deposits/deposit-calls';
import { type DepositingLab, LabChoice } from '@/components/deposits/lab-choice';
import { ProblemNotice } from '@/components/deposits/problem-notice';
import { useCall } from '@/components/deposits/use-call';
import { Button } from '@/components/ui/button';
import { documentOf, type SourceDocument } from './assess-source';
import type { CsvDraft } from './csv-draft';
import type { Source } from './read-source';

interface KeepDraftProps {
  /** the laboratories that the reader deposits for; none: nothing is offered */
  labs: readonly DepositingLab[];
  source: Source;
  draft: CsvDraft | null;
  /** a table of which no document can be made yet */
  onToMend: (outcome: Extract<SourceDocument, { kind: 'to-mend' }>) => void;
}

/** Keeps what is being checked as a draft of the reader’s laboratory, valid or not, and leads there. */
export function KeepDraft({ labs, source, draft, onToMend }: KeepDraftProps) {
  const router = useRouter();
  const key = useRef({ text: '', key: '' });
  const [lab, setLab] = useState(labs[0]?.slug ?? '');
  const { mutate, isPending, isSuccess, error } = useCall({
    mutationFn: (text: string) => {
      // A text sent again under its key makes no second draft.
      if (key.current.text !== `${lab} ${text}`) key.current = { text: `${lab} ${text}`, key: newKey() };
      return createDraft(text, lab, key.current.key);
    },
    onSuccess: ({ id }) => router.push(`/deposits/${id}` as Route),
  });
  if (labs.length === 0) return null;
  const keep = () => {
    const made = documentOf(source, draft);
    if (made.kind === 'document') mutate(made.text);
    else onToMend(made);
  };
  const isBusy = isPending || isSuccess;
  return (
    <div className="space-y-2">
      <LabChoice labs={labs} lab={lab} onLab={setLab} />
      <Button disabled={isBusy || source.text.trim() === ''} onClick={keep}>
        {isBusy ? 'Keeping it …' : 'Keep as a draft'}
      </Button>
      <ProblemNotice error={error} />
    </div>
  );
}
