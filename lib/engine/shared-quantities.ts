/**
 * Which uncertain quantities several series of a dataset have in common, and how those are correlated.
 */
import type { SeriesModel } from './series-model';

export interface SharedQuantities {
  /** how many quantities two or more series share */
  count: number;
  /** by series and column: the index of the shared quantity, null where the column is the series' own */
  indexOfColumn: (number | null)[][];
  /** count × count; null where shared quantities are uncorrelated */
  correlation: Float64Array | null;
}

/** @param models one a series; null for a series whose parameters do not enter (fitted to its own points) */
export function indexSharedQuantities(models: readonly (SeriesModel | null)[]): SharedQuantities {
  const uses = new Map<string, number>();
  for (const model of models) {
    for (const key of model?.sharedKeys ?? []) if (key !== null) uses.set(key, (uses.get(key) ?? 0) + 1);
  }
  const indexOfKey = new Map<string, number>();
  for (const [key, count] of uses) if (count > 1) indexOfKey.set(key, indexOfKey.size);
  const indexOfColumn = models.map((model) =>
    (model?.sharedKeys ?? []).map((key) => (key === null ? null : (indexOfKey.get(key) ?? null))),
  );
  return {
    count: indexOfKey.size,
    indexOfColumn,
    correlation: correlationAmong(models, indexOfColumn, indexOfKey.size),
  };
}

function correlationAmong(
  models: readonly (SeriesModel | null)[],
  indexOfColumn: readonly (number | null)[][],
  count: number,
): Float64Array | null {
  const matrix = new Float64Array(count * count);
  for (let k = 0; k < count; k++) matrix[k * count + k] = 1;
  let any = false;
  models.forEach((model, s) => {
    const stated = model?.correlation;
    if (!stated) return;
    const columns = indexOfColumn[s];
    columns.forEach((i, a) => {
      columns.forEach((j, b) => {
        const r = stated[a * columns.length + b];
        if (a === b || i === null || j === null || r === 0) return;
        matrix[i * count + j] = r;
        any = true;
      });
    });
  });
  return any ? matrix : null;
}
