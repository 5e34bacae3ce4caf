import { describe, expect, it } from 'vitest';
import { concentrationAxisOf, concentrationTicks, placeOf } from '@/components/plots/concentration-axis';
import { contractDocument } from '../../support/contract-document';
import { plotted } from '../../support/plotted-dataset';

function axisFor(...concentrations: number[]) {
  const document = contractDocument();
  document.series[0].points = concentrations.map((velline) => ({
    ligands: { velline },
    activity: 0.5,
    u: 0.02,
  }));
  return concentrationAxisOf(plotted(document), 'velline');
}

describe('the concentration axis', () => {
  it('is logarithmic, with air at both ends', () => {
    const axis = axisFor(1, 1000);
    expect(axis).toEqual({ ligand: 'velline', from: -0.25, to: 3.25, zeroAt: null });
    expect(placeOf(axis, 10)).toBe(1);
  });

  it('gives 0 a place of its own, left of the lowest concentration', () => {
    const axis = axisFor(0, 1, 1000);
    expect(axis.zeroAt).toBe(-0.75);
    expect(axis.from).toBe(-1);
    expect(placeOf(axis, 0)).toBe(-0.75);
    expect(placeOf(axis, 0)).toBeLessThan(placeOf(axis, 1));
  });

  it('is some axis where every concentration is 0', () => {
    const axis = axisFor(0, 0);
    expect(axis.from).toBeLessThan(axis.to);
    expect(placeOf(axis, 0)).toBeGreaterThanOrEqual(axis.from);
  });
});

describe('its ticks', () => {
  it('are powers of ten and the place of 0', () => {
    const ticks = concentrationTicks(axisFor(0, 1, 10_000));
    // −0 + 0 is 0, which toEqual tells from −0.
    expect(ticks.map(({ at, label }) => ({ at: at + 0, label }))).toEqual([
      { at: -0.75, label: '0' },
      { at: 0, label: '1' },
      { at: 1, label: '10' },
      { at: 2, label: '100' },
      { at: 3, label: '1000' },
      { at: 4, label: '10⁴' },
    ]);
  });

  it('write small powers with a true minus sign', () => {
    expect(concentrationTicks(axisFor(1e-5, 1e-3)).map(({ label }) => label)).toEqual([
      '10⁻⁵',
      '10⁻⁴',
      '0.001',
    ]);
  });

  it('are thinned to at most eight powers', () => {
    const ticks = concentrationTicks(axisFor(0, 1e-6, 1e8));
    expect(ticks.length).toBeLessThanOrEqual(9);
    expect(ticks.length).toBeGreaterThan(4);
    const steps = ticks.slice(2).map(({ at }, i) => at - ticks[i + 1].at);
    expect(new Set(steps).size).toBe(1);
  });
});
