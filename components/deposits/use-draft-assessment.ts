'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { type PlotData, plotDataOf } from '@/components/plots/plot-data';
import type { Assessment } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { loadAssessment } from './deposit-calls';
import type { JsonObject } from './draft-value';
import type { SavedDraft } from './use-draft';

export interface AssessedDraft {
  /** the draft that was assessed, the very object */
  value: JsonObject;
  data: PlotData;
}

/** The assessment of the saved draft, where it is valid; the one before while the next is on its way. */
export function useDraftAssessment(id: string, { version, errors, content: { value } }: SavedDraft) {
  const isValid = errors.length === 0;
  const { data, error, isFetching } = useQuery({
    queryKey: ['assessment', id, version],
    queryFn: async ({ signal }) => ({ value, assessment: await loadAssessment(id, signal) }),
    enabled: isValid,
    placeholderData: keepPreviousData,
    retry: false,
  });
  const assessed = isValid && data && fits(data.value, data.assessment) ? assessedOf(data) : null;
  return { assessed, error: isValid ? error : null, isFetching };
}

function assessedOf({ value, assessment }: { value: JsonObject; assessment: Assessment }): AssessedDraft {
  return { value, data: plotDataOf(value as unknown as DatasetDocument, assessment) };
}

/** Whether an assessment is of this document: somebody else may have saved another one in between. */
function fits(value: JsonObject, { series }: Assessment): boolean {
  const stated = (value as unknown as DatasetDocument).series;
  return (
    stated.length === series.length &&
    stated.every(({ id, points }, i) => id === series[i].id && points.length === series[i].points.length)
  );
}
