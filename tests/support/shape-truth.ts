/** Counts over simulated series: what flags, p of Q and shapes do where the truth is known. */
import type { ShapeEstimateName, ShapeKind } from '@/lib/engine/assessment';
import { POLICY } from '@/lib/engine/flags';
import type { DatasetInput } from '@/lib/engine/inputs';
import { computePointTable } from '@/lib/engine/point-table';
import { type ScoredSeries, seriesQ } from '@/lib/engine/q-statistic';
import { buildSeriesModel } from '@/lib/engine/series-model';
import { fitShape } from '@/lib/engine/shape';
import { type Random, seededRandom } from './random';
import { type SimulationOptions, simulateDataset } from './simulated-series';

type Bend = SimulationOptions['bend'];

/** Shapes of moderate size: clearly beyond what the stated uncertainties allow, far from absurd. */
export const PLANTED: [ShapeKind, Bend][] = [
  ['offset', { offset: 1 }],
  ['offset', { offset: -0.8 }],
  ['slope', { slope: 0.7 }],
  ['slope', { slope: 1.4 }],
  ['ceiling', { ceiling: 0.8 }],
  ['ceiling', { ceiling: 1.15 }],
  ['floor', { floor: 0.15 }],
  ['stock', { stock: 1.5 }],
  ['stock', { stock: 0.6 }],
  ['offset+slope', { offset: 0.8, slope: 0.7 }],
  ['floor+ceiling', { floor: 0.1, ceiling: 0.85 }],
];

/** Series that follow what they state, to within their uncertainties. */
export function correctSeries(count: number, replicates: number, seed: number) {
  const random = seededRandom(seed);
  const pValues: number[] = [];
  let [beyond, points, named] = [0, 0, 0];
  for (let i = 0; i < count; i++) {
    const { dataset, scored } = simulate(random, { replicates });
    points += scored.table.count;
    beyond += scored.table.pValue.filter((p) => p < POLICY.warningBelow).length;
    pValues.push(seriesQ(scored).pValue ?? Number.NaN);
    if (fitShape(dataset, dataset.series[0], scored).shape.best !== 'none') named++;
  }
  return { beyondWarning: beyond / points, pValues, named: named / count };
}

/**
 * Series with a bent curve.
 *
 * @returns by estimate the share of intervals ± 2u that hold the truth; the share of series for which the
 *   alternative could be fitted, and for which it is the one that is named
 */
export function plantedShape(kind: ShapeKind, bend: Bend, count: number, seed: number) {
  const random = seededRandom(seed);
  const covered: Partial<Record<ShapeEstimateName, number>> = {};
  let [fitted, chosen] = [0, 0];
  for (let i = 0; i < count; i++) {
    const { dataset, scored } = simulate(random, { bend });
    const { best, alternatives } = fitShape(dataset, dataset.series[0], scored).shape;
    if (best === kind) chosen++;
    const found = alternatives.find((one) => one.kind === kind);
    if (!found) continue;
    fitted++;
    for (const { name, value, u } of found.estimates) {
      const inside = Math.abs(value - (bend[name] ?? Number.NaN)) <= 2 * u;
      covered[name] = (covered[name] ?? 0) + (inside ? 1 : 0);
    }
  }
  const coverage = Object.entries(covered).map(([name, inside]) => [name, inside / fitted]);
  return {
    coverage: Object.fromEntries(coverage) as Record<string, number>,
    fitted: fitted / count,
    chosen: chosen / count,
  };
}

function simulate(
  random: Random,
  options: Partial<SimulationOptions>,
): { dataset: DatasetInput; scored: ScoredSeries } {
  const dataset = simulateDataset(random, options);
  const [series] = dataset.series;
  const model = buildSeriesModel(dataset, series);
  const table = computePointTable(dataset, series, model, 0);
  return { dataset, scored: { model, table, fittedHere: false, fittedCount: 0 } };
}
