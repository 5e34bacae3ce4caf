/** Nonlinear least squares against certified and published fits, far from their answers. */
import { describe, expect, it } from 'vitest';
import { uncertaintyOfFit } from '@/lib/engine/fit-uncertainty';
import { type LeastSquaresProblem, minimiseLeastSquares } from '@/lib/engine/levenberg-marquardt';
import nist from '@/tests/reference/nist-nonlinear-regression.json';
import published from '@/tests/reference/r-dataset-fits.json';
import { expectClose } from '@/tests/support/close-to';

/** value and gradient of a model at x */
type Model = (x: number, b: Float64Array) => [number, ...number[]];

const exponentialRise: Model = (x, [b1, b2]) => {
  const e = Math.exp(-b2 * x);
  return [b1 * (1 - e), 1 - e, b1 * x * e];
};

const MODELS: Record<string, Model> = {
  Misra1a: exponentialRise,
  BoxBOD: exponentialRise,
  DanWood: (x, [b1, b2]) => [b1 * x ** b2, x ** b2, b1 * x ** b2 * Math.log(x)],
  Rat42: (x, [b1, b2, b3]) => {
    const e = Math.exp(b2 - b3 * x);
    const slope = (b1 * e) / (1 + e) ** 2;
    return [b1 / (1 + e), 1 / (1 + e), -slope, x * slope];
  },
  MGH09: (x, [b1, b2, b3, b4]) => {
    const above = x * x + x * b2;
    const below = x * x + x * b3 + b4;
    const slope = (-b1 * above) / below ** 2;
    return [(b1 * above) / below, above / below, (b1 * x) / below, slope * x, slope];
  },
  Puromycin_treated: (x, [most, half]) => [
    (most * x) / (half + x),
    x / (half + x),
    (-most * x) / (half + x) ** 2,
  ],
  DNase_run1_logis: (x, [most, middle, scale]) => {
    const t = (middle - Math.log(x)) / scale;
    const e = Math.exp(t);
    const slope = (-most * e) / (1 + e) ** 2;
    return [most / (1 + e), 1 / (1 + e), slope / scale, (-slope * t) / scale];
  },
  DNase_run1_hill: (x, [most, half, power]) => {
    const e = (half / x) ** power;
    const slope = (-most * e) / (1 + e) ** 2;
    return [most / (1 + e), 1 / (1 + e), (slope * power) / half, slope * Math.log(half / x)];
  },
};

/** Residuals of a model and their derivatives. */
function derivativesOf(name: string, data: number[][]): Pick<LeastSquaresProblem, 'residuals' | 'jacobian'> {
  const at = MODELS[name];
  return {
    residuals: (b, out) => {
      for (const [i, [x, y]] of data.entries()) out[i] = at(x, b)[0] - y;
    },
    jacobian: (b, out) => {
      for (const [i, [x]] of data.entries()) out.set(at(x, b).slice(1), i * b.length);
    },
  };
}

function fitTo(name: string, data: number[][], start: number[]) {
  const n = start.length;
  const found = minimiseLeastSquares({
    count: data.length,
    start: Float64Array.from(start),
    lower: new Float64Array(n).fill(Number.NEGATIVE_INFINITY),
    upper: new Float64Array(n).fill(Number.POSITIVE_INFINITY),
    ...derivativesOf(name, data),
  });
  const { standardErrors, correlations } = uncertaintyOfFit(found.jacobian, data.length, n);
  const spread = Math.sqrt(found.sumOfSquares / (data.length - n));
  return { ...found, correlations, standardErrors: standardErrors.map((u) => (u ?? Number.NaN) * spread) };
}

/** Digits in common with a certified value: −log10 of the relative difference. */
const digits = (value: number, certified: number) =>
  -Math.log10(Math.abs(value - certified) / Math.abs(certified) || 1e-16);

describe('A12 NIST Statistical Reference Datasets, nonlinear regression', () => {
  const LEAST_DIGITS = 6; // that the check asks for; the certified values have 11
  const rows: string[] = [];
  const cases = Object.entries(nist.problems).flatMap(([name, problem]) =>
    (['start1', 'start2'] as const).map((start) => ({ name, start, problem })),
  );
  it.each(cases)('$name from $start', ({ name, start, problem }) => {
    const { certified } = problem;
    const found = fitTo(name, problem.data, problem[start]);
    const ofParameters = Math.min(...[...found.x].map((b, j) => digits(b, certified.parameters[j])));
    const ofErrors = Math.min(...found.standardErrors.map((u, j) => digits(u, certified.standardErrors[j])));
    const columns = [name.padEnd(8), start, found.iterations, ofParameters.toFixed(1), ofErrors.toFixed(1)];
    rows.push(columns.join('  '));
    expect(found.converged).toBe(true);
    expect(ofParameters).toBeGreaterThanOrEqual(LEAST_DIGITS);
    expect(ofErrors).toBeGreaterThanOrEqual(LEAST_DIGITS);
    expectClose(found.sumOfSquares, certified.residualSumOfSquares, 1e-9, 'residual sum of squares', 1e-300);
  });
  it('says what it found', () => {
    console.log(
      ['problem   start   iterations, LRE of parameters, LRE of standard errors', ...rows].join('\n'),
    );
    expect(rows).toHaveLength(10);
  });
});

