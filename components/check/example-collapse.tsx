'use client';

import { useState } from 'react';
import { CollapseSwitch } from '@/components/assessed/collapse-switch';
import { sentenceOn } from '@/components/assessed/summary-sentence';
import { CollapsePanel } from '@/components/plots/collapse-panel';
import { openingWindow } from '@/components/plots/energy-window';
import { plotDataOf, pointsOf } from '@/components/plots/plot-data';
import type { Assessment } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';

interface ExampleCollapseProps {
  document: DatasetDocument;
  assessment: Assessment;
}

/** An assessed example as a plot by itself: its points on the master curve, or apart by concentration. */
export function ExampleCollapse({ document, assessment }: ExampleCollapseProps) {
  const [byLigand, setByLigand] = useState<string | null>(null);
  const data = plotDataOf(document, assessment);
  const window = openingWindow(pointsOf(data));
  return (
    <div className="flex grow flex-col">
      <CollapseSwitch data={data} byLigand={byLigand} onChange={setByLigand} />
      <CollapsePanel
        data={data}
        window={window}
        byLigand={byLigand}
        ligand={byLigand ?? document.ligands[0]?.id ?? null}
        lit={null}
        sentence={sentenceOn(data, { window, byLigand })}
      />
    </div>
  );
}
