'use client';

import { useEffect, useRef, useState } from 'react';
import { openingWindow } from '@/components/plots/energy-window';
import { type PlotData, pointsOf } from '@/components/plots/plot-data';
import { StatedBand } from '@/components/reasons/stated-band';
import { type Trials, useTrial } from '@/components/reasons/use-trial';
import { type StatedReading, WhyItMisses } from '@/components/reasons/why-it-misses';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { JsonObject } from './draft-value';
import type { Draft, DraftContent } from './use-draft';

interface Restated {
  reading: StatedReading;
  /** what became of the draft */
  value: JsonObject;
  before: DraftContent;
}

export interface DraftReasonsState {
  trials: Trials;
  /** null while the reading cannot be stated: the reasons are of another state of the draft, or text is edited */
  onState: ((reading: StatedReading) => void) | null;
  /** the last reading that was stated, while the draft is as it left it */
  restated: StatedReading | null;
  isStale: boolean;
  onUndo: () => void;
}

/** Readings of the draft in the editor: tried on what was last saved, stated as an edit like any other. */
export function useDraftReasons(data: PlotData | null, draft: Draft, isStale: boolean): DraftReasonsState {
  const { content, edit, replace } = draft;
  const window = data === null ? { from: -4, to: 4 } : openingWindow(pointsOf(data));
  const trials = useTrial({ stated: data, window });
  const [last, setLast] = useState<Restated | null>(null);
  const restated = last !== null && last.value === content.value && edit === null ? last : null;
  const latest = useRef(content);
  useEffect(() => {
    latest.current = content;
  });
  const state = async (reading: StatedReading) => {
    const { stateReading } = await import('@/lib/documents/state-reading');
    // What was typed while the code was on its way is not overwritten.
    if (latest.current !== content) return;
    const document = content.value as unknown as DatasetDocument;
    const value = stateReading(document, reading.series, reading.misreading) as unknown as JsonObject;
    trials.stop();
    setLast({ reading, value, before: content });
    replace({ value });
  };
  return {
    trials,
    onState: isStale || edit !== null ? null : (reading) => void state(reading),
    restated: restated?.reading ?? null,
    isStale,
    onUndo: () => {
      if (restated === null) return;
      setLast(null);
      replace(restated.before);
    },
  };
}

interface DraftReasonsProps {
  data: PlotData;
  reasons: DraftReasonsState;
}

/** Why series of the draft miss, as it was last saved, with what can be tried and stated. */
export function DraftReasons({ data, reasons }: DraftReasonsProps) {
  const { trials, onState, restated, isStale, onUndo } = reasons;
  return (
    <>
      {restated ? (
        <div className="mt-4">
          <StatedBand noun={restated.noun} label={restated.label} onUndo={onUndo}>
            {isStale ? 'Save the draft to have it assessed.' : null}
          </StatedBand>
        </div>
      ) : null}
      <WhyItMisses stated={data} trials={trials} onState={onState ?? undefined}>
        {isStale ? <p className="text-sm text-soft">Of the draft as it was last saved.</p> : null}
      </WhyItMisses>
    </>
  );
}
