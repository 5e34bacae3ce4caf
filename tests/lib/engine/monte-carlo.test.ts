/** Random numbers, propagation of distributions, and what the assessment says of the linear form. */
import { describe, expect, it } from 'vitest';
import type { DatasetInput, ParametersInput } from '@/lib/engine/inputs';
import { compareWithMonteCarlo, noteLinearUncertainty } from '@/lib/engine/monte-carlo';
import { normalMidpoints } from '@/lib/engine/normal-midpoints';
import { computePointTable, quadraticForm } from '@/lib/engine/point-table';
import { propagate } from '@/lib/engine/propagate';
import type { ScoredSeries } from '@/lib/engine/q-statistic';
import { SeededRandom } from '@/lib/engine/seeded-random';
import { buildSeriesModel } from '@/lib/engine/series-model';
import checks from '@/tests/reference/outside-checks.json';
import { expectClose } from '@/tests/support/close-to';
import { datasetOf, LIGAND, pointsAt, siteClass } from '@/tests/support/small-dataset';

function check(id: string): { inputs: Record<string, number[]>; expected: Record<string, string> } {
  const found = checks.checks.find((one) => one.id === id);
  if (!found) throw new Error(`no check ${id}`);
  return found as never;
}

describe('seeded random numbers', () => {
  it('are the same for the same seed and others for another', () => {
    const take = (seed: number) => {
      const random = new SeededRandom(seed);
      return Array.from({ length: 5 }, () => random.uniform());
    };
    expect(take(3)).toEqual(take(3));
    expect(take(3)).not.toEqual(take(4));
    expect(new Set(take(0)).size).toBe(5);
  });
  it('uniform and normal moments (standard errors: four of them allowed)', () => {
    const random = new SeededRandom(5);
    const trials = 200_000;
    const { mean, deviation } = propagate(trials, 3, (out) => {
      out[0] = random.uniform();
      out[1] = random.normal();
      out[2] = out[1] ** 4;
    });
    expect(Math.abs(mean[0] - 0.5)).toBeLessThan((4 * Math.sqrt(1 / 12)) / Math.sqrt(trials));
    expectClose(deviation[0], Math.sqrt(1 / 12), 0.005);
    expect(Math.abs(mean[1])).toBeLessThan(4 / Math.sqrt(trials));
    expectClose(deviation[1], 1, 4 / Math.sqrt(2 * trials));
    // The fourth moment of a normal variable is 3, its variance 96.
    expect(Math.abs(mean[2] - 3)).toBeLessThan(4 * Math.sqrt(96 / trials));
  });
});

describe('slices of the normal distribution', () => {
  it('are those of the tables (Φ(0.6745) = 0.75, Φ(1.9600) = 0.975), with mean 0 and variance 1', () => {
    const points = normalMidpoints(100_000);
    // Quantiles of the standard normal, R and mpmath; the scaling to unit variance moves them by 1e-5.
    expectClose(points[74_999], 0.6744897501960817, 1e-4);
    expectClose(points[97_499], 1.959963984540054, 1e-4);
    expectClose(points[999], -2.3263478740408408, 3e-4);
    expectClose(
      points.reduce((sum, x) => sum + x, 0),
      0,
      1e-9,
    );
    expectClose(points.reduce((sum, x) => sum + x * x, 0) / points.length, 1, 1e-12);
    expect([...normalMidpoints(3)][1]).toBe(0);
  });
});

