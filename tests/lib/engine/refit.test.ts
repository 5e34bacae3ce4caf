/** Refits against an independent computation, planted truth, and what data cannot tell. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { countFreeValues, FREE_PARAMETERS, type FreeParameter } from '@/lib/engine/free-parameters';
import type { DatasetInput, SeriesInput } from '@/lib/engine/inputs';
import { type RefitProgress, refit } from '@/lib/engine/refit';
import reference from '@/tests/reference/refit-reference.json';
import { arbitraryDataset } from '@/tests/support/arbitrary-dataset';
import { expectClose } from '@/tests/support/close-to';
import { type Random, seededRandom } from '@/tests/support/random';
import { datasetOf, LIGAND, numbersOf, siteClass } from '@/tests/support/small-dataset';

const GAP: FreeParameter = { parameter: 'gap', share: 'series' };
const constant = (parameter: 'inactive' | 'active', share: 'series' | 'dataset' = 'series') =>
  ({ parameter, siteClass: 'main', ligand: LIGAND, share }) as const;

interface Truth {
  gap: number;
  sites: number;
  inactive: number;
  active: number;
}

/** p(f) written out anew: Monod, Wyman & Changeux, J. Mol. Biol. 12, 88 (1965). */
function activityOf({ gap, sites, inactive, active }: Truth, c: number): number {
  return 1 / (1 + Math.exp(-gap) * ((1 + c / inactive) / (1 + c / active)) ** sites);
}

const U = 0.02;
const CONCENTRATIONS = [0, 0.5, 1, 2, 4, 6, 9, 13, 18, 25, 40, 80, 200, 900];

/** One series of the truth with noise as large as the fit takes it (√(u_a² + u_0²)); stated as something else. */
function measured(truth: Truth, stated: Truth, random: Random | null, id = 'wt'): SeriesInput {
  const points = CONCENTRATIONS.map((c) => ({
    ligands: { [LIGAND]: c },
    activity: activityOf(truth, c) + (random?.normal() ?? 0) * Math.hypot(U, 0.01),
    u: U,
  }));
  const parameters = {
    gap: { value: stated.gap, unit: 'kT' as const, orientation: 'inactive-minus-active' as const },
    siteClasses: [siteClass(stated.sites, stated.inactive, stated.active)],
  };
  return { ...datasetOf(parameters, points).series[0], id };
}

function datasetWith(...series: SeriesInput[]): DatasetInput {
  return { ...datasetOf({ siteClasses: [] }, []), series };
}

describe('against scipy (compute-refit-reference.py)', () => {
  const dataset = reference.dataset as DatasetInput;
  it.each(reference.fits.map((fit, index) => ({ index, fit })))('fit $index', ({ fit }) => {
    const found = refit(dataset, fit.free as FreeParameter[]);
    expect(found.converged).toBe(true);
    expectClose(found.chiSquared, fit.chiSquared, 1e-9, 'χ²');
    const points = dataset.series.reduce((sum, { points }) => sum + points.length, 0);
    expect(found.degreesOfFreedom).toBe(points - fit.variables.length);
    expectClose(found.reducedChiSquared, fit.chiSquared / found.degreesOfFreedom, 1e-9, 'reduced χ²');
    found.estimates.forEach(({ parameter, unit, value, u }, j) => {
      const logarithmic = parameter !== 'gap' && parameter !== 'slope';
      const inMicromolar = value * (unit === 'mM' ? 1000 : 1);
      const name = `${parameter} ${j}`;
      expectClose(logarithmic ? Math.log(inMicromolar) : value, fit.variables[j], 1e-6, name, 1e-300);
      expectClose((u ?? 0) / (logarithmic ? value : 1), fit.standardErrors[j], 1e-6, `u of ${name}`, 1e-300);
      for (const [k, r] of fit.correlations[j].entries())
        expectClose(found.correlations[j][k], r, 1e-6, `r ${j} ${k}`);
    });
  });

  it('says of each estimate whose it is, its unit, and what was stated', () => {
    const shared = refit(dataset, reference.fits[0].free as FreeParameter[]);
    const { estimates } = shared;
    expect(estimates.map(({ series, unit }) => [series, unit])).toEqual([
      ['wt', 'kT'],
      ['hinge', 'kT'],
      [null, null],
      [null, 'uM'],
    ]);
    // The second series states −1.3 kT of active − inactive in kJ/mol at 310.15 K.
    expectClose(estimates[1].stated, 1.3, 1e-12);
    // 2.5 and 2 sites are stated: the fit starts at their geometric mean. K is stated as 18 µM by both.
    expectClose(estimates[2].stated, Math.sqrt(5), 1e-12);
    expect(estimates[3].stated).toBe(18);
    const own = refit(dataset, [
      { parameter: 'active', siteClass: 'main', ligand: 'velline', share: 'series' },
    ]);
    expect(own.estimates.map(({ unit, stated }) => [unit, stated])).toEqual([
      ['uM', 140],
      ['mM', 0.14],
    ]);
  });

  it('shares a constant that is stated in two units in the unit of the first', () => {
    const free = [{ parameter: 'active', siteClass: 'main', ligand: 'velline', share: 'dataset' }] as const;
    const [estimate] = refit(dataset, free).estimates;
    expect([estimate.series, estimate.unit]).toEqual([null, 'uM']);
    expectClose(estimate.stated, 140, 1e-12);
  });
});

