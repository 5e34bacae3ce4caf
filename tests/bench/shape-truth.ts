/**
 * `npm run bench`: the counts of `tests/lib/engine/truth-shape.test.ts` over ten times as many series, printed.
 */
import { uniformityPValue } from '@/tests/support/kolmogorov-smirnov';
import { correctSeries, PLANTED, plantedShape } from '@/tests/support/shape-truth';

const SERIES = 20_000;
const PLANTED_SERIES = 3000;
const percent = (share: number) => `${(100 * share).toFixed(2)} %`;

for (const replicates of [1, 3]) {
  const { beyondWarning, pValues, named } = correctSeries(SERIES, replicates, 2026);
  const below = (limit: number) => percent(pValues.filter((p) => p < limit).length / SERIES);
  print(
    `${SERIES} correct series, ${replicates === 1 ? 'u stated' : 'three replicates'}: ` +
      `${percent(beyondWarning)} of points beyond the warning limit; p of Q below 0.01 for ${below(0.01)}, ` +
      `below 0.1 for ${below(0.1)}, uniform with Kolmogorov–Smirnov p = ${uniformityPValue(pValues).toPrecision(3)}; ` +
      `a shape named for ${percent(named)}`,
  );
}
for (const [kind, bend] of PLANTED) {
  const { coverage, fitted, chosen } = plantedShape(kind, bend, PLANTED_SERIES, 2026);
  const covers = Object.entries(coverage).map(([name, share]) => `${name} ± 2u covers ${percent(share)}`);
  print(
    `${kind} ${JSON.stringify(bend)}: ${covers.join(', ')}; fitted ${percent(fitted)}, named ${percent(chosen)}`,
  );
}

function print(line: string): void {
  process.stdout.write(`${line}\n`);
}
