/** Derived quantities: their uncertainties against central differences, and what happens where they do not exist. */
import { describe, expect, it } from 'vitest';
import type { DerivedQuantities } from '@/lib/engine/assessment';
import type { SiteClassInput } from '@/lib/engine/inputs';
import { expectClose } from '@/tests/support/close-to';
import { allostericConstant, assessOne, datasetOf, pointsAt, siteClass } from '@/tests/support/small-dataset';

const QUANTITIES = [
  'leakiness',
  'saturation',
  'dynamicRange',
  'halfActivity',
  'ec50',
  'effectiveHill',
] as const;

/** values: gap (kT), n, K_I, K_A of the first class; a second class may stand beside it */
type Values = [number, number, number, number];
const STEP_U = 0.01;

function derive(values: Values, uncertain: number | null, second: SiteClassInput[]): DerivedQuantities {
  const [gap, n, inactive, active] = values;
  const u = (k: number) => (uncertain === k ? STEP_U : 0);
  const first = siteClass(n, inactive, active, { sites: u(1) * n, inactive: u(2), active: u(3) });
  const parameters = {
    gap: { value: gap, unit: 'kT' as const, orientation: 'inactive-minus-active' as const, u: u(0) * gap },
    siteClasses: [first, ...second],
  };
  return assessOne(datasetOf(parameters, pointsAt(1))).derived[0];
}

describe.each([
  ['one class', []],
  ['two classes', [siteClass(1.5, 40, 300, {}, 'second')]],
])('uncertainties of derived quantities, %s', (_, second) => {
  const values: Values = [2.4, 6, 18, 900];
  it.each([0, 1, 2, 3])('by quantity %i', (k) => {
    // A step of 1e-4 of the value: truncation of the central difference is then below 1e-6.
    const step = 1e-4;
    const moved = (sign: number) =>
      derive(values.map((v, i) => (i === k ? v * (1 + sign * step) : v)) as Values, null, second);
    const [above, below, analytic] = [moved(1), moved(-1), derive(values, k, second)];
    for (const name of QUANTITIES) {
      const slope = ((above[name]?.value ?? Number.NaN) - (below[name]?.value ?? Number.NaN)) / (2 * step);
      expectClose(analytic[name]?.u ?? null, Math.abs(slope) * STEP_U, 1e-6, name, 1e-3);
    }
  });
});

describe('bracketing agrees with the closed form', () => {
  it('one class written as two alike', () => {
    const whole = derive([2.4, 6, 18, 900], null, []);
    const halves = derive([2.4, 3, 18, 900], null, [siteClass(3, 18, 900, {}, 'second')]);
    for (const name of QUANTITIES)
      expectClose(halves[name]?.value ?? null, whole[name]?.value ?? Number.NaN, 1e-12, name);
  });
});

describe('quantities that do not exist', () => {
  const assessed = (gap: number, ...siteClasses: SiteClassInput[]) =>
    assessOne(datasetOf({ gap: allostericConstant(Math.exp(-gap)), siteClasses }, pointsAt(1)));

  it('a protein that stays active has no half-activity concentration, and the note says so', () => {
    const { derived, notes } = assessed(8, siteClass(2, 10, 30));
    expect(derived[0].halfActivity).toBeNull();
    expect(derived[0].ec50).not.toBeNull();
    expect(notes).toContainEqual(
      expect.objectContaining({
        code: 'derived-not-defined',
        detail: expect.stringContaining('above one half'),
      }),
    );
  });
  it('binding to one state alone drives the activity to 0 exactly', () => {
    const { derived } = assessed(2, siteClass(2, 10, null));
    expect(derived[0].saturation).toEqual({ value: 0, u: 0 });
    expectClose(derived[0].halfActivity?.value ?? null, 10 * (Math.exp(1) - 1), 1e-13);
  });
  it('equal constants: the ligand does nothing and is not listed', () => {
    const { derived, notes } = assessed(2, siteClass(2, 10, 10));
    expect(derived).toEqual([]);
    expect(notes).toEqual([
      expect.objectContaining({ detail: expect.stringContaining('binds both states alike') }),
    ]);
  });
  it('classes that pull both ways: limits stand, the midpoint does not', () => {
    const { derived, notes } = assessed(
      0,
      siteClass(2, 1, 100, {}, 'down'),
      siteClass(2, 1e5, 1e3, {}, 'up'),
    );
    expect(derived[0]).toMatchObject({ halfActivity: null, ec50: null, effectiveHill: null });
    expectClose(derived[0].saturation.value, 0.5, 1e-12);
    expect(notes[0].detail).toContain('not monotonic');
  });
  it('classes that pull both ways with one far stronger are still monotonic and solved', () => {
    const { derived } = assessed(0, siteClass(6, 1, 100, {}, 'down'), siteClass(1, 1.1, 1, {}, 'up'));
    expect(derived[0].ec50).not.toBeNull();
  });
  it('classes that end in opposite infinities have no saturation', () => {
    const { derived, notes } = assessed(
      0,
      siteClass(2, 1, null, {}, 'down'),
      siteClass(2, null, 1, {}, 'up'),
    );
    expect(derived).toEqual([]);
    expect(notes[0].code).toBe('derived-not-defined');
  });
});
