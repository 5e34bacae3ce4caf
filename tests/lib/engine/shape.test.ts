/** Alternatives of shape against dense generalised least squares, planted truths, and where they are not offered. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Shape, ShapeAlternative, ShapeEstimateName, ShapeKind } from '@/lib/engine/assessment';
import type { DatasetInput, PointInput, SeriesInput } from '@/lib/engine/inputs';
import { computePointTable } from '@/lib/engine/point-table';
import type { ScoredSeries } from '@/lib/engine/q-statistic';
import { buildSeriesModel } from '@/lib/engine/series-model';
import { fitShape } from '@/lib/engine/shape';
import { arbitraryDataset } from '@/tests/support/arbitrary-dataset';
import { expectClose } from '@/tests/support/close-to';
import { dotDense, solveDense } from '@/tests/support/dense-algebra';
import { type Random, seededRandom } from '@/tests/support/random';
import { simulateDataset } from '@/tests/support/simulated-series';
import {
  allostericConstant,
  bindingOf,
  datasetOf,
  numbersOf,
  siteClass,
} from '@/tests/support/small-dataset';

const KINDS: ShapeKind[] = ['offset', 'slope', 'ceiling', 'floor', 'stock', 'offset+slope', 'floor+ceiling'];
const AS_STATED = { offset: 0, slope: 1, ceiling: 1, floor: 0, stock: 1 };
type Bend = typeof AS_STATED;

function scoredOf(dataset: DatasetInput, series = dataset.series[0]): ScoredSeries {
  const model = buildSeriesModel(dataset, series);
  const fittedHere = series.parameters.origin === 'fitted-here';
  return { model, table: computePointTable(dataset, series, model), fittedHere, fittedCount: 0 };
}

function shapeOf(dataset: DatasetInput, series = dataset.series[0]): Shape {
  return fitShape(dataset, series, scoredOf(dataset, series)).shape;
}

function pick(shape: Shape, kind: ShapeKind): ShapeAlternative {
  const found = shape.alternatives.find((one) => one.kind === kind);
  if (!found) throw new Error(`${kind} is not among the alternatives`);
  return found;
}

/** Two correlated classes, a modulator, dispensing, stock and temperature: every term of C at work. */
function richDataset(random: Random, bend: Bend, origin: 'independent' | 'fitted-here'): DatasetInput {
  const concentrations = [0, 0.5, 1, 2, 4, 6, 9, 14, 20, 40, 80];
  const parameters: SeriesInput['parameters'] = {
    origin,
    gap: { value: random.uniform(3, 7), unit: 'kJ/mol', orientation: 'inactive-minus-active', u: 0.4 },
    siteClasses: [
      siteClass(random.uniform(2, 5), random.uniform(10, 20), 800, {
        inactive: 0.07,
        active: 0.1,
        sites: 0.1,
      }),
      siteClass(1.5, 60, null, { inactive: 0.1 }, 'side'),
    ],
    modulation: [
      {
        modulator: 'V',
        slope: { value: 0.02, unit: 'kT', orientation: 'inactive-minus-active', u: 0.004 },
        reference: 10,
      },
    ],
    correlations: [
      { a: 'gap', b: 'main/velline/inactive', r: -0.6 },
      { a: 'gap', b: 'main/sites', r: 0.3 },
    ],
  };
  const points: PointInput[] = concentrations.map((c, i) => ({
    ligands: { velline: c },
    modulators: { V: 10 * (i % 3) },
    activity: 0,
    u: 0.02,
  }));
  const dataset = datasetOf(parameters, points, {
    temperatureU: 1.5,
    ligands: [{ id: 'velline', unit: 'uM', concentration: 'free', relativeU: 0.05, stockRelativeU: 0.04 }],
  });
  const { residual } = bent(dataset, bend);
  points.forEach((point, i) => {
    point.activity = -residual[i] + 0.02 * random.normal();
  });
  return dataset;
}