describe('A23 correlated inputs (JCGM 100:2008, H.2: impedance from voltage, current and phase; data from memory, outputs recomputed)', () => {
  const { inputs, expected } = check('A23');
  const samples = [inputs.V, inputs.I_A, inputs.phi];
  const mean = (x: number[]) => x.reduce((sum, value) => sum + value, 0) / x.length;
  const covariance = (x: number[], y: number[]) =>
    x.reduce((sum, value, i) => sum + (value - mean(x)) * (y[i] - mean(y)), 0) / (x.length - 1) / x.length;
  const u = samples.map((x) => Math.sqrt(covariance(x, x)));
  const correlation = Float64Array.from(
    samples.flatMap((x, i) => samples.map((y, j) => covariance(x, y) / u[i] / u[j])),
  );
  const [V, I, phi] = samples.map(mean);
  const [Z, cos, sin] = [V / I, Math.cos(phi), Math.sin(phi)];
  /** scaled gradients ∂/∂θ·u_θ of R = Z cos φ, X = Z sin φ and Z */
  const gradients = {
    R: [cos / I, (-Z * cos) / I, -Z * sin],
    X: [sin / I, (-Z * sin) / I, Z * cos],
    Z: [1 / I, -Z / I, 0],
  };
  const variance = (gradient: number[], r: Float64Array | null = correlation) =>
    quadraticForm(
      Float64Array.from(gradient, (value, k) => value * u[k]),
      0,
      3,
      r,
    );
  const sum = (a: number[], b: number[]) => a.map((value, k) => value + b[k]);
  const correlated = (a: number[], b: number[]) =>
    (variance(sum(a, b)) - variance(a) - variance(b)) / 2 / Math.sqrt(variance(a) * variance(b));

  it('u(R), u(X), u(Z), and u(R) where the correlation is ignored', () => {
    expectClose(Math.sqrt(variance(gradients.R)), Number(expected.u_R), 1e-10, 'u(R)', 1e-300);
    expectClose(Math.sqrt(variance(gradients.X)), Number(expected.u_X), 1e-10, 'u(X)', 1e-300);
    expectClose(Math.sqrt(variance(gradients.Z)), Number(expected.u_Z), 1e-10, 'u(Z)', 1e-300);
    const ignored = Math.sqrt(variance(gradients.R, null));
    expectClose(ignored, Number(expected.u_R_if_correlation_ignored), 1e-10, 'ignored', 1e-300);
  });
  it('correlations of the outputs', () => {
    expectClose(correlated(gradients.R, gradients.X), Number(expected.r_RX), 1e-9);
    expectClose(correlated(gradients.R, gradients.Z), Number(expected.r_RZ), 1e-9);
    expectClose(correlated(gradients.X, gradients.Z), Number(expected.r_XZ), 1e-9);
  });
});

describe('A25 four rectangular quantities (JCGM 101:2008, 9.2.3; printed ±3.88 from memory, exact by Irwin–Hall)', () => {
  it('u = 2 and the shortest 95 % interval ±3.879', () => {
    const random = new SeededRandom(9);
    const sums: number[] = [];
    const rectangular = () => Math.sqrt(12) * (random.uniform() - 0.5);
    const { deviation } = propagate(1_000_000, 1, (out) => {
      out[0] = rectangular() + rectangular() + rectangular() + rectangular();
      sums.push(Math.abs(out[0]));
    });
    const { expected } = check('A25');
    expectClose(deviation[0], Number(expected.u), 0.005);
    const halfWidth = Float64Array.from(sums).sort()[Math.round(0.95 * sums.length)];
    expect(Math.abs(halfWidth - Number(expected.half_width_95))).toBeLessThan(0.01);
    // What the linear form with its normal coverage factor would say lies visibly outside.
    expect(Number(expected.GUF_half_width) - halfWidth).toBeGreaterThan(0.03);
  });
});

describe('A26 where the linear form fails (JCGM 101:2008, 9.4 and 9.3; printed values from memory, exact ones computed)', () => {
  const { expected } = check('A26');
  it('comparison loss, δY = X₁² + X₂² about 0.010 and 0', () => {
    const random = new SeededRandom(10);
    const { mean, deviation } = propagate(1_000_000, 1, (out) => {
      out[0] = (0.01 + 0.005 * random.normal()) ** 2 + (0.005 * random.normal()) ** 2;
    });
    expectClose(mean[0], Number(expected.mean), 2e-3, 'mean', 1e-300);
    expectClose(deviation[0], Number(expected.u), 4e-3, 'u', 1e-300);
    expect(deviation[0] / Number(expected.GUF_u)).toBeGreaterThan(1.1);
  });
  it('mass calibration: 0.0754 mg instead of the linear 0.0539 mg', () => {
    const wanted = expected.mass_9_3 as unknown as Record<string, string>;
    const random = new SeededRandom(11);
    const rectangular = (low: number, high: number) => low + (high - low) * random.uniform();
    const { mean, deviation } = propagate(500_000, 1, (out) => {
      const reference = 100_000 + 0.05 * random.normal() + 1.234 + 0.02 * random.normal();
      const air = rectangular(1.1, 1.3) - 1.2;
      const buoyancy = air * (1 / rectangular(7000, 9000) - 1 / rectangular(7950, 8050));
      out[0] = reference * (1 + buoyancy) - 100_000;
    });
    expectClose(mean[0], Number(wanted.MC_mean_mg), 1e-3);
    expectClose(deviation[0], Number(wanted.MC_u_mg), 4e-3, 'u', 1e-300);
  });
});

