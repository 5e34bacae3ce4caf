'use client';

import type { PlotData } from '@/components/plots/plot-data';
import { DerivedTable } from '@/components/reasons/derived-table';
import { RefitSection } from '@/components/refit/refit-section';
import type { DraftReasonsState } from './draft-reasons';

interface DraftTablesProps {
  data: PlotData;
  reasons: DraftReasonsState;
  isStale: boolean;
}

/** Under a draft: what its statements predict, as saved or as tried, and the refit. */
export function DraftTables({ data, reasons: { trials }, isStale }: DraftTablesProps) {
  return (
    <div className="page-width">
      {isStale ? (
        <p className="border-hairline border-t pt-4 text-sm text-soft">
          Table and refit are from the last saved version, not from what was typed since.
        </p>
      ) : null}
      <DerivedTable data={trials.trial?.data ?? data} isTrial={trials.trial !== null} />
      <RefitSection data={data} trials={trials} />
    </div>
  );
}
