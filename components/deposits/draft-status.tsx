'use client';

import { FlagCounts } from '@/components/assessed/flag-counts';
import { actionStyle } from '@/components/ui/action-style';
import { Button } from '@/components/ui/button';
import { formatCount, formatPValue, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import type { DepositState } from '@/lib/deposits/states';
import { stateWords } from '@/lib/deposits/states';
import type { AssessmentSummary } from '@/lib/engine/assessment';
import type { PublicationDay } from '@/schemas/deposit';
import { Moment } from './moment';
import { stateSentence } from './state-sentence';

interface DraftStatusProps {
  state: DepositState;
  updatedAt: number;
  isDirty: boolean;
  isSaving: boolean;
  onSave: () => void;
}

/** In which state the deposit is, whether what stands here is saved, and the way to save it. */
export function DraftStatus({ state, updatedAt, isDirty, isSaving, onSave }: DraftStatusProps) {
  return (
    <>
      <StateHead state={state} />
      <p role="status" className="mt-3 text-sm">
        {isSaving ? (
          'Saving …'
        ) : isDirty ? (
          <span className="text-warn">Changed here, not saved yet.</span>
        ) : (
          <>
            Saved <Moment at={updatedAt} />
          </>
        )}
      </p>
      <p className="mt-2 flex flex-wrap items-center gap-x-5 gap-y-1">
        <Button variant={isDirty ? 'primary' : 'outline'} disabled={!isDirty || isSaving} onClick={onSave}>
          Save
        </Button>
        <a href="#submission" className={actionStyle()}>
          To submission
        </a>
      </p>
    </>
  );
}

interface StateHeadProps {
  state: DepositState;
  /** the day for which an accepted deposit waits */
  publication?: PublicationDay | null;
}

/** The state in words, and what it means. */
export function StateHead({ state, publication = null }: StateHeadProps) {
  const words = stateWords(state);
  return (
    <>
      <p className="font-semibold font-serif text-2xl">{words.charAt(0).toUpperCase() + words.slice(1)}</p>
      <p className="mt-1 text-sm text-soft">{stateSentence(state, publication)}</p>
    </>
  );
}

interface DraftVerdictProps {
  summary: AssessmentSummary;
  isStale: boolean;
  /** leads to the points off the curve, one after the other */
  onOffCurve: () => void;
  /** the figures are those of a trial */
  isTrial?: boolean;
}

/** What the assessment amounts to, in a few figures. */
export function DraftVerdict({ summary, isStale, onOffCurve, isTrial = false }: DraftVerdictProps) {
  return (
    <section aria-label="Verdict" className="mt-5 border-ink border-t pt-3">
      <p className="font-serif">
        <span className="font-semibold text-3xl">{formatCount(summary.onCurve)}</span>{' '}
        <span className="text-soft text-xl">/ {formatCount(summary.points)}</span>
      </p>
      <p className="text-sm text-soft">
        points on the curve{isTrial ? ' in the trial' : ''}, RMS <MathSymbol>z</MathSymbol>{' '}
        {formatScore(summary.rmsZ)}, <MathSymbol>p</MathSymbol> {formatPValue(summary.pValue)}
      </p>
      <FlagCounts counts={summary} onOffCurve={onOffCurve} />
      {isStale ? <p className="mt-2 text-sm text-soft">Of the draft as it was last saved.</p> : null}
    </section>
  );
}