describe('planted truth', () => {
  const TRUTH: Truth = { gap: 2.1, sites: 2, inactive: 12, active: 90 };
  const STATED: Truth = { gap: 3, sites: 2, inactive: 20, active: 150 };

  it('is found to the last digits where nothing is uncertain', () => {
    const found = refit(datasetWith(measured(TRUTH, STATED, null)), [
      GAP,
      constant('inactive'),
      constant('active'),
    ]);
    expect(found.converged).toBe(true);
    for (const [j, value] of [TRUTH.gap, TRUTH.inactive, TRUTH.active].entries())
      expectClose(found.estimates[j].value, value, 1e-9, `estimate ${j}`);
  });

  it('lies within 2u of the estimates in 95 % of cases', () => {
    const random = seededRandom(4);
    const names = ['gap', 'inactive', 'active'] as const;
    const hits = { gap: 0, inactive: 0, active: 0 };
    let chiSquared = 0;
    const runs = 600;
    for (let run = 0; run < runs; run++) {
      const found = refit(datasetWith(measured(TRUTH, STATED, random)), [
        GAP,
        constant('inactive'),
        constant('active'),
      ]);
      expect(found.converged).toBe(true);
      chiSquared += found.reducedChiSquared ?? 0;
      names.forEach((name, j) => {
        const { value, u } = found.estimates[j];
        // Constants are fitted as ln K: their interval is one of ln K.
        const off = name === 'gap' ? value - TRUTH.gap : value * Math.log(value / TRUTH[name]);
        if (Math.abs(off) <= 2 * (u ?? 0)) hits[name]++;
      });
    }
    const shares = names.map((name) => hits[name] / runs);
    const figures = shares.map((share, j) => `${names[j]} ${(100 * share).toFixed(1)} %`).join(', ');
    console.log(`truth within 2u of ${runs} refits: ${figures}; mean χ²/ν ${(chiSquared / runs).toFixed(3)}`);
    // 95.45 % of normal errors; the standard deviation of a share of 600 is 0.85 %.
    for (const share of shares) expect(Math.abs(share - 0.9545)).toBeLessThan(0.03);
    expect(Math.abs(chiSquared / runs - 1)).toBeLessThan(0.05);
  });

  it('is shared between series, or each has its own', () => {
    const random = seededRandom(5);
    const other = { ...TRUTH, gap: 0.5, inactive: 24 };
    const dataset = datasetWith(measured(TRUTH, STATED, random), measured(other, STATED, random, 'hinge'));
    const own = refit(dataset, [GAP, constant('inactive', 'series')]);
    expect(own.estimates.map(({ series, parameter }) => [series, parameter])).toEqual([
      ['wt', 'gap'],
      ['hinge', 'gap'],
      ['wt', 'inactive'],
      ['hinge', 'inactive'],
    ]);
    const shared = refit(dataset, [GAP, constant('inactive', 'dataset')]);
    expect(shared.estimates).toHaveLength(3);
    const [k1, k2] = [own.estimates[2].value, own.estimates[3].value];
    expect(shared.estimates[2].value).toBeGreaterThan(Math.min(k1, k2));
    expect(shared.estimates[2].value).toBeLessThan(Math.max(k1, k2));
    expect(shared.chiSquared).toBeGreaterThan(own.chiSquared);
    expect(own.correlations[0][1]).toBe(0); // the series have nothing in common
  });

  it('is found in a gap per site', () => {
    const perSite: FreeParameter = { parameter: 'gapPerSite', siteClass: 'main', share: 'series' };
    const series = measured(TRUTH, STATED, null);
    const [main] = series.parameters.siteClasses;
    const gapPerSite = { value: 1, unit: 'kT' as const, orientation: 'inactive-minus-active' as const };
    const parameters = { origin: 'independent' as const, siteClasses: [{ ...main, gapPerSite }] };
    const found = refit(datasetWith({ ...series, parameters }), [
      perSite,
      constant('inactive'),
      constant('active'),
    ]);
    expectClose(found.estimates[0].value, TRUTH.gap / TRUTH.sites, 1e-9);
  });
});