describe('A13 Puromycin and DNase (Bates & Watts 1988; Davidian & Giltinan 1995)', () => {
  it.each(Object.entries(published.fits))('%s', (name, wanted) => {
    const found = fitTo(name, wanted.data, wanted.start);
    expect(found.converged).toBe(true);
    wanted.parameters.forEach((b, j) => {
      expectClose(found.x[j], b, 1e-7, `parameter ${j}`, 1e-300);
      expectClose(found.standardErrors[j], wanted.standardErrors[j], 1e-6, `standard error ${j}`, 1e-300);
      for (const [k, r] of wanted.correlations[j].entries())
        expectClose(found.correlations[j][k], r, 1e-6, `r ${j} ${k}`);
    });
  });
});

describe('bounds, stopping and what the data do not determine', () => {
  const line = (start: number[], lower: number[], upper: number[]) => ({
    count: 3,
    start: Float64Array.from(start),
    lower: Float64Array.from(lower),
    upper: Float64Array.from(upper),
    // y = a + b·x at x = 0, 1, 2 with y = 1, 3, 5: a = 1, b = 2
    residuals: (b: Float64Array, out: Float64Array) => {
      for (const [x, y] of [1, 3, 5].entries()) out[x] = b[0] + b[1] * x - y;
    },
    jacobian: (_: Float64Array, out: Float64Array) => out.set([1, 0, 1, 1, 1, 2]),
  });

  it('finds the least squares within bounds', () => {
    const { x, converged, sumOfSquares } = minimiseLeastSquares(line([0, 0], [-9, -9], [9, 1.5]));
    // With b held at 1.5: a = mean(y) − 1.5·mean(x) = 1.5, residuals 0.5, 0, −0.5.
    expect(converged).toBe(true);
    expectClose(x[0], 1.5, 1e-12);
    expect(x[1]).toBe(1.5);
    expectClose(sumOfSquares, 0.5, 1e-12);
  });

  it('leaves a bound that it does not need', () => {
    const { x } = minimiseLeastSquares(line([9, -9], [-9, -9], [9, 9]));
    expectClose(x[0], 1, 1e-12);
    expectClose(x[1], 2, 1e-12);
  });

  it('ends where it is told to', () => {
    const problem = nist.problems.MGH09;
    const seen: number[] = [];
    const n = problem.start1.length;
    const { converged, iterations } = minimiseLeastSquares(
      {
        count: problem.data.length,
        start: Float64Array.from(problem.start1),
        lower: new Float64Array(n).fill(-1e9),
        upper: new Float64Array(n).fill(1e9),
        ...derivativesOf('MGH09', problem.data),
      },
      { onIteration: ({ iteration }) => seen.push(iteration) < 5 },
    );
    expect({ converged, iterations, seen }).toEqual({
      converged: false,
      iterations: 5,
      seen: [1, 2, 3, 4, 5],
    });
  });

  it('tells the variables that cannot be told apart from those that can', () => {
    // The second and third column are one direction but for 1e-6; the first stands alone; the fourth has nothing.
    const rows = [
      [1, 0, 0, 0],
      [0, 1, 1, 0],
      [0, 0, 1e-6, 0],
      [0, 2, 2, 0],
      [2, 0, 0, 0],
    ];
    const { standardErrors, entangled, correlations } = uncertaintyOfFit(
      Float64Array.from(rows.flat()),
      5,
      4,
    );
    expect(entangled).toEqual([false, true, true, false]);
    expectClose(standardErrors[0], 1 / Math.sqrt(5), 1e-12); // (JᵀJ)⁻¹ of that column alone
    expectClose(standardErrors[2], 1e6, 1e-6, 'u', 1e-300);
    expectClose(correlations[1][2], -1, 1e-9);
    expect(standardErrors[3]).toBeNull();
    expect(correlations[3]).toEqual([null, null, null, 1]);
  });

  it('knows that two variables in one equation are not determined, whatever the rounding', () => {
    const { entangled, standardErrors } = uncertaintyOfFit(Float64Array.from([0.1, 0.3]), 1, 2);
    expect(entangled).toEqual([true, true]);
    for (const u of standardErrors) expect(u).toBeGreaterThan(1e10);
  });
});
