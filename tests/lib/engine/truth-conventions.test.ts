/**
 * Whether the misreading that was made is the one that is named: random series, each stated under one
 * misreading, and as many stated rightly. The seed is fixed and the figures are printed.
 */
import { describe, expect, it } from 'vitest';
import type { Misreading } from '@/lib/engine/assessment';
import { findConventions } from '@/lib/engine/conventions';
import type { DatasetInput } from '@/lib/engine/inputs';
import { sameMisreading } from '@/lib/engine/misreadings';
import { computePointTable } from '@/lib/engine/point-table';
import { seriesQ } from '@/lib/engine/q-statistic';
import { SeededRandom } from '@/lib/engine/seeded-random';
import { buildSeriesModel } from '@/lib/engine/series-model';
import { plantMisreading, randomDataset } from '@/tests/support/planted-series';

const SERIES_A_KIND = 200;
const CORRECT_SERIES = 2000;

const KINDS: Misreading[] = [
  { misreading: 'gap-orientation' },
  { misreading: 'gap-scope' },
  { misreading: 'swapped-constants' },
  { misreading: 'inverted-activity' },
  { misreading: 'concentration-scale', factor: 1e-3 },
  { misreading: 'concentration-scale', factor: 1e3 },
  { misreading: 'concentration-scale', factor: 1e-6 },
  { misreading: 'concentration-scale', factor: 1e6 },
  { misreading: 'gap-unit', unit: 'kT' },
  { misreading: 'gap-unit', unit: 'kJ/mol' },
  { misreading: 'gap-unit', unit: 'kcal/mol' },
  { misreading: 'gap-unit', unit: 'meV' },
  { misreading: 'association-constants' },
  { misreading: 'log-ratio', base: '10' },
  { misreading: 'log-ratio', base: 'e' },
];

const nameOf = (kind: Misreading) => Object.values(kind).join(' ');

function judge(dataset: DatasetInput) {
  const [series] = dataset.series;
  const model = buildSeriesModel(dataset, series);
  const scored = {
    model,
    table: computePointTable(dataset, series, model),
    fittedHere: false,
    fittedCount: 0,
  };
  const q = seriesQ(scored);
  return { q, found: findConventions(dataset, series, scored, q) };
}

/** How many of the series that a misreading changes measurably have it named first. */
function nameFirst(planted: Misreading): { first: number; tried: number } {
  const random = new SeededRandom(1965);
  let first = 0;
  let counted = 0;
  let tried = 0;
  while (counted < SERIES_A_KIND && tried < 20 * SERIES_A_KIND) {
    tried++;
    const dataset = plantMisreading(random, planted);
    if (dataset === null) continue;
    const { q, found } = judge(dataset);
    if (q.rmsZ <= 4) continue;
    counted++;
    if (found.length > 0 && sameMisreading(found[0], planted)) first++;
  }
  expect(counted).toBe(SERIES_A_KIND);
  return { first, tried };
}

describe('statistical truth of the misreadings', () => {
  let overall = 0;

  it.each(KINDS.map((kind) => [nameOf(kind), kind] as const))(
    '%s is named first in at least 80 %%',
    (name, planted) => {
      const { first, tried } = nameFirst(planted);
      overall += first;
      console.info(`${name}: first in ${first} of ${SERIES_A_KIND} (${tried} drawn)`);
      expect(first).toBeGreaterThanOrEqual(0.8 * SERIES_A_KIND);
    },
  );

  it('and in at least 90 % over all kinds', () => {
    const share = overall / (KINDS.length * SERIES_A_KIND);
    console.info(`all kinds: first in ${(100 * share).toFixed(1)} %`);
    expect(share).toBeGreaterThanOrEqual(0.9);
  });

  it('with none planted, one is reported for at most 1 %', () => {
    const random = new SeededRandom(1968);
    let reported = 0;
    for (let i = 0; i < CORRECT_SERIES; i++) if (judge(randomDataset(random)).found.length > 0) reported++;
    console.info(`none planted: reported for ${reported} of ${CORRECT_SERIES}`);
    expect(reported).toBeLessThanOrEqual(0.01 * CORRECT_SERIES);
  });
});