describe('what the data do not determine', () => {
  // Six sites close the complex long before the active state is bound: nothing says where K_active lies.
  const TRUTH: Truth = { gap: 2.1, sites: 6, inactive: 12, active: 1e5 };

  it('is said of K_active alone, where no point reaches it', () => {
    const found = refit(datasetWith(measured(TRUTH, { ...TRUTH, active: 5e4 }, seededRandom(6))), [
      GAP,
      constant('inactive'),
      constant('active'),
    ]);
    expect(found.estimates.map(({ determined }) => determined)).toEqual([true, true, false]);
    // How little they say of it is a number all the same: above 1 in ln K.
    const { u, value } = found.estimates[2];
    expect((u ?? 0) / value).toBeGreaterThan(1);
    expect(found.estimates[1].u).toBeGreaterThan(0);
  });

  it('is said of two gaps that act as one', () => {
    const series = measured(TRUTH, TRUTH, seededRandom(7));
    const [main] = series.parameters.siteClasses;
    const gapPerSite = { value: 0.1, unit: 'kT' as const, orientation: 'inactive-minus-active' as const };
    const parameters = { ...series.parameters, siteClasses: [{ ...main, gapPerSite }] };
    const found = refit(datasetWith({ ...series, parameters }), [
      GAP,
      { parameter: 'gapPerSite', siteClass: 'main', share: 'series' },
      constant('inactive'),
    ]);
    expect(found.estimates.map(({ determined }) => determined)).toEqual([false, false, true]);
  });

  it('is never said of a gap for its standard error alone, only for what cannot be told apart', () => {
    const series = measured({ ...TRUTH, gap: 6 }, { ...TRUTH, gap: 6 }, null);
    const open = series.points.slice(0, 2).map((point) => ({ ...point, activity: 0.99, u: 0.2 }));
    const [gap] = refit(datasetWith({ ...series, points: open }), [GAP]).estimates;
    expect(gap.u).toBeGreaterThan(1);
    expect(gap.determined).toBe(true);
  });

  it('is said, and that nothing converged, where the points do not respond at the start', () => {
    const series = measured(TRUTH, { ...TRUTH, gap: 190, inactive: 1e6 }, null);
    const found = refit(datasetWith(series), [GAP, constant('inactive')]);
    expect(found.chiSquared).toBeGreaterThan(1000);
    expect(found.converged).toBe(false);
    expect(found.estimates.map(({ determined }) => determined)).toEqual([false, false]);
  });

  it('is said where χ² falls no further while a value runs away', () => {
    // Noise makes the site count of a nearly exponential curve run to its bound.
    let steps = 0;
    for (let seed = 20; seed < 32; seed++) {
      const series = measured({ gap: 0.2, sites: 1, inactive: 400, active: 1e6 }, TRUTH, seededRandom(seed));
      const found = refit(datasetWith(series), [
        GAP,
        constant('inactive'),
        constant('active'),
        { parameter: 'sites', siteClass: 'main', share: 'series' },
      ]);
      expect(found.converged).toBe(true);
      steps = Math.max(steps, found.iterations);
    }
    expect(steps).toBeLessThan(500);
  });

  it('is said where there are more values than points, and no reduced χ² then', () => {
    const series = measured(TRUTH, TRUTH, seededRandom(8));
    const found = refit(datasetWith({ ...series, points: series.points.slice(4, 6) }), [
      GAP,
      constant('inactive'),
      { parameter: 'sites', siteClass: 'main', share: 'series' },
    ]);
    expect(found.degreesOfFreedom).toBe(0);
    expect(found.reducedChiSquared).toBeNull();
    expect(found.estimates.some(({ determined }) => determined)).toBe(false);
  });
});

