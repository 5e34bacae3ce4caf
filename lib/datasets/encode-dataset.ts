/** A document and its assessment in the form that browsing reads: summaries, columns, cells, points off the curve. */
import type { DatasetSummary, OffCurveRow, SeriesRow } from '@/db/queries/published';
import type { Assessment, SeriesAssessment } from '@/lib/engine/assessment';
import type { DatasetDocument, Series } from '@/schemas/dataset-1.generated';
import { plainLine } from '@/schemas/plain-text';
import { type DensityCell, densityCells } from './density-cells';
import { encodePoints } from './encode-columns';

export interface EncodedDataset {
  summary: DatasetSummary;
  /** in the order of the document */
  series: SeriesRow[];
  cells: (DensityCell & { position: number })[];
  offCurve: OffCurveRow[];
}

/** Encodes a document with its own assessment, which has the same series in the same order. */
export function encodeDataset(document: DatasetDocument, assessment: Assessment): EncodedDataset {
  const assessed = assessment.series;
  return {
    summary: summaryOf(document, assessment),
    series: document.series.map((series, position) => seriesRow(series, assessed[position], position)),
    cells: assessed.flatMap(({ points }, position) =>
      densityCells(points).map((cell) => ({ ...cell, position })),
    ),
    offCurve: assessed.flatMap(offCurveRows),
  };
}

function summaryOf(document: DatasetDocument, { summary, series }: Assessment): DatasetSummary {
  let lowestEnergy = Number.POSITIVE_INFINITY;
  let highestEnergy = Number.NEGATIVE_INFINITY;
  for (const { energy } of series.flatMap(({ points }) => points)) {
    lowestEnergy = Math.min(lowestEnergy, energy);
    highestEnergy = Math.max(highestEnergy, energy);
  }
  const { points, onCurve, warning, offCurve, rmsZ, pValue } = summary;
  return {
    system: document.system,
    title: plainLine(document.title),
    licence: document.licence,
    readout: plainLine(document.assay.readout),
    ligands: document.ligands.map(({ name }) => plainLine(name)),
    points,
    onCurve,
    warning,
    offCurve,
    rmsZ,
    pValue,
    lowestEnergy,
    highestEnergy,
    fittedHere: series.some(({ origin }) => origin === 'fitted-here'),
  };
}

function seriesRow(series: Series, assessed: SeriesAssessment | undefined, position: number): SeriesRow {
  if (assessed?.id !== series.id)
    throw new Error(`The assessment has no series ${series.id} at ${position}.`);
  const { points, origin, rmsZ, pValue } = assessed;
  const flagged = (flag: string) => points.filter((point) => point.flag === flag).length;
  return {
    position,
    seriesId: series.id,
    label: plainLine(series.label),
    variant: plainLine(series.variant),
    origin,
    points: points.length,
    onCurve: flagged('on-curve'),
    warning: flagged('warning'),
    offCurve: flagged('off-curve'),
    rmsZ,
    pValue,
    ...encodePoints(points),
  };
}

function offCurveRows({ points }: SeriesAssessment, position: number): OffCurveRow[] {
  return points
    .filter(({ flag }) => flag === 'off-curve')
    .map(({ index, energy, activity, expected, z }) => ({
      position,
      point: index,
      energy,
      activity,
      expected,
      z,
    }));
}