/** Residuals, covariance and ∂(expected)/∂f of a bent series, all written out. */
function bent(dataset: DatasetInput, bend: Bend) {
  const series: SeriesInput = {
    ...dataset.series[0],
    points: dataset.series[0].points.map((point) => ({
      ...point,
      ligands: { velline: bend.stock * point.ligands.velline },
    })),
  };
  const { model, table, fittedHere } = scoredOf(dataset, series);
  const columns = model.sharedKeys.length;
  const correlation = (a: number, b: number) => model.correlation?.[a * columns + b] ?? (a === b ? 1 : 0);
  const rows = Array.from({ length: table.count }, (_, i) => {
    const p = table.expected[i];
    const energy = bend.slope * table.energy[i] + bend.offset;
    const bentP = 1 / (1 + Math.exp(-energy));
    const height = bend.ceiling - bend.floor;
    const lever = height * bend.slope * bentP * (1 - bentP);
    // The table's gradient is that of p: per unit of f it is p(1 − p) times smaller.
    const perEnergy = lever / (p * (1 - p));
    const gradient = Array.from(
      { length: columns },
      (_, k) => perEnergy * table.expectedGradient[i * columns + k],
    );
    const own = table.activityU[i] ** 2 + 0.01 ** 2 + perEnergy ** 2 * table.dispensingVariance[i];
    return { residual: table.activity[i] - bend.floor - height * bentP, gradient, own };
  });
  const covariance = rows.map((a, i) =>
    rows.map((b, j) => {
      let sum = i === j ? a.own : 0;
      if (fittedHere) return sum;
      for (let k = 0; k < columns; k++)
        for (let l = 0; l < columns; l++) sum += a.gradient[k] * correlation(k, l) * b.gradient[l];
      return sum;
    }),
  );
  return { residual: rows.map(({ residual }) => residual), covariance };
}

/** rᵀC⁻¹r + ln det C. */
function denseDeviance(dataset: DatasetInput, bend: Bend): number {
  const { residual, covariance } = bent(dataset, bend);
  const { x, logDeterminant } = solveDense(covariance, residual);
  return dotDense(x, residual) + logDeterminant;
}

function bendOf({ estimates }: ShapeAlternative): Bend {
  return { ...AS_STATED, ...Object.fromEntries(estimates.map(({ name, value }) => [name, value])) };
}

/** −∂r/∂φ by central differences of the fourth order. */
function denseJacobian(dataset: DatasetInput, bend: Bend, name: ShapeEstimateName): number[] {
  const h = 1e-3;
  const at = (share: number) => bent(dataset, { ...bend, [name]: bend[name] + share * h }).residual;
  const [far, near, back, farBack] = [at(2), at(1), at(-1), at(-2)];
  return far.map((_, i) => (far[i] - 8 * near[i] + 8 * back[i] - farBack[i]) / (12 * h));
}

/** The Gauss–Newton step and the standard uncertainties at an alternative, with C there. */
function denseStep(dataset: DatasetInput, alternative: ShapeAlternative) {
  const bend = bendOf(alternative);
  const { residual, covariance } = bent(dataset, bend);
  const jacobian = alternative.estimates.map(({ name }) => denseJacobian(dataset, bend, name));
  const solved = jacobian.map((column) => solveDense(covariance, column).x);
  const normal = solved.map((row) => jacobian.map((column) => dotDense(row, column)));
  const right = solved.map((row) => dotDense(row, residual));
  const u = normal.map((_, j) => {
    const unit = normal.map((__, k) => (k === j ? 1 : 0));
    return Math.sqrt(solveDense(normal, unit).x[j]);
  });
  return { step: solveDense(normal, right).x, u };
}

