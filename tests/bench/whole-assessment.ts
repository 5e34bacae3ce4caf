/**
 * `npm run bench`: what a whole assessment costs beside the bare table of points (energies, uncertainties,
 * residuals, flags), for 20,000 points in 200 series of which every tenth misses the curve. In processor time,
 * which what else the machine does disturbs less than the clock.
 */
import { assess } from '@/lib/engine/assess';
import type { SeriesInput } from '@/lib/engine/inputs';
import { noteLinearUncertainty } from '@/lib/engine/monte-carlo';
import { computePointTable } from '@/lib/engine/point-table';
import { buildSeriesModel } from '@/lib/engine/series-model';
import { fitShape } from '@/lib/engine/shape';
import { seededRandom } from '@/tests/support/random';
import { datasetOfSimulated, simulateSeries } from '@/tests/support/simulated-series';

const SERIES = 200;
const POINTS = 20_000;
const RUNS = 12;
const WARM_UP = 4;
/** The bare table is short: so many in a row, for a figure above the clock's grain. */
const TABLES = 10;
/** What the project aims at, the Monte Carlo check apart. */
const AIM = 25;

const random = seededRandom(20_000);
const dataset = datasetOfSimulated(
  Array.from({ length: SERIES }, (_, i) =>
    moreUncertain(
      simulateSeries(random, `s${i}`, {
        points: POINTS / SERIES,
        bend: i % 10 === 0 ? { offset: 1.5 } : {},
      }),
    ),
  ),
);
dataset.temperature.u = 0.5;
dataset.ligands[0].stockRelativeU = 0.02;
const scored = dataset.series.map(score);

const runs = Array.from({ length: WARM_UP + RUNS }, () => ({
  table: processorMs(() => Array.from({ length: TABLES }, () => dataset.series.map(score))) / TABLES,
  whole: processorMs(() => assess(dataset)),
  shape: processorMs(() => dataset.series.map((series, i) => fitShape(dataset, series, scored[i]))),
  monteCarlo: processorMs(() => noteLinearUncertainty(dataset, scored)),
})).slice(WARM_UP);
const table = median(runs.map((run) => run.table));
const whole = median(runs.map((run) => run.whole));
const shape = median(runs.map((run) => run.shape));
const monteCarlo = median(runs.map((run) => run.monteCarlo));
process.stdout.write(
  [
    `${POINTS} points in ${SERIES} series, every tenth off the curve; processor time, medians of ${RUNS} runs`,
    `bare table of points: ${table.toFixed(1)} ms`,
    `whole assessment: ${whole.toFixed(1)} ms, of which shapes ${shape.toFixed(1)} ms, Monte Carlo ${monteCarlo.toFixed(1)} ms`,
    `ratio without Monte Carlo: ${((whole - monteCarlo) / table).toFixed(1)} (aim: at most ${AIM})`,
    '',
  ].join('\n'),
);

/** Uncertain sites and a correlation as well, so that every part of C is at work. */
function moreUncertain(series: SeriesInput): SeriesInput {
  const { siteClasses, ...rest } = series.parameters;
  return {
    ...series,
    parameters: {
      ...rest,
      siteClasses: siteClasses.map((one) => ({ ...one, sites: { ...one.sites, u: 0.2 } })),
      correlations: [{ a: 'gap', b: 'main/velline/inactive', r: -0.3 }],
    },
  };
}

function score(series: SeriesInput) {
  const model = buildSeriesModel(dataset, series);
  return { model, table: computePointTable(dataset, series, model), fittedHere: false, fittedCount: 0 };
}

function processorMs(run: () => unknown): number {
  const started = process.cpuUsage();
  run();
  const { user, system } = process.cpuUsage(started);
  return (user + system) / 1000;
}

function median(values: number[]): number {
  return values.sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? Number.NaN;
}