function score(dataset: DatasetInput): ScoredSeries[] {
  return dataset.series.map((series) => {
    const model = buildSeriesModel(dataset, series);
    const table = computePointTable(dataset, series, model);
    return { model, table, fittedHere: false, fittedCount: 0 };
  });
}

const withGap = (value: number, u: number, changes: Partial<ParametersInput> = {}, points = pointsAt(0)) =>
  datasetOf(
    {
      gap: { value, unit: 'kT', orientation: 'inactive-minus-active', u },
      siteClasses: [siteClass(4, 10, 1000)],
      ...changes,
    },
    points,
  );

interface Uncertain {
  relativeU?: number;
  stockRelativeU?: number;
  inactive?: number;
  active?: number;
  sites?: number;
  slope?: number;
  temperatureU?: number;
  perSite?: number;
}

/** One point of a series with modulator, in which one quantity is uncertain. The slope is stated the other way round. */
function oneUncertain(uncertain: Uncertain): DatasetInput {
  const { relativeU, stockRelativeU, temperatureU, perSite, slope } = uncertain;
  const unit = 'kJ/mol' as const;
  const gap = { value: 6, unit, orientation: 'inactive-minus-active' as const };
  const classOf = siteClass(3, 10, 100, uncertain);
  return datasetOf(
    {
      ...(perSite === undefined ? { gap } : {}),
      siteClasses: [
        perSite === undefined ? classOf : { ...classOf, gapPerSite: { ...gap, value: 2, u: perSite } },
      ],
      modulation: [
        {
          modulator: 'V',
          slope: { value: -0.5, unit, orientation: 'active-minus-inactive', u: slope },
          reference: 1,
        },
      ],
    },
    [{ ligands: { [LIGAND]: 30 }, modulators: { V: 5 }, activity: 0.5, u: 0.02 }],
    {
      ligands: [{ id: LIGAND, unit: 'uM', concentration: 'free', relativeU, stockRelativeU }],
      temperatureU,
    },
  );
}

/** Standard deviation of p(f) for a normal f, by Simpson's rule over ± 10 standard deviations. */
function exactDeviation(mean: number, u: number): number {
  const steps = 4000;
  const moments = [0, 0];
  for (let i = 0; i <= steps; i++) {
    const x = -10 + (20 * i) / steps;
    const weight = (i === 0 || i === steps ? 1 : i % 2 === 1 ? 4 : 2) * Math.exp((-x * x) / 2);
    const p = 1 / (1 + Math.exp(-(mean + u * x)));
    moments[0] += weight * p;
    moments[1] += weight * p * p;
  }
  const scale = 20 / steps / 3 / Math.sqrt(2 * Math.PI);
  return Math.sqrt(moments[1] * scale - (moments[0] * scale) ** 2);
}

