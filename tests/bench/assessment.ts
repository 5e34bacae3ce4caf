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
const RUNS = 9;
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

const engineMs = medianMs(() => assess(document));
const leastMs = medianMs(() => JSON.stringify(JSON.parse(text) && assessment).length);
const callMs = medianMs(() => {
  if (assessBody(bytes, POINTS).kind !== 'assessed') throw new Error('The document was not assessed.');
});

const megabytes = (bytes.byteLength / 2 ** 20).toFixed(2);
process.stdout.write(
  [
    `${POINTS} points in ${SERIES} series, ${megabytes} MiB; medians of ${RUNS} runs`,
    `engine: ${engineMs.toFixed(1)} ms, ${Math.round((POINTS / engineMs) * 1000).toLocaleString('en-GB')} points per second`,
    `whole call (parse, check, assess, write): ${callMs.toFixed(1)} ms`,
    `JSON.parse of the request and JSON.stringify of the answer: ${leastMs.toFixed(1)} ms`,
    `ratio: ${(callMs / leastMs).toFixed(2)} (aim: at most ${AIM})`,
    '',
  ].join('\n'),
);

/** Median time of several runs, after some to warm up. */
function medianMs(run: () => void): number {
  for (let i = 0; i < 3; i++) run();
  const times = Array.from({ length: RUNS }, () => {
    const started = performance.now();
    run();
    return performance.now() - started;
  });
  return times.sort((a, b) => a - b)[Math.floor(RUNS / 2)] ?? Number.NaN;
}
