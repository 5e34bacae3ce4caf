'use client';

import { useState } from 'react';
import type { PlotData } from '@/components/plots/plot-data';
import type { Trials } from '@/components/reasons/use-trial';
import { Button } from '@/components/ui/button';
import { formatCount } from '@/components/ui/format-quantity';
import { Notice } from '@/components/ui/notice';
import { countFreeValues, type FreeParameter, MOST_FREE_VALUES } from '@/lib/engine/free-parameters';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { FreeForm, type Share } from './free-form';
import { freeableRows } from './freeable';
import { RefitOutcome } from './refit-result';
import { useRefit } from './use-refit';

interface RefitPanelProps {
  /** as stated */
  data: PlotData;
  trials: Trials;
  wholeDocument: (signal: AbortSignal) => Promise<DatasetDocument>;
}

/** What to free, the refit while it runs, and what it gave. */
export default function RefitPanel({ data, trials, wholeDocument }: RefitPanelProps) {
  const { document } = data;
  const rows = freeableRows(document);
  const [chosen, setChosen] = useState<ReadonlyMap<string, Share>>(new Map());
  const { start, stop, share, isRunning, isStopped, refitted, failure } = useRefit(wholeDocument);
  const free: FreeParameter[] = rows.flatMap(({ key, place }) => {
    const shared = chosen.get(key);
    return shared ? [{ ...place, share: shared }] : [];
  });
  const count = countFreeValues(document, free);
  const choose = (key: string, next: Share | null) => {
    const changed = new Map(chosen);
    if (next === null) changed.delete(key);
    else changed.set(key, next);
    setChosen(changed);
  };
  const isTooMany = count > MOST_FREE_VALUES;
  return (
    <form
      onSubmit={(event) => {
        event.preventDefault();
        if (count > 0 && !isTooMany && !isRunning) start(free);
      }}
    >
      <FreeForm
        rows={rows}
        chosen={chosen}
        several={document.series.length > 1}
        disabled={isRunning}
        onChoose={choose}
      />
      <div className="mt-4 flex min-h-9 flex-wrap items-center gap-x-5 gap-y-2">
        {isRunning ? (
          <>
            <Button onClick={stop}>Stop</Button>
            <span className="flex items-center gap-3 text-sm">
              <progress
                aria-label="Refit"
                max={1}
                value={share}
                className="h-1 w-40 appearance-none bg-hairline [&::-moz-progress-bar]:bg-act [&::-webkit-progress-bar]:bg-hairline [&::-webkit-progress-value]:bg-act"
              />
              <span className="figures">Refitting, {Math.round(100 * share)} %</span>
            </span>
          </>
        ) : (
          <>
            <Button type="submit" variant="primary" disabled={count === 0 || isTooMany}>
              Refit
            </Button>
            <span className={`figures text-sm ${isTooMany ? 'text-off' : 'text-soft'}`}>
              {countWords(count)}
            </span>
          </>
        )}
      </div>
      {isStopped && !isRunning ? (
        <p role="status" className="mt-3 text-sm">
          Stopped. Nothing was changed{refitted ? '; below is the result before it' : ''}.
        </p>
      ) : null}
      {failure && !isRunning ? (
        <div className="mt-4 max-w-[46rem]">
          <Notice kind="error" title="The refit failed" live>
            <p>{failure} What is freed is kept: free less, or try again.</p>
          </Notice>
        </div>
      ) : null}
      {refitted && !isRunning ? <RefitOutcome refitted={refitted} trials={trials} /> : null}
    </form>
  );
}

function countWords(count: number): string {
  if (count === 0) return 'Free at least one parameter.';
  const values = `${formatCount(count)} of at most ${MOST_FREE_VALUES} values free`;
  return count > MOST_FREE_VALUES
    ? `${values}: share some by the dataset, or leave them as stated.`
    : `${values}.`;
}