it('tells its progress and ends where it is told to', () => {
  const series = measured(
    { gap: 2, sites: 3, inactive: 12, active: 150 },
    { gap: 4, sites: 5, inactive: 60, active: 90 },
    seededRandom(9),
  );
  const free = [GAP, constant('inactive'), constant('active')];
  const seen: RefitProgress[] = [];
  const whole = refit(datasetWith(series), free, { onProgress: (progress) => seen.push(progress) });
  expect(seen.map(({ iteration }) => iteration)).toEqual(seen.map((_, i) => i + 1));
  expect(seen.at(-1)?.iteration).toBe(whole.iterations);
  seen.forEach(({ progress }, i) => {
    expect(progress).toBeGreaterThanOrEqual(seen[i - 1]?.progress ?? 0);
    expect(progress).toBeLessThanOrEqual(1);
  });
  const stopped = refit(datasetWith(series), free, { shouldStop: () => true });
  expect([stopped.converged, stopped.iterations]).toEqual([false, 1]);
  expect(refit(datasetWith(series), free, { mostIterations: 2 }).iterations).toBe(2);
});

describe('any dataset', () => {
  const someFree = fc.subarray(
    FREE_PARAMETERS.flatMap((parameter): FreeParameter[] => {
      if (parameter === 'gap') return [{ parameter, share: 'series' }];
      if (parameter === 'slope') return [{ parameter, modulator: 'V', share: 'dataset' }];
      const of = { parameter, siteClass: 'class-0', share: 'dataset' as const };
      const bound = parameter === 'inactive' || parameter === 'active';
      return bound
        ? [
            { ...of, ligand: 'first' },
            { ...of, ligand: 'second', share: 'series' },
          ]
        : [of];
    }),
    { minLength: 1 },
  );

  it('gives finite numbers, within the ranges of a document', () => {
    fc.assert(
      fc.property(arbitraryDataset, someFree, (dataset, free) => {
        const found = refit(dataset, free, { mostIterations: 60 });
        for (const [path, value] of numbersOf(found)) expect(Number.isFinite(value), path).toBe(true);
        expect(found.estimates).toHaveLength(countFreeValues(dataset, free));
        for (const { parameter, value, u, stated, determined } of found.estimates) {
          // Some of these datasets state a gap beyond 200 kT, which the engine takes as it comes.
          if (parameter === 'gap' || parameter === 'gapPerSite')
            expect(Math.abs(value)).toBeLessThanOrEqual(Math.max(200, Math.abs(stated)));
          if (parameter === 'sites') expect(value).toBeLessThanOrEqual(1000 * (1 + 1e-12));
          if (parameter === 'inactive' || parameter === 'active') expect(value).toBeGreaterThan(0);
          if (determined) expect(u).not.toBeNull();
          if (u !== null) expect(u).toBeGreaterThan(0);
        }
        found.correlations.forEach((row, j) => {
          expect(row[j]).toBe(1);
          row.forEach((r, k) => {
            expect(r).toBe(found.correlations[k][j]);
            if (r !== null) expect(Math.abs(r)).toBeLessThanOrEqual(1);
          });
        });
      }),
      { numRuns: 150, seed: 12 },
    );
  });
});
