/** A published dataset as the plots take it: its document, assessment and points come in separate answers. Pure. */
import { type PlotData, plotDataOf } from '@/components/plots/plot-data';
import type { DatasetDocument, Point, Series } from '@/schemas/dataset-1.generated';
import type { DatasetPoint, PublishedAssessment } from '@/schemas/dataset-answers';

/** A document whose series are without their points. */
export interface DocumentHead extends Omit<DatasetDocument, 'series'> {
  series: Omit<Series, 'points'>[];
}

/** The document without its points, which are most of it. */
export function documentHead({ series, ...rest }: DatasetDocument): DocumentHead {
  return { ...rest, series: series.map(({ points: _, ...one }) => one) };
}

/** @param points of all series, in order; none while they are on their way */
export function publishedPlotData(
  document: DocumentHead,
  assessment: PublishedAssessment,
  points: readonly DatasetPoint[],
): PlotData {
  const pointsOf = new Map<string, DatasetPoint[]>();
  for (const point of points) pointsOf.set(point.series, [...(pointsOf.get(point.series) ?? []), point]);
  const own = (id: string) => pointsOf.get(id) ?? [];
  return plotDataOf(
    { ...document, series: document.series.map((one) => ({ ...one, points: own(one.id).map(statedPoint) })) },
    { ...assessment, series: assessment.series.map((one) => ({ ...one, points: own(one.id) })) },
  );
}

function statedPoint({ ligands, modulators, activity }: DatasetPoint): Point {
  return { ligands, modulators, activity };
}
