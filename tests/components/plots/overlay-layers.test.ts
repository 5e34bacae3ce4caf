import { describe, expect, it } from 'vitest';
import { describeOverlayPoint } from '@/components/plots/describe-overlay-point';
import {
  cellOpacity,
  DATASET_AT,
  dotOpacity,
  EXPECTED_AT,
  litLayers,
  overlayLayers,
} from '@/components/plots/overlay-layers';
import { litOption, overlayOption } from '@/components/plots/overlay-option';
import { type OverlayView, pointsFrom } from '@/components/plots/overlay-view';
import { logistic } from '@/lib/engine/logistic';
import { COLOURS } from '../../support/plotted-dataset';
import { smallOverlay, TWO_DATASETS } from '../../support/small-overlay';

const overlay = smallOverlay(TWO_DATASETS);
const viewOf = (overrides: Partial<OverlayView> = {}): OverlayView => ({
  overlay,
  window: { from: -10, to: 4 },
  colours: COLOURS,
  heights: { plot: 300, residual: 120 },
  ...overrides,
});
const layersOf = (view: OverlayView) =>
  new Map(overlayLayers(view).map((layer) => [layer.id, layer] as const));
const itemsOf = (view: OverlayView, id: string) => layersOf(view).get(id)?.data as number[][];

describe('layers of the overlay', () => {
  it('draw every single point once in each panel, by its flag', () => {
    for (const panel of [0, 1]) {
      expect(itemsOf(viewOf(), `base dots ${panel}`)).toHaveLength(3);
      expect(itemsOf(viewOf(), `base triangles ${panel}`)).toHaveLength(1);
      expect(itemsOf(viewOf(), `base diamonds ${panel}`)).toHaveLength(1);
    }
    expect(itemsOf(viewOf(), 'cells')).toEqual([]);
  });

  it('let the stem of a miss end on the curve', () => {
    const [item] = itemsOf(viewOf(), 'base diamonds 0');
    expect(item[1]).toBe(0.31);
    expect(item[EXPECTED_AT]).toBeCloseTo(logistic(2.05), 14);
  });

  it('keep residuals inside their panel, on their side', () => {
    const [item] = itemsOf(viewOf(), 'base diamonds 1');
    expect(item[1]).toBeGreaterThan(-9);
    expect(item[1]).toBeLessThan(-8);
  });

  it('of what is lit hold that dataset alone, in full', () => {
    const points = pointsFrom(overlay.points ?? overlay.offCurve.points).filter(
      ({ dataset }) => dataset === 0,
    );
    const [dots] = litLayers(viewOf(), points).filter(({ id }) => id === 'lit dots 0');
    expect((dots.data as number[][]).map((item) => item[DATASET_AT])).toEqual([0, 0, 0]);
    expect(dots).toMatchObject({ itemStyle: { opacity: 1, color: COLOURS.act } });
    expect(litOption(viewOf(), points).yAxis).toEqual(overlayOption(viewOf()).yAxis);
    expect(litOption(viewOf(), points).xAxis).toEqual(overlayOption(viewOf()).xAxis);
  });

  it('are cells where points are too many, and single points off the curve', () => {
    const view = viewOf({ overlay: smallOverlay(TWO_DATASETS, false) });
    const cells = itemsOf(view, 'cells');
    // The point at −12 kT is outside of the window, the one off the curve is drawn by itself.
    expect(cells).toHaveLength(3);
    expect(cells[0][0]).toBeCloseTo(-1.1, 12);
    expect(itemsOf(view, 'base dots 0')).toEqual([]);
    expect(itemsOf(view, 'base diamonds 0')).toHaveLength(1);
  });

  it('have a name each', () => {
    const ids = overlayLayers(viewOf()).map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
  });
});

describe('density', () => {
  it('grows with the logarithm of the count: single points are seen beside thousands', () => {
    expect(cellOpacity(1, 1000)).toBeGreaterThan(0.1);
    expect(cellOpacity(1000, 1000)).toBeLessThanOrEqual(1);
    const [first, second] = [cellOpacity(10, 1000), cellOpacity(100, 1000)];
    expect(second - first).toBeCloseTo(first - cellOpacity(1, 1000), 12);
  });

  it('of dots comes from their overlap: the more there are, the fainter each', () => {
    expect(dotOpacity(10)).toBeGreaterThan(dotOpacity(500));
    expect(dotOpacity(500)).toBeGreaterThan(dotOpacity(3000));
    expect(dotOpacity(100_000)).toBeGreaterThan(0.2);
  });
});

describe('what the overlay says on pointing', () => {
  it('names dataset, laboratory, series, and how far the point misses', () => {
    const [item] = itemsOf(viewOf(), 'base diamonds 0');
    expect(describeOverlayPoint(overlay, item)).toEqual([
      'Dataset 2',
      'CK-000002 · A Lab',
      'first series, point 5: off curve',
      'activity 0.310, expected 0.886 at 2.05 kT',
      expect.stringMatching(/^residual −28\.8 standard uncertainties$/),
    ]);
  });

  it('both panels span the window that the ruler shows', () => {
    const { xAxis } = overlayOption(viewOf()) as { xAxis: { min: number; max: number }[] };
    expect(xAxis.map(({ min, max }) => [min, max])).toEqual([
      [-10, 4],
      [-10, 4],
    ]);
  });
});
