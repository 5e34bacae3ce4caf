/**
 * `npm run bench`: how fast a document of 20,000 points in 200 series is assessed, by itself and against the least
 * that any server would have to do with it, which is to parse the request and to write the answer.
 */
import { assessBody } from '@/lib/assessments/assess-body';
import { parseDocument } from '@/lib/documents/parse-document';
import { assess } from '@/lib/engine/assess';
import { exampleDocument } from '@/tests/support/example-document';

const SERIES = 200;
const POINTS = 20_000;
const RUNS = 15;
const WARM_UP = 5;
/** What the project aims at: the whole call in at most three times the least. */
const AIM = 3;

const bytes = new TextEncoder().encode(
  JSON.stringify(exampleDocument({ series: SERIES, pointsPerSeries: POINTS / SERIES, seed: 20_000 })),
);
const parsed = parseDocument(bytes);
if (!parsed.ok) throw new Error(`The document of the bench is not valid: ${JSON.stringify(parsed)}`);
const { document } = parsed;
const assessment = assess(document);
const text = new TextDecoder().decode(bytes);

// The two sides of the ratio take turns, so that what else the machine does meets both alike.
const runs = Array.from({ length: WARM_UP + RUNS }, () => ({
  engine: timeMs(() => assess(document)),
  least: timeMs(() => JSON.stringify(JSON.parse(text) && assessment).length),
  call: timeMs(() => {
    if (assessBody(bytes, POINTS).kind !== 'assessed') throw new Error('The document was not assessed.');
  }),
})).slice(WARM_UP);
const engineMs = median(runs.map(({ engine }) => engine));
const callMs = median(runs.map(({ call }) => call));
const leastMs = median(runs.map(({ least }) => least));
const ratio = median(runs.map(({ call, least }) => call / least));

const megabytes = (bytes.byteLength / 2 ** 20).toFixed(2);
process.stdout.write(
  [
    `${POINTS} points in ${SERIES} series, ${megabytes} MiB; medians of ${RUNS} runs`,
    `engine: ${engineMs.toFixed(1)} ms, ${Math.round((POINTS / engineMs) * 1000).toLocaleString('en-GB')} points per second`,
    `whole call (parse, check, assess, write): ${callMs.toFixed(1)} ms`,
    `JSON.parse of the request and JSON.stringify of the answer: ${leastMs.toFixed(1)} ms`,
    `ratio, median of ${RUNS} turns: ${ratio.toFixed(2)} (aim: at most ${AIM})`,
    '',
  ].join('\n'),
);

function timeMs(run: () => unknown): number {
  const started = performance.now();
  run();
  return performance.now() - started;
}

function median(values: number[]): number {
  return values.sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? Number.NaN;
}
