import { describe, expect, it } from 'vitest';
import { energyBins } from '@/components/datasets/energy-bins';
import { logistic } from '@/lib/engine/logistic';
import { smallOverlay, TWO_DATASETS } from '../../support/small-overlay';

describe('the plot as a table', () => {
  const bins = energyBins(smallOverlay(TWO_DATASETS), { from: -10, to: 4 });

  it('has the bins of the window that hold points, in order, with their flags', () => {
    expect(bins.map(({ from, to }) => [from, to])).toEqual([
      [-2, -1],
      [0, 1],
      [1, 2],
      [2, 3],
    ]);
    expect(
      bins.map(({ points, onCurve, warning, offCurve }) => [points, onCurve, warning, offCurve]),
    ).toEqual([
      [1, 1, 0, 0],
      [1, 1, 0, 0],
      [1, 0, 1, 0],
      [1, 0, 0, 1],
    ]);
  });

  it('says how high the points lie beside the curve, to half a cell', () => {
    expect(Math.abs(bins[0].meanActivity - 0.26)).toBeLessThanOrEqual(0.0051);
    expect(bins[0].expected).toBe(logistic(-1.5));
  });

  it('narrows its bins with the window, and stays short', () => {
    expect(
      energyBins(smallOverlay(TWO_DATASETS), { from: 0, to: 2.5 }).map(({ from, to }) => [from, to]),
    ).toEqual([
      [0, 0.1],
      [1, 1.1],
      [2, 2.1],
    ]);
    const wide = energyBins(smallOverlay(TWO_DATASETS), { from: -4000, to: 4000 });
    expect(wide.reduce((sum, { points }) => sum + points, 0)).toBe(TWO_DATASETS.length);
  });
});