describe('against dense generalised least squares', () => {
  const bends: Bend[] = [
    AS_STATED,
    { ...AS_STATED, offset: 1.2 },
    { ...AS_STATED, slope: 0.7 },
    { ...AS_STATED, ceiling: 0.8 },
    { ...AS_STATED, floor: 0.15 },
    { ...AS_STATED, stock: 1.6 },
  ];
  const cases = bends.flatMap((bend, i) => [
    { bend, seed: 100 + i, origin: 'independent' as const },
    { bend, seed: 200 + i, origin: 'fitted-here' as const },
  ]);

  it.each(cases)('AIC, estimates and u: $origin, seed $seed', ({ bend, seed, origin }) => {
    const dataset = richDataset(seededRandom(seed), bend, origin);
    const shape = shapeOf(dataset);
    expect(shape.alternatives.map(({ kind }) => kind).sort()).toEqual([...KINDS].sort());
    const asStated = denseDeviance(dataset, AS_STATED);
    for (const alternative of shape.alternatives) {
      const { kind, estimates, deltaAIC } = alternative;
      const wanted = denseDeviance(dataset, bendOf(alternative)) + 2 * estimates.length - asStated;
      expectClose(deltaAIC, wanted, 1e-9, kind);
      // C at the fit, J at the fit: there is no step left to take.
      const { step, u } = denseStep(dataset, alternative);
      estimates.forEach((estimate, j) => {
        expectClose(estimate.u, u[j], 1e-7, `u of ${kind}/${estimate.name}`, 0);
        expect(Math.abs(step[j]), `${kind}/${estimate.name}`).toBeLessThan(1e-5 * u[j]);
      });
    }
  });

  it('a correlation, the temperature and the stock all count in C', () => {
    const dataset = richDataset(seededRandom(5), { ...AS_STATED, offset: 1 }, 'independent');
    const { u } = pick(shapeOf(dataset), 'offset').estimates[0];
    const without: DatasetInput[] = [
      { ...dataset, temperature: { ...dataset.temperature, u: 0 } },
      { ...dataset, ligands: dataset.ligands.map((ligand) => ({ ...ligand, stockRelativeU: 0 })) },
      { ...dataset, ligands: dataset.ligands.map((ligand) => ({ ...ligand, relativeU: 0 })) },
    ];
    for (const lesser of without) {
      expect(pick(shapeOf(lesser), 'offset').estimates[0].u).toBeLessThan(u * (1 - 1e-5));
    }
  });
});

describe('planted truths', () => {
  const planted: [ShapeKind, Partial<Bend>][] = [
    ['offset', { offset: -1.7 }],
    ['slope', { slope: 0.6 }],
    ['ceiling', { ceiling: 0.75 }],
    ['floor', { floor: 0.2 }],
    ['stock', { stock: 2.2 }],
    ['offset+slope', { offset: 0.9, slope: 1.5 }],
    ['floor+ceiling', { floor: 0.1, ceiling: 0.85 }],
  ];

  it.each(planted)('%s is found where the points lie on it', (kind, bend) => {
    const dataset = richDataset(
      { uniform: (low = 0, high = 1) => (low + high) / 2, normal: () => 0 },
      {
        ...AS_STATED,
        ...bend,
      },
      'independent',
    );
    const shape = shapeOf(dataset);
    for (const { name, value } of pick(shape, kind).estimates) {
      expectClose(value, bend[name] ?? Number.NaN, 1e-6, `${kind}/${name}`);
    }
    expect(shape.best).toBe(kind);
    expect(shape.alternatives[0].kind).toBe(kind);
  });

  it('every fit comes to rest, also where C changes fast along the way', () => {
    // Far-off series of many points: plain Gauss–Newton steps go from one side of the fit to the other for ever.
    const random = seededRandom(3);
    for (let i = 0; i < 25; i++) {
      const dataset = simulateDataset(random, { points: 100, bend: { offset: 1.5 } });
      dataset.series[0].parameters.siteClasses[0].sites.u = 0.2;
      expect(shapeOf(dataset).alternatives.length, `series ${i}`).toBe(KINDS.length);
    }
  });

  it('nothing is named where the points lie on the stated curve', () => {
    const exact: Random = { uniform: (low = 0, high = 1) => (low + high) / 2, normal: () => 0 };
    const shape = shapeOf(richDataset(exact, AS_STATED, 'independent'));
    expect(shape.best).toBe('none');
    for (const { deltaAIC, estimates } of shape.alternatives) {
      expectClose(deltaAIC, 2 * estimates.length, 1e-9, 'all that an alternative costs here');
    }
  });

  it('an alternative is named from 8 below on, and no sooner', () => {
    const named = Array.from({ length: 300 }, (_, i) => {
      const offset = 0.15 + (i % 30) / 60;
      const shape = shapeOf(simulateDataset(seededRandom(9000 + i), { bend: { offset } }));
      const lowest = shape.alternatives[0].deltaAIC;
      expect(shape.best).toBe(lowest <= -8 ? shape.alternatives[0].kind : 'none');
      const order = shape.alternatives.map(({ deltaAIC }) => deltaAIC);
      expect(order).toEqual([...order].sort((a, b) => a - b));
      return lowest;
    });
    expect(named.filter((lowest) => lowest <= -8).length).toBeGreaterThan(30);
    expect(named.filter((lowest) => lowest > -8 && lowest < 0).length).toBeGreaterThan(30);
  });
});

