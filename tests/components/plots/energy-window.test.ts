import { describe, expect, it } from 'vitest';
import {
  energyAtPixel,
  fullWindow,
  isInside,
  keptWithin,
  moveWindow,
  openingWindow,
  orderedWindow,
  pixelOf,
  roundEdge,
  scaleWindow,
  ticksOf,
} from '@/components/plots/energy-window';

describe('the window that holds every energy', () => {
  it('has half a kT of air and whole edges', () => {
    expect(fullWindow([-17.33, 5.6])).toEqual({ from: -18, to: 7 });
  });

  it('is never narrower than the bend of the curve', () => {
    expect(fullWindow([0.1])).toEqual({ from: -4, to: 4 });
    expect(fullWindow([])).toEqual({ from: -4, to: 4 });
  });
});

describe('the window that a dataset opens with', () => {
  const onCurve = (...energies: number[]) =>
    energies.map((energy) => ({ energy, flag: 'on-curve' as const }));

  it('leaves out where the curve is flat', () => {
    expect(openingWindow(onCurve(-17.33, 2.4))).toEqual({ from: -10, to: 4 });
    expect(openingWindow(onCurve(3, 60))).toEqual({ from: -4, to: 10 });
  });

  it('holds every point that is flagged', () => {
    const points = [...onCurve(-30, 30), { energy: -17.33, flag: 'warning' as const }];
    expect(openingWindow(points)).toEqual({ from: -18, to: 10 });
    expect(openingWindow([...points, { energy: 25, flag: 'off-curve' }])).toEqual({ from: -18, to: 26 });
  });

  it('is the full one where nothing lies beyond', () => {
    expect(openingWindow(onCurve(-6.2, 5.1))).toEqual(fullWindow([-6.2, 5.1]));
  });
});

describe('a window from two edges', () => {
  it('is put in order', () => {
    expect(orderedWindow(3, -2)).toEqual({ from: -2, to: 3 });
  });

  it('is none where the edges are too near each other or no numbers', () => {
    expect(orderedWindow(1, 1.19)).toBeNull();
    expect(orderedWindow(Number.NaN, 3)).toBeNull();
    expect(orderedWindow(-4, Number.POSITIVE_INFINITY)).toBeNull();
  });

  it('may be as narrow as 0.2 kT, however its edges are written', () => {
    expect(orderedWindow(0.1, 0.3)).toEqual({ from: 0.1, to: 0.3 });
    expect(orderedWindow(0.7, 0.9)).toEqual({ from: 0.7, to: 0.9 });
  });

  it('holds its edges', () => {
    const window = { from: -2, to: 3 };
    expect([-2.001, -2, 0, 3, 3.001].map((energy) => isInside(energy, window))).toEqual([
      false,
      true,
      true,
      true,
      false,
    ]);
  });
});

describe('pixels', () => {
  const window = { from: -9.5, to: 3.25 };

  it('begin and end at the edges', () => {
    expect(pixelOf(-9.5, window, 640)).toBe(0);
    expect(pixelOf(3.25, window, 640)).toBe(640);
    expect(pixelOf(-3.125, window, 640)).toBe(320);
  });

  it('lead back to their energies', () => {
    for (const energy of [-9.5, -7.31, 0, 2.2, 3.25])
      expect(energyAtPixel(pixelOf(energy, window, 713), window, 713)).toBeCloseTo(energy, 12);
  });
});

describe('movements', () => {
  it('move by a share of the width', () => {
    expect(moveWindow({ from: -4, to: 4 }, 0.25)).toEqual({ from: -2, to: 6 });
    expect(moveWindow({ from: -4, to: 4 }, -0.5)).toEqual({ from: -8, to: 0 });
  });

  it('are pushed back within a window, as far as they fit', () => {
    const full = { from: -10, to: 4 };
    expect(keptWithin({ from: -3, to: 2 }, full)).toEqual({ from: -3, to: 2 });
    expect(keptWithin({ from: 2, to: 7 }, full)).toEqual({ from: -1, to: 4 });
    expect(keptWithin({ from: -12, to: -7 }, full)).toEqual({ from: -10, to: -5 });
    expect(keptWithin({ from: -20, to: 20 }, full)).toEqual(full);
  });

  it('scale about the middle, down to the least width', () => {
    expect(scaleWindow({ from: 0, to: 4 }, 0.5)).toEqual({ from: 1, to: 3 });
    const narrow = scaleWindow({ from: 0.9, to: 1.1 }, 0.5);
    expect(narrow.to - narrow.from).toBeCloseTo(0.2, 12);
  });

  it('are written to a hundredth of a kT', () => {
    expect(roundEdge(-2.3456)).toBe(-2.35);
  });
});

describe('ticks', () => {
  it('stand at round energies, labelled and halfway in turn', () => {
    const ticks = ticksOf({ from: -4, to: 4 }, 720);
    expect(ticks.filter(({ labelled }) => labelled).map(({ energy }) => energy)).toEqual([
      -4, -3, -2, -1, 0, 1, 2, 3, 4,
    ]);
    expect(ticks.filter(({ labelled }) => !labelled).map(({ energy }) => energy)).toContain(-3.5);
  });

  it.each([
    [{ from: -10, to: 4 }, 900],
    [{ from: -10, to: 4 }, 300],
    [{ from: 0.9, to: 1.1 }, 360],
    [{ from: -40_000, to: 200_000 }, 800],
  ])('keep their labels apart in %j across %i pixels', (window, width) => {
    const labelled = ticksOf(window, width).filter((tick) => tick.labelled);
    expect(labelled.length).toBeGreaterThan(0);
    for (const { energy } of labelled) expect(isInside(energy, window)).toBe(true);
    const places = labelled.map(({ energy }) => pixelOf(energy, window, width));
    for (let i = 1; i < places.length; i++) expect(places[i] - places[i - 1]).toBeGreaterThan(40);
  });

  it('stay few in a window of any width, which an address may ask for', () => {
    expect(ticksOf({ from: -3e12, to: 4e12 }, 1000).length).toBeLessThan(60);
  });
});
