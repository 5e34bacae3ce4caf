'use client';

import { AssessedRecord } from '@/components/deposits/assessed-record';
import type { DepositRecord } from '@/components/deposits/deposit-editor';
import { DepositFiles } from '@/components/deposits/deposit-files';
import { Letters } from '@/components/deposits/letters';
import { Moment } from '@/components/deposits/moment';
import { Notice } from '@/components/ui/notice';
import { awaitsDecision, stateWords } from '@/lib/deposits/states';
import type { Assessment } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { FileAnswer } from '@/schemas/file';
import { DecisionPanel } from './decision-panel';

interface ReviewProps {
  deposit: DepositRecord;
  document: DatasetDocument;
  assessment: Assessment;
  files: FileAnswer[];
  /** false for a deposit of the curator’s own laboratory */
  mayDecide: boolean;
}

/** A submitted revision as it was assessed, with the curator’s decision at the right. */
export function Review({ deposit, document, assessment, files, mayDecide }: ReviewProps) {
  const { id, state, revisions, decisions, laboratory } = deposit;
  const revision = revisions[0];
  const decides = mayDecide && awaitsDecision(state);
  return (
    <AssessedRecord
      document={document}
      assessment={assessment}
      laboratory={laboratory.name}
      state={state}
      toDo={decides ? 'Decide' : undefined}
      aside={
        <>
          {revision ? (
            <p className="mb-4 text-sm text-soft">
              Revision {revision.number}, submitted <Moment at={revision.submittedAt} />
              {state === 'submitted' ? null : `; ${stateWords(state)}`}
            </p>
          ) : null}
          {revision && decides ? (
            <DecisionPanel key={revision.number} id={id} revision={revision.number} />
          ) : (
            <Notice kind="note" title={mayDecide ? 'Nothing to decide' : 'Another curator decides'}>
              <p>
                {mayDecide
                  ? `The deposit is ${stateWords(state)}.`
                  : 'The deposit is of your own laboratory, so you may read it and not decide on it.'}
              </p>
            </Notice>
          )}
          <Letters decisions={decisions} />
          <DepositFiles id={id} initial={files} editable={false} />
        </>
      }
    />
  );
}