describe('what the stated uncertainties allow', () => {
  const points = [0, 3, 9, 30].map((c) => ({ ligands: { velline: c }, activity: 0.5, u: 0.02 }));

  it('of a gap alone is its u', () => {
    const dataset = datasetOf(
      {
        gap: { value: 2, unit: 'kT', orientation: 'inactive-minus-active', u: 0.3 },
        siteClasses: [siteClass(4, 10, 500)],
      },
      points,
      { ligands: [{ id: 'velline', unit: 'uM', concentration: 'free', relativeU: 0.2 }] },
    );
    // Dispensing is no parameter: it does not move the whole curve.
    expectClose(shapeOf(dataset).allowedByStatements, 0.3, 1e-12);
  });

  it('is √(gᵀVg), correlations included, in its mean over the points', () => {
    const r = -0.5;
    const dataset = datasetOf(
      {
        gap: { value: 2, unit: 'kT', orientation: 'inactive-minus-active', u: 0.3 },
        siteClasses: [siteClass(4, 10, null, { inactive: 0.1 })],
        correlations: [{ a: 'gap', b: 'main/velline/inactive', r }],
      },
      points,
    );
    const each = points.map(({ ligands: { velline: c } }) => {
      const b = (4 * 0.1 * (c / 10)) / (1 + c / 10);
      return Math.sqrt(0.3 ** 2 + b ** 2 + 2 * r * 0.3 * b);
    });
    const mean = each.reduce((sum, value) => sum + value) / each.length;
    expectClose(shapeOf(dataset).allowedByStatements, mean, 1e-12);
  });
});

describe('where an alternative is not offered', () => {
  const simulated = (count: number) => {
    const dataset = simulateDataset(seededRandom(3), { bend: { offset: 1 } });
    const points = dataset.series[0].points.slice(5, 5 + count);
    return { ...dataset, series: [{ ...dataset.series[0], points }] };
  };
  const kindsOf = (dataset: DatasetInput) => shapeOf(dataset).alternatives.map(({ kind }) => kind);

  it('one number wants three points, two want four', () => {
    expect(kindsOf(simulated(2))).toEqual([]);
    expect(kindsOf(simulated(3)).some((kind) => kind === 'offset')).toBe(true);
    expect(kindsOf(simulated(3)).some((kind) => kind.includes('+'))).toBe(false);
    expect(kindsOf(simulated(4)).some((kind) => kind.includes('+'))).toBe(true);
  });

  const twoLigands = (second: number, bound: boolean): DatasetInput =>
    datasetOf(
      {
        gap: allostericConstant(0.1),
        siteClasses: [
          {
            id: 'main',
            sites: { value: 4 },
            binding: bound
              ? [bindingOf('velline', 10, 500), bindingOf('morrane', 20, 90)]
              : [bindingOf('velline', 10, 500)],
          },
        ],
      },
      [0, 2, 6, 12, 25].map((c) => ({
        ligands: { velline: c, morrane: second },
        activity: 0.9 / (1 + c / 9),
        u: 0.02,
      })),
      {
        ligands: ['velline', 'morrane'].map((id) => ({ id, unit: 'uM', concentration: 'free' })),
      },
    );

  it('a stock only where one ligand acts', () => {
    expect(kindsOf(twoLigands(5, true))).not.toContain('stock');
    expect(kindsOf(twoLigands(0, true))).toContain('stock');
    expect(kindsOf(twoLigands(5, false))).toContain('stock');
  });

  it('nothing where all points are saturated beyond any measurement', () => {
    const dataset = datasetOf(
      {
        gap: { value: 190, unit: 'kT', orientation: 'inactive-minus-active' },
        siteClasses: [siteClass(2, 10, 500)],
      },
      [0, 1, 2, 3, 4, 5].map((c) => ({ ligands: { velline: c }, activity: 1, u: 0.02 })),
    );
    // Only the ceiling can be told there.
    expect(kindsOf(dataset)).toEqual(['ceiling']);
  });
});

it('whatever the dataset, every number of a shape is finite and every u positive', () => {
  fc.assert(
    fc.property(arbitraryDataset, (dataset) => {
      for (const series of dataset.series) {
        const shape = shapeOf(dataset, series);
        for (const [path, value] of numbersOf(shape)) {
          if (!Number.isFinite(value)) throw new Error(`${path} is ${value}`);
        }
        for (const { estimates } of shape.alternatives) {
          for (const { u } of estimates) expect(u).toBeGreaterThan(0);
        }
      }
    }),
    { numRuns: 400 },
  );
});
