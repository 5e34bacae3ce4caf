'use client';

import type { Route } from 'next';
import { useRouter } from 'next/navigation';
import { ActionLink } from '@/components/ui/action-link';
import { Button } from '@/components/ui/button';
import type { Assessment } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { FileAnswer } from '@/schemas/file';
import { AssessedRecord } from './assessed-record';
import { recallSubmission } from './deposit-calls';
import type { DepositRecord as Deposit } from './deposit-editor';
import { DepositFiles } from './deposit-files';
import { DraftFromDocument } from './draft-from-document';
import { StateHead } from './draft-status';
import { Letters } from './letters';
import { Moment } from './moment';
import { ProblemNotice } from './problem-notice';
import { useCall } from './use-call';

interface DepositRecordProps {
  deposit: Deposit;
  document: DatasetDocument;
  assessment: Assessment;
  files: FileAnswer[];
  mayRecall: boolean;
  /** the document as it was sent, for a new draft from it; null where the reader may make none */
  text: string | null;
}

/** A deposit that cannot be changed now: its newest revision assessed, its state, and what can be done with it. */
export function DepositRecord({ deposit, document, assessment, files, mayRecall, text }: DepositRecordProps) {
  const router = useRouter();
  const recall = useCall({
    mutationFn: () => recallSubmission(deposit.id),
    onSuccess: () => router.refresh(),
  });
  const { state, accession, publication, revisions } = deposit;
  return (
    <AssessedRecord
      document={document}
      assessment={assessment}
      laboratory={deposit.laboratory.name}
      state={state}
      aside={
        <>
          <StateHead state={state} publication={publication} />
          {revisions[0] ? (
            <p className="mt-3 text-sm">
              Revision {revisions[0].number}, submitted <Moment at={revisions[0].submittedAt} />
            </p>
          ) : null}
          {accession ? (
            <p className="mt-2">
              <ActionLink href={`/datasets/${accession}` as Route} prefetch={false}>
                {accession}
              </ActionLink>
            </p>
          ) : null}
          {state === 'submitted' && mayRecall ? (
            <Button
              className="mt-2"
              disabled={recall.isPending || recall.isSuccess}
              onClick={() => recall.mutate()}
            >
              {recall.isPending ? 'Recalling …' : 'Recall it'}
            </Button>
          ) : null}
          <ProblemNotice error={recall.error} />
          <Letters decisions={deposit.decisions} />
          {state === 'declined' && text !== null ? (
            <DraftFromDocument text={text} lab={deposit.laboratory.slug} />
          ) : null}
          <DepositFiles id={deposit.id} initial={files} editable={false} />
        </>
      }
    />
  );
}
