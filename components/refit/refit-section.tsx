'use client';

import dynamic from 'next/dynamic';
import { useState } from 'react';
import type { PlotData } from '@/components/plots/plot-data';
import type { Trials } from '@/components/reasons/use-trial';
import { Button } from '@/components/ui/button';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';

const RefitPanel = dynamic(() => import('./refit-panel'), {
  ssr: false,
  loading: () => <p className="mt-4 text-sm text-soft">Loading …</p>,
});

interface RefitSectionProps {
  data: PlotData;
  trials: Trials;
  /** fetches the document where the points at hand are not all of it */
  wholeDocument?: (signal: AbortSignal) => Promise<DatasetDocument>;
}

/** The refit, folded until it is asked for. */
export function RefitSection({ data, trials, wholeDocument }: RefitSectionProps) {
  const [isOpen, setOpen] = useState(false);
  // The summary is the very object of the answer. What was fitted to another document is put away with its panel.
  const of = data.assessment.summary;
  const [basis, setBasis] = useState({ of, number: 0 });
  if (basis.of !== of) setBasis({ of, number: basis.number + 1 });
  return (
    <section aria-labelledby="refit" className="no-print border-hairline border-t py-8">
      <h2 id="refit" className="head text-xl">
        Refit
      </h2>
      <p className="mt-1 max-w-[46rem] text-sm text-soft">
        What these points would give for the parameters that you free, the others as stated. It is computed in
        your browser and changes nothing.
      </p>
      <p className="mt-2">
        <Button aria-expanded={isOpen} aria-controls="refit-panel" onClick={() => setOpen(!isOpen)}>
          {isOpen ? 'Close the refit' : 'Choose what to free'}
        </Button>
      </p>
      <div id="refit-panel" hidden={!isOpen}>
        {isOpen ? (
          <RefitPanel
            key={basis.number}
            data={data}
            trials={trials}
            wholeDocument={wholeDocument ?? (() => Promise.resolve(data.document))}
          />
        ) : null}
      </div>
    </section>
  );
}
