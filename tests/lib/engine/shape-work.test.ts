/** Valid documents of many uncertain quantities are assessed within seconds, and what is left out is said. */
import { describe, expect, it } from 'vitest';
import { assess } from '@/lib/engine/assess';
import type { DatasetInput, SiteClassInput } from '@/lib/engine/inputs';
import { seededRandom } from '@/tests/support/random';
import { LIGAND, siteClass } from '@/tests/support/small-dataset';

interface Size {
  points: number;
  classes: number;
  ligands: number;
}

/** One series of `classes` site classes, every constant and count uncertain and all of different strengths. */
function wideDataset({ points, classes, ligands }: Size): DatasetInput {
  const random = seededRandom(31);
  const names = Array.from({ length: ligands }, (_, l) => (l === 0 ? LIGAND : `ligand-${l}`));
  const siteClasses = Array.from({ length: classes }, (_, s): SiteClassInput => {
    const own = () => siteClass(0.4, 10 ** random.uniform(0, 3), 10 ** random.uniform(0, 3));
    const binding = names.map((ligand) => {
      const { inactive, active } = own().binding[0];
      return {
        ligand,
        inactive: inactive && { ...inactive, u: 0.1 * inactive.value },
        active: active && { ...active, u: 0.1 * active.value },
      };
    });
    return { id: `c${s}`, sites: { value: 0.4, u: 0.04 }, binding };
  });
  return {
    temperature: { value: 298.15, unit: 'K' },
    ligands: names.map((id) => ({ id, unit: 'uM', concentration: 'free' })),
    normalisation: { method: 'absolute' },
    series: [
      {
        id: 'wt',
        parameters: {
          origin: 'independent',
          gap: { value: 1, unit: 'kT', orientation: 'inactive-minus-active', u: 0.1 },
          siteClasses,
        },
        points: Array.from({ length: points }, () => ({
          ligands: Object.fromEntries(names.map((name) => [name, 10 ** random.uniform(-1, 4)])),
          activity: random.uniform(0, 1),
          u: 0.02,
        })),
      },
    ],
  };
}

function timed(size: Size) {
  const dataset = wideDataset(size);
  const before = process.cpuUsage();
  const [series] = assess(dataset).series;
  const { user, system } = process.cpuUsage(before);
  const seconds = (user + system) / 1e6;
  console.log(
    `${size.points} points, ${size.classes} classes, ${size.ligands} ligands: ${seconds.toFixed(1)} s`,
  );
  return { series, seconds };
}

describe('a dataset of many uncertain quantities', { timeout: 120_000 }, () => {
  it.each([
    { points: 4_000, classes: 50, ligands: 1 },
    { points: 2_000, classes: 10, ligands: 19 },
  ])('of $points points, $classes classes and $ligands ligands takes less than ten seconds', (size) => {
    expect(timed(size).seconds).toBeLessThan(10);
  });

  it('says where shapes were not tried, and tries them on fewer points', () => {
    const { series } = timed({ points: 2_000, classes: 10, ligands: 19 });
    expect(series.shape).toMatchObject({ best: 'none', alternatives: [] });
    expect(series.notes.map(({ code }) => code)).toContain('shape-not-tried');
    const few = timed({ points: 100, classes: 10, ligands: 19 }).series;
    expect(few.shape.alternatives.length).toBeGreaterThan(0);
    expect(few.notes.map(({ code }) => code)).not.toContain('shape-not-tried');
  });
});