describe('linear against Monte Carlo', () => {
  it.each([
    [0, 1],
    [2, 0.8],
    [3, 1.5],
    [-4, 0.6],
    [1, 3],
  ])('a normal energy of %s ± %s kT, by quadrature', (gap, u) => {
    const dataset = withGap(gap, u);
    const [[pair]] = compareWithMonteCarlo(dataset, score(dataset), 200_000);
    expectClose(pair.monteCarlo, exactDeviation(gap, u), 0.01, 'deviation', 1e-300);
    const [off] = noteLinearUncertainty(dataset, score(dataset));
    const differs = Math.abs(exactDeviation(gap, u) / pair.linear - 1) > 0.06;
    expect(off.map(({ code }) => code)).toEqual(differs ? ['linear-uncertainty'] : []);
  });

  it('a lognormal constant: without gap and with one site f = −ln(1 + c/K), by quadrature over ln K', () => {
    const dataset = withGap(0, 0, { siteClasses: [siteClass(1, 10, null, { inactive: 0.9 })] }, pointsAt(5));
    const [[pair]] = compareWithMonteCarlo(dataset, score(dataset), 200_000);
    // p = K/(2K + c) depends on ln K alone; its mean and variance by the midpoint rule.
    const moments = [0, 0, 0];
    for (let x = -8; x < 8; x += 0.001) {
      const K = 10 * Math.exp(0.9 * (x + 0.0005));
      const p = 1 / (1 + (1 + 5 / K));
      const weight = Math.exp(-((x + 0.0005) ** 2) / 2);
      [1, p, p * p].forEach((value, i) => {
        moments[i] += weight * value;
      });
    }
    const exact = Math.sqrt(moments[2] / moments[0] - (moments[1] / moments[0]) ** 2);
    expectClose(pair.monteCarlo, exact, 0.01, 'deviation', 1e-300);
  });

  it('honours correlations: errors of gap and sites that cancel leave nothing', () => {
    const at = (r: number) => {
      const correlations = [{ a: 'gap', b: 'main/sites', r }];
      // ln B = ln 2 at c = K_I, so an error of one site moves f by −ln 2.
      const siteClasses = [siteClass(8, 10, null, { sites: 1 })];
      const dataset = withGap(6, Math.LN2, { siteClasses, correlations }, pointsAt(10));
      return compareWithMonteCarlo(dataset, score(dataset))[0][0];
    };
    // Fully correlated they cancel exactly, whatever the draw; fully anticorrelated they add up.
    expect(at(1).monteCarlo).toBeLessThan(1e-9);
    expectClose(at(-1).monteCarlo, exactDeviation(6 - 8 * Math.LN2, 2 * Math.LN2), 0.03, 'deviation', 1e-300);
  });

  /** Standard deviation of p where one standard normal variable x moves the energy. */
  const deviationOf = (energy: (x: number) => number) => {
    const moments = [0, 0, 0];
    for (let x = -8 + 0.0005; x < 8; x += 0.001) {
      const p = 1 / (1 + Math.exp(-energy(x)));
      [1, p, p * p].forEach((value, i) => {
        moments[i] += value * Math.exp((-x * x) / 2);
      });
    }
    return Math.sqrt(moments[2] / moments[0] - (moments[1] / moments[0]) ** 2);
  };
  const KT = 0.00831446261815324 * 298.15;
  // Three sites, K_I = 10 and K_A = 100 µM, 30 µM of ligand, a gap of 6 kJ/mol and 0.5 kJ/mol a mV over 4 mV.
  const logB = (scale = 1) => Math.log((1 + 3 * scale) / (1 + 0.3 * scale));
  const rest = 6 / KT + 2 / KT;
  const kinds: [string, Uncertain, (x: number) => number][] = [
    ['dispensing', { relativeU: 0.5 }, (x) => rest - 3 * logB(Math.exp(0.5 * x))],
    ['stock', { stockRelativeU: 0.5 }, (x) => rest - 3 * logB(Math.exp(0.5 * x))],
    ['inactive', { inactive: 0.6 }, (x) => rest - 3 * Math.log((1 + 3 * Math.exp(-0.6 * x)) / 1.3)],
    ['active', { active: 1.2 }, (x) => rest - 3 * Math.log(4 / (1 + 0.3 * Math.exp(-1.2 * x)))],
    ['sites', { sites: 0.6 }, (x) => rest - (3 + 0.6 * x) * logB()],
    ['slope', { slope: 0.6 }, (x) => 6 / KT + (2 + 4 * 0.6 * x) / KT - 3 * logB()],
    ['temperature', { temperatureU: 50 }, (x) => (rest * 298.15) / (298.15 + 50 * x) - 3 * logB()],
    ['gap per site', { perSite: 0.8 }, (x) => rest + (3 * 0.8 * x) / KT - 3 * logB()],
  ];
  it.each(kinds)('draws %s from its distribution, by quadrature', (_, uncertain, energy) => {
    const dataset = oneUncertain(uncertain);
    const [[pair]] = compareWithMonteCarlo(dataset, score(dataset), 100_000);
    expectClose(pair.monteCarlo, deviationOf(energy), 0.015, 'deviation', 1e-300);
  });

  it('tries at most a hundred points, none where all is narrow, and says the same every time', () => {
    const many = pointsAt(...Array.from({ length: 300 }, (_, i) => i + 1));
    const wide = withGap(4, 1, {}, many);
    expect(compareWithMonteCarlo(wide, score(wide), 100)[0]).toHaveLength(100);
    expect(noteLinearUncertainty(wide, score(wide))).toEqual(noteLinearUncertainty(wide, score(wide)));
    const narrow = withGap(4, 0.05, {}, many);
    expect(compareWithMonteCarlo(narrow, score(narrow), 100)[0]).toEqual([]);
  });

  it('the note names the points and the figures', () => {
    const dataset = withGap(3, 1.5, {}, pointsAt(0, 0));
    const [[note]] = noteLinearUncertainty(dataset, score(dataset));
    expect(note.points).toEqual([0, 1]);
    // p(1 − p)·1.5 at f = 3, and the quadrature above
    expect(note.detail).toContain(`${exactDeviation(3, 1.5).toPrecision(2)} instead of 0.068`);
  });
});
