/**
 * Which misreadings explain a series that misses the curve. A series that is rejected as stated is re-read in
 * every way that applies; a reading is reported where it brings the residuals within their uncertainties and
 * far below what they were. Series that are not rejected cost nothing.
 */
import type { ConventionFinding, Misreading, QStatistic } from './assessment';
import type { DatasetInput, SeriesInput } from './inputs';
import { MISREADINGS, rereadSeries, sameMisreading } from './misreadings';
import { computePointTable, type PointTable } from './point-table';
import type { ScoredSeries } from './q-statistic';
import { buildSeriesModel } from './series-model';

/** A series is rejected where p of Q is below this, … */
const REJECTED_BELOW = 0.001;
/** … or, where there is no p, where the RMS of its z is above this. */
const REJECTED_ABOVE_RMS_Z = 3;
/** What a misreading must bring the RMS of z to, at most, … */
const EXPLAINED_RMS_Z = 2;
/** … and by how much it must lower the sum of z², at least. */
const EXPLAINED_DROP = 20;
/** Relative difference below which two RMS of z are the same number but for rounding. */
const ROUNDING = 1e-9;

/**
 * The misreadings that explain a series.
 *
 * @param scored the series as stated
 * @param q its Q statistic as stated
 * @returns best RMS z first, the simpler reading first where two leave the same residuals; empty where the
 *   series is not rejected as stated
 */
export function findConventions(
  dataset: DatasetInput,
  series: SeriesInput,
  scored: ScoredSeries,
  q: QStatistic,
): ConventionFinding[] {
  if (!isRejected(q)) return [];
  const asStated = sumOfSquares(scored.table);
  const found: ConventionFinding[] = [];
  for (const misreading of MISREADINGS) {
    const finding = tryReading(dataset, series, misreading, asStated);
    if (finding !== null && explains(finding)) found.push(finding);
  }
  return found.sort(byRmsZ);
}

/**
 * The misreadings that every series of a dataset shows, with the RMS of z and the change of Σz² over all
 * points. What they are worth is counted from the findings: nothing is computed again.
 *
 * @param scored the series as stated
 * @param findings the findings of each, in the same order
 */
export function datasetConventions(
  scored: readonly ScoredSeries[],
  findings: readonly (readonly ConventionFinding[])[],
): ConventionFinding[] {
  const [first = [], ...others] = findings;
  const points = scored.reduce((sum, { table }) => sum + table.count, 0);
  const common = first.flatMap((finding) => {
    const rest = others.map((list) => list.find((one) => sameMisreading(one, finding)));
    const all = [finding, ...rest];
    if (!all.every((one) => one !== undefined)) return [];
    const squares = all.reduce((sum, { rmsZ }, i) => sum + rmsZ * rmsZ * scored[i].table.count, 0);
    const deltaSumZ2 = all.reduce((sum, one) => sum + one.deltaSumZ2, 0);
    return [{ ...finding, rmsZ: Math.sqrt(squares / points), deltaSumZ2 }];
  });
  return common.sort(byRmsZ);
}

function isRejected({ pValue, rmsZ }: QStatistic): boolean {
  return pValue === null ? rmsZ > REJECTED_ABOVE_RMS_Z : pValue < REJECTED_BELOW;
}

function tryReading(
  dataset: DatasetInput,
  series: SeriesInput,
  misreading: Misreading,
  asStated: number,
): ConventionFinding | null {
  const reread = rereadSeries(dataset, series, misreading);
  if (reread === null) return null;
  const table = computePointTable(dataset, reread, buildSeriesModel(dataset, reread));
  const squares = sumOfSquares(table);
  return { ...misreading, rmsZ: Math.sqrt(squares / table.count), deltaSumZ2: squares - asStated };
}

function explains({ rmsZ, deltaSumZ2 }: ConventionFinding): boolean {
  return rmsZ <= EXPLAINED_RMS_Z && deltaSumZ2 <= -EXPLAINED_DROP;
}

function sumOfSquares({ z }: PointTable): number {
  let sum = 0;
  for (const value of z) sum += value * value;
  return sum;
}

/** The sort is stable, so equal readings keep the order of `MISREADINGS`. */
function byRmsZ(one: ConventionFinding, other: ConventionFinding): number {
  const difference = one.rmsZ - other.rmsZ;
  return Math.abs(difference) <= ROUNDING * Math.max(one.rmsZ, other.rmsZ, 1e-3) ? 0 : difference;
}
