/** Valid datasets of every shape, for property tests: classes, competing ligands, modulators, sharing. */
import fc from 'fast-check';
import type {
  ConstantStatement,
  DatasetInput,
  GapStatement,
  ParametersInput,
  PointInput,
  SeriesInput,
} from '@/lib/engine/inputs';
import { type ConcentrationUnit, convertConcentration, ENERGY_UNITS } from '@/lib/engine/units';

const LIGANDS = ['first', 'second'];
const UNITS: ConcentrationUnit[] = ['M', 'mM', 'uM', 'nM', 'pM'];

const real = (min: number, max: number) => fc.double({ min, max, noNaN: true });
/** a number spread evenly over its logarithm */
const logReal = (minExponent: number, maxExponent: number) =>
  real(minExponent, maxExponent).map((x) => 10 ** x);

const gap = (range: number): fc.Arbitrary<GapStatement> =>
  fc.oneof(
    fc.record({
      value: real(-range, range),
      unit: fc.constantFrom(...ENERGY_UNITS),
      orientation: fc.constantFrom('inactive-minus-active' as const, 'active-minus-inactive' as const),
      u: fc.option(real(0, 2), { nil: undefined }),
    }),
    fc.record({
      value: logReal(-12, 12),
      unit: fc.constant('ratio' as const),
      orientation: fc.constantFrom('inactive-over-active' as const, 'active-over-inactive' as const),
      u: fc.option(logReal(-12, -1), { nil: undefined }),
    }),
  );

/** Mostly what laboratories state, now and then the largest that a document may hold. */
const relativeU = fc.oneof(
  { weight: 12, arbitrary: real(0, 0.5) },
  { weight: 1, arbitrary: fc.constant(100) },
);

/** A constant between 1e-15 M and 1e3 M, stated in any unit. */
const constant: fc.Arbitrary<ConstantStatement> = fc
  .record({ molar: logReal(-14, 2), unit: fc.constantFrom(...UNITS), relative: relativeU })
  .map(({ molar, unit, relative }) => {
    const value = convertConcentration(molar, 'M', unit) ?? molar;
    return { value, unit, u: relative * value };
  });

const binding = (ligand: string) =>
  fc
    .record({ inactive: fc.option(constant, { freq: 4 }), active: fc.option(constant, { freq: 4 }) })
    .filter(({ inactive, active }) => inactive !== null || active !== null)
    .map((states) => ({ ligand, ...states }));

const siteClass = (id: string) =>
  fc.record({
    id: fc.constant(id),
    sites: fc.record({ value: logReal(-2, 3), u: fc.option(real(0, 1), { nil: undefined }) }),
    gapPerSite: fc.option(gap(0.19), { nil: undefined }),
    binding: fc.tuple(...LIGANDS.map(binding)).chain((all) => fc.subarray(all, { minLength: 1 })),
  });

const parameters: fc.Arbitrary<ParametersInput> = fc
  .record({
    origin: fc.constantFrom('independent' as const, 'fitted-elsewhere' as const, 'fitted-here' as const),
    gap: gap(190),
    siteClasses: fc
      .integer({ min: 1, max: 3 })
      .chain((n) => fc.tuple(...Array.from({ length: n }, (_, i) => siteClass(`class-${i}`)))),
    modulation: fc.option(
      fc
        .record({ slope: real(-1, 1), u: real(0, 0.1), reference: real(-50, 50) })
        .map(({ slope, u, reference }) => [
          {
            modulator: 'V',
            slope: { value: slope, unit: 'kT' as const, orientation: 'inactive-minus-active' as const, u },
            reference,
          },
        ]),
      { nil: undefined },
    ),
    r: real(-0.99, 0.99),
  })
  .map(({ r, ...rest }) => ({
    ...rest,
    ...(rest.origin === 'fitted-here' ? { fittedCount: 3 } : {}),
    correlations: [{ a: 'gap', b: 'class-0/sites', r }],
  }));

const point: fc.Arbitrary<PointInput> = fc
  .record({
    first: fc.oneof(fc.constant(0), logReal(-14, 2)),
    second: fc.oneof(fc.constant(0), logReal(-14, 2)),
    V: fc.option(real(-100, 100), { nil: undefined }),
    activity: real(-0.5, 1.5),
    spread: fc.option(real(0, 0.2), { nil: undefined }),
    u: fc.option(real(1e-6, 1), { nil: undefined }),
  })
  .map(({ first, second, V, activity, spread, u }) => ({
    ligands: { first, second: second * 1e6 },
    ...(V === undefined ? {} : { modulators: { V } }),
    ...(spread === undefined
      ? { activity, u }
      : { replicates: [activity - spread, activity, activity + spread] }),
  }));

const series = (id: string): fc.Arbitrary<SeriesInput> =>
  fc.record({
    id: fc.constant(id),
    temperature: fc.option(
      fc.record({ value: real(200, 450), unit: fc.constant('K' as const), u: real(0, 2) }),
      { nil: undefined },
    ),
    parameters,
    points: fc.array(point, { minLength: 1, maxLength: 6 }),
  });

/** Datasets of 1 to 4 series; `first` is stated in M and `second` in µM, both with dispensing and stock errors. */
export const arbitraryDataset: fc.Arbitrary<DatasetInput> = fc
  .record({
    kelvin: real(200, 450),
    temperatureU: real(0, 2),
    count: fc.integer({ min: 1, max: 4 }),
    relativeU: real(0, 0.3),
    stockRelativeU: real(0, 0.3),
    shared: fc.boolean(),
  })
  .chain(({ kelvin, temperatureU, count, relativeU, stockRelativeU, shared }) =>
    fc.tuple(...Array.from({ length: count }, (_, i) => series(`s${i}`))).map((all) => ({
      temperature: { value: kelvin, unit: 'K' as const, u: temperatureU },
      ligands: [
        { id: 'first', unit: 'M' as const, concentration: 'free' as const, relativeU, stockRelativeU },
        { id: 'second', unit: 'uM' as const, concentration: 'total' as const, stockRelativeU },
      ],
      modulators: [{ id: 'V' }],
      normalisation: { method: 'absolute' as const },
      series: shared ? shareSites(all) : [...all],
    })),
  );

/** Gives all series one and the same number of sites in their first class, under one label. */
function shareSites(all: readonly SeriesInput[]): SeriesInput[] {
  const { value, u } = all[0].parameters.siteClasses[0].sites;
  return all.map((one) => ({
    ...one,
    parameters: {
      ...one.parameters,
      siteClasses: one.parameters.siteClasses.map((siteClass, s) =>
        s === 0 ? { ...siteClass, sites: { value, u, sharedAs: 'sites' } } : siteClass,
      ),
    },
  }));
}
