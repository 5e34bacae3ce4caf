/** What the plots draw: an assessed dataset with the labels and concentrations of its document beside it. */
import type { AssessedPoint, Assessment, Flag, SeriesAssessment } from '@/lib/engine/assessment';
import type { ConcentrationUnit } from '@/lib/engine/units';
import type { DatasetDocument, Series } from '@/schemas/dataset-1.generated';

/** Up to so many series have a colour each. */
const MOST_COLOURED_SERIES = 6;

export interface PlotSeries {
  stated: Series;
  assessed: SeriesAssessment;
  label: string;
  /** number of its colour, 1 to 6; null where there are too many series for colours to tell them apart */
  colour: number | null;
}

export interface PlotData {
  document: DatasetDocument;
  assessment: Assessment;
  series: PlotSeries[];
}

export interface PointPlace {
  series: number;
  point: number;
}

/** Joins a document with its assessment, series by series. */
export function plotDataOf(document: DatasetDocument, assessment: Assessment): PlotData {
  const coloured = document.series.length <= MOST_COLOURED_SERIES;
  return {
    document,
    assessment,
    series: document.series.map((stated, i) => ({
      stated,
      assessed: assessment.series[i],
      label: stated.label,
      colour: coloured ? i + 1 : null,
    })),
  };
}

export function pointsOf(data: PlotData): AssessedPoint[] {
  return data.series.flatMap(({ assessed }) => assessed.points);
}

export function energiesOf(data: PlotData): number[] {
  return pointsOf(data).map(({ energy }) => energy);
}

/** Concentration of a ligand at a point, in the ligand's unit; 0 where left out. */
export function concentrationAt(series: PlotSeries, point: number, ligand: string): number {
  return series.stated.points[point].ligands[ligand] ?? 0;
}

export function unitOfLigand(document: DatasetDocument, ligand: string): ConcentrationUnit {
  return document.ligands.find(({ id }) => id === ligand)?.unit ?? 'M';
}

/** Flags as people say them. */
export const FLAG_WORDS: Record<Flag, string> = {
  'on-curve': 'on curve',
  warning: 'warning',
  'off-curve': 'off curve',
};

/** Counts of flags among points, within a window where one is given. */
export function countFlags(points: Iterable<AssessedPoint>): Record<Flag, number> {
  const counts: Record<Flag, number> = { 'on-curve': 0, warning: 0, 'off-curve': 0 };
  for (const { flag } of points) counts[flag]++;
  return counts;
}
