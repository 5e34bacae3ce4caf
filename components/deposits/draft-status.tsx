'use client';

import { FlagCounts } from '@/components/check/flag-counts';
import { Button } from '@/components/ui/button';
import { formatCount, formatPValue, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import type { DepositState } from '@/lib/deposits/states';
import { stateWords } from '@/lib/deposits/states';
import type { AssessmentSummary } from '@/lib/engine/assessment';
import { Moment } from './moment';
import { stateSentence } from './state-sentence';

interface DraftStatusProps {
  state: DepositState;
  version: number;
  updatedAt: number;
  isDirty: boolean;
  isSaving: boolean;
  onSave: () => void;
}

/** In which state the deposit is, whether what stands here is saved, and the way to save it. */
export function DraftStatus({ state, version, updatedAt, isDirty, isSaving, onSave }: DraftStatusProps) {
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
            Saved as version {version}, <Moment at={updatedAt} />
          </>
        )}
      </p>
      <Button variant="primary" className="mt-2" disabled={!isDirty || isSaving} onClick={onSave}>
        Save
      </Button>
    </>
  );
}

/** The state in words, and what it means. */
export function StateHead({ state }: { state: DepositState }) {
  const words = stateWords(state);
  return (
    <>
      <p className="font-semibold font-serif text-2xl">{words.charAt(0).toUpperCase() + words.slice(1)}</p>
      <p className="mt-1 text-sm text-soft">{stateSentence(state)}</p>
    </>
  );
}

interface DraftVerdictProps {
  summary: AssessmentSummary;
  isStale: boolean;
  /** the figures are those of a trial */
  isTrial?: boolean;
}

/** What the assessment amounts to, in a few figures. */
export function DraftVerdict({ summary, isStale, isTrial = false }: DraftVerdictProps) {
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
      <FlagCounts counts={summary} />
      {isStale ? <p className="mt-2 text-sm text-soft">Of the draft as it was last saved.</p> : null}
    </section>
  );
}
