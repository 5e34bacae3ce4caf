/**
 * The assessment of a dataset: what the engine says of every point, every series and the whole. Pure and
 * deterministic: the same document gives the same assessment, on the server and in a browser.
 */
import { adjustPValues } from './adjust-p-values';
import type {
  AssessedPoint,
  Assessment,
  AssessmentSummary,
  Flag,
  Note,
  SeriesAssessment,
} from './assessment';
import { datasetConventions, findConventions } from './conventions';
import { datasetQ } from './dataset-q';
import { deriveQuantities } from './derived';
import { expectedByChance, flagOf, POLICY } from './flags';
import type { DatasetInput, SeriesInput } from './inputs';
import { noteLinearUncertainty } from './monte-carlo';
import { notesOn } from './notes';
import { computePointTable, type PointTable } from './point-table';
import { type ScoredSeries, seriesQ } from './q-statistic';
import { buildSeriesModel } from './series-model';
import { fitShape } from './shape';
import { ENGINE_VERSION } from './version';

/**
 * Assesses a dataset.
 *
 * @param dataset a document that has passed the checks of schema and meaning; it is read and never changed
 * @returns points in the order of the document; energies in kT, concentrations in the ligands' own units
 */
export function assess(dataset: DatasetInput): Assessment {
  const scored = dataset.series.map((series) => scoreSeries(dataset, series));
  const q = adjustPValues(concatenate(scored.map(({ table }) => table.pValue)));
  const linearity = noteLinearUncertainty(dataset, scored);
  let first = 0;
  const series = scored.map((one, i) => {
    const points = assessedPoints(one.table, q, first);
    first += one.table.count;
    return assessSeries(dataset, dataset.series[i], one, points, linearity[i]);
  });
  return { engine: ENGINE_VERSION, policy: POLICY.number, summary: summarise(series, scored), series };
}

function scoreSeries(dataset: DatasetInput, series: SeriesInput): ScoredSeries {
  const model = buildSeriesModel(dataset, series);
  const fittedHere = series.parameters.origin === 'fitted-here';
  return {
    model,
    table: computePointTable(dataset, series, model),
    fittedHere,
    fittedCount: fittedHere ? (series.parameters.fittedCount ?? 0) : 0,
  };
}

function assessSeries(
  dataset: DatasetInput,
  series: SeriesInput,
  scored: ScoredSeries,
  points: AssessedPoint[],
  linearity: readonly Note[],
): SeriesAssessment {
  const { model, table } = scored;
  const q = seriesQ(scored);
  const { derived, notes } = deriveQuantities(dataset, model);
  const { shape, notes: shapeNotes } = fitShape(dataset, series, scored);
  return {
    id: series.id,
    origin: series.parameters.origin,
    temperatureK: model.temperatureKelvin,
    gapKT: model.gapKT,
    sites: model.sites.reduce((sum, n) => sum + n, 0),
    ...q,
    derived,
    shape,
    conventions: findConventions(dataset, series, scored, q),
    notes: [...notesOn(dataset, series, table), ...linearity, ...notes, ...shapeNotes],
    points,
  };
}

function assessedPoints(table: PointTable, q: Float64Array, first: number): AssessedPoint[] {
  const points: AssessedPoint[] = [];
  for (let index = 0; index < table.count; index++) {
    points.push({
      index,
      energy: table.energy[index],
      energyU: table.energyU[index],
      activity: table.activity[index],
      activityU: table.activityU[index],
      expected: table.expected[index],
      expectedU: table.expectedU[index],
      residual: table.residual[index],
      residualU: table.residualU[index],
      z: table.z[index],
      pValue: table.pValue[index],
      q: q[first + index],
      flag: flagOf(table.pValue[index]),
      uncertainty: table.uncertainty[index],
    });
  }
  return points;
}

function summarise(series: readonly SeriesAssessment[], scored: readonly ScoredSeries[]): AssessmentSummary {
  const counts: Record<Flag, number> = { 'on-curve': 0, warning: 0, 'off-curve': 0 };
  for (const { points } of series) for (const { flag } of points) counts[flag]++;
  const points = counts['on-curve'] + counts.warning + counts['off-curve'];
  return {
    points,
    onCurve: counts['on-curve'],
    warning: counts.warning,
    offCurve: counts['off-curve'],
    ...datasetQ(scored),
    expectedByChance: expectedByChance(points),
    conventions: datasetConventions(
      scored,
      series.map((one) => one.conventions),
    ),
  };
}

function concatenate(arrays: readonly Float64Array[]): Float64Array {
  const all = new Float64Array(arrays.reduce((sum, array) => sum + array.length, 0));
  let offset = 0;
  for (const array of arrays) {
    all.set(array, offset);
    offset += array.length;
  }
  return all;
}
