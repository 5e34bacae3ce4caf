/**
 * The analytic gradient against central differences. A series with one uncertain quantity has
 * u_f = |∂f/∂θ|·u_θ, so each derivative is read off by giving an uncertainty to one quantity alone. The
 * tolerance 1e-7 is the truncation of a central difference with a relative step of 1e-5.
 */
import { describe, expect, it } from 'vitest';
import type { DatasetInput, GapStatement } from '@/lib/engine/inputs';
import { expectClose } from '@/tests/support/close-to';
import { assessOne, bindingOf, LIGAND } from '@/tests/support/small-dataset';

const KELVIN = 310;

/** A dataset of two classes, competing ligands, a modulator and mixed units, with every number open to change. */
interface Numbers {
  gap: number;
  perSite: number;
  sites: number;
  inactive: number;
  active: number;
  competitor: number;
  slope: number;
  kelvin: number;
  stock: number;
}
const NUMBERS: Numbers = {
  gap: 6.1,
  perSite: -0.4,
  sites: 3.3,
  inactive: 18,
  active: 900,
  competitor: 40,
  slope: 0.05,
  kelvin: KELVIN,
  stock: 1,
};

type Uncertain = Partial<Record<keyof Numbers, number>>;

function build(numbers: Numbers, u: Uncertain = {}, gapUnit: GapStatement['unit'] = 'kJ/mol'): DatasetInput {
  const gap: GapStatement =
    gapUnit === 'ratio'
      ? { value: numbers.gap, unit: 'ratio', orientation: 'inactive-over-active', u: u.gap }
      : { value: numbers.gap, unit: gapUnit, orientation: 'active-minus-inactive', u: u.gap };
  const main = bindingOf(LIGAND, numbers.inactive, numbers.active);
  if (main.inactive) main.inactive.u = u.inactive;
  if (main.active) main.active.u = u.active;
  const rival = bindingOf('rival', numbers.competitor, null);
  if (rival.inactive) rival.inactive.u = u.competitor;
  return {
    temperature: { value: numbers.kelvin, unit: 'K', u: u.kelvin },
    ligands: [
      { id: LIGAND, unit: 'uM', concentration: 'free', stockRelativeU: u.stock },
      { id: 'rival', unit: 'uM', concentration: 'free' },
    ],
    modulators: [{ id: 'V' }],
    normalisation: { method: 'absolute' },
    series: [
      {
        id: 'wt',
        parameters: {
          origin: 'independent',
          gap,
          siteClasses: [
            {
              id: 'main',
              sites: { value: numbers.sites, u: u.sites },
              gapPerSite: {
                value: numbers.perSite,
                unit: 'kcal/mol',
                orientation: 'inactive-minus-active',
                u: u.perSite,
              },
              binding: [main, rival],
            },
            { id: 'other', sites: { value: 1.5 }, binding: [bindingOf(LIGAND, 300, 20)] },
          ],
          modulation: [
            {
              modulator: 'V',
              slope: { value: numbers.slope, unit: 'meV', orientation: 'active-minus-inactive', u: u.slope },
              reference: -20,
            },
          ],
        },
        points: [0, 3, 70].map((c) => ({
          ligands: { [LIGAND]: c * numbers.stock, rival: 25 },
          modulators: { V: 35 },
          activity: 0.5,
          u: 0.02,
        })),
      },
    ],
  };
}

function energies(numbers: Numbers, gapUnit?: GapStatement['unit']): number[] {
  return assessOne(build(numbers, {}, gapUnit)).points.map(({ energy }) => energy);
}

describe.each(['kJ/mol', 'ratio'] as const)('gradient, gap stated as %s', (gapUnit) => {
  it.each(Object.keys(NUMBERS) as (keyof Numbers)[])('by %s', (name) => {
    const value = NUMBERS[name];
    const step = 1e-5 * Math.abs(value);
    const above = energies({ ...NUMBERS, [name]: value + step }, gapUnit);
    const below = energies({ ...NUMBERS, [name]: value - step }, gapUnit);
    const analytic = assessOne(build(NUMBERS, { [name]: Math.abs(value) / 100 }, gapUnit)).points;
    analytic.forEach((point, i) => {
      const difference = Math.abs((above[i] - below[i]) / (2 * step)) * (Math.abs(value) / 100);
      expectClose(point.energyU, difference, 1e-7, `${name} at point ${i}`, 1e-3);
    });
    // Each quantity matters somewhere, so the comparison above is not one of zeros.
    expect(Math.max(...analytic.map(({ energyU }) => energyU))).toBeGreaterThan(1e-4);
  });
});

describe('correlations act on the numbers as stated', () => {
  const withCorrelation = (orientation: 'active-minus-inactive' | 'inactive-minus-active', r: number) => {
    const dataset = build({ ...NUMBERS, gap: 3 }, { gap: 0.5, inactive: 2 });
    const { parameters } = dataset.series[0];
    parameters.gap = { value: 3, unit: 'kT', orientation, u: 0.5 };
    parameters.correlations = [{ a: 'gap', b: `main/${LIGAND}/inactive`, r }];
    return assessOne(dataset).points[1].energyU;
  };
  it('a reversed orientation reverses the sign', () => {
    expectClose(
      withCorrelation('active-minus-inactive', -0.7),
      withCorrelation('inactive-minus-active', 0.7),
      1e-14,
    );
    expect(withCorrelation('inactive-minus-active', 0.7)).toBeGreaterThan(
      withCorrelation('inactive-minus-active', 0),
    );
  });
  it('a perfect correlation adds the contributions, a perfect anticorrelation subtracts them', () => {
    const sum = withCorrelation('inactive-minus-active', 1);
    const difference = withCorrelation('inactive-minus-active', -1);
    const alone = withCorrelation('inactive-minus-active', 0);
    expectClose(Math.hypot(sum, difference), Math.SQRT2 * alone, 1e-14);
    expectClose(sum - 0.5, 0.5 - difference, 1e-12);
  });
});

describe('signs of the derivatives, seen through a perfect correlation with the gap', () => {
  const names: [keyof Numbers, string][] = [
    ['perSite', 'main/gapPerSite'],
    ['sites', 'main/sites'],
    ['inactive', `main/${LIGAND}/inactive`],
    ['active', `main/${LIGAND}/active`],
    ['competitor', 'main/rival/inactive'],
    ['slope', 'V/slope'],
  ];
  const signedSlopes = (name: keyof Numbers) => {
    const step = 1e-5 * Math.abs(NUMBERS[name]);
    const above = energies({ ...NUMBERS, [name]: NUMBERS[name] + step });
    const below = energies({ ...NUMBERS, [name]: NUMBERS[name] - step });
    return above.map((energy, i) => (energy - below[i]) / (2 * step));
  };
  it.each(names)('%s', (name, quantity) => {
    const [gapU, u] = [0.4, Math.abs(NUMBERS[name]) / 10];
    const dataset = build(NUMBERS, { gap: gapU, [name]: u });
    dataset.series[0].parameters.correlations = [{ a: 'gap', b: quantity, r: 1 }];
    const [ofGap, ofName] = [signedSlopes('gap'), signedSlopes(name)];
    assessOne(dataset).points.forEach((point, i) => {
      expectClose(point.energyU, Math.abs(ofGap[i] * gapU + ofName[i] * u), 1e-6, `${name} at point ${i}`);
    });
    expect(Math.max(...ofName.map((slope) => Math.abs(slope) * u))).toBeGreaterThan(1e-3);
  });
});
