/** The example of four series with reasons put into its assessment, so that a test says itself what is found. */
import { type PlotData, plotDataOf } from '@/components/plots/plot-data';
import type { AssessmentSummary, SeriesAssessment, Shape } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { plottedExample } from './plotted-dataset';

export const NO_SHAPE: Shape = { best: 'none', allowedByStatements: 0.19, alternatives: [] };

interface Found {
  /** by place of the series */
  series?: Record<number, Partial<SeriesAssessment>>;
  summary?: Partial<AssessmentSummary>;
  change?: (document: DatasetDocument) => void;
}

/** Series that are not named lie on the curve. The first four are wild type, T61A, S88N and G143C. */
export function reasoned({ series = {}, summary = {}, change }: Found): PlotData {
  const { document, assessment } = plottedExample('collapse');
  const changed = structuredClone(document);
  change?.(changed);
  return plotDataOf(changed, {
    ...assessment,
    summary: { ...assessment.summary, conventions: [], ...summary },
    series: assessment.series.map((one, i) => ({
      ...one,
      pValue: 0.4,
      rmsZ: 0.9,
      conventions: [],
      shape: NO_SHAPE,
      notes: [],
      ...series[i],
    })),
  });
}
