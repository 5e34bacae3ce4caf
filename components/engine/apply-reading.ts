/** A document as it reads with another reading. Runs in the engine's worker; nothing is mutated. */
import { rereadSeries } from '@/lib/engine/misreadings';
import { applyEstimates } from '@/lib/engine/refitted-dataset';
import { applyShape, rescaleActivity } from '@/lib/engine/shape-reading';
import type { DatasetDocument, Series } from '@/schemas/dataset-1.generated';
import type { Reading } from './reading';

/** The re-read document; a series to which the reading does not apply stays as it is. */
export function applyReading(document: DatasetDocument, reading: Reading): DatasetDocument {
  switch (reading.kind) {
    case 'refit':
      return applyEstimates(document, reading.result);
    case 'convention':
      return mapSeries(
        document,
        reading.series,
        (series) => rereadSeries(document, series, reading.misreading) ?? series,
      );
    case 'shape':
      return mapSeries(document, [reading.series], (series) =>
        applyShape(document, series, reading.estimates),
      );
    case 'range':
      return mapSeries(document, [reading.series], (series) => unscale(series, reading));
  }
}

function mapSeries(
  document: DatasetDocument,
  ids: readonly string[],
  change: (series: Series) => Series,
): DatasetDocument {
  const series = document.series.map((one) => (ids.includes(one.id) ? change(one) : one));
  return { ...document, series };
}

/** a → low + a·(high − low) */
function unscale(series: Series, { low, high }: { low: number; high: number }): Series {
  const back = (activity: number) => low + activity * (high - low);
  return { ...series, points: series.points.map((point) => rescaleActivity(point, back, high - low)) };
}
