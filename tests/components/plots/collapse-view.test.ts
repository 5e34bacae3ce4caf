import { describe, expect, it } from 'vitest';
import { activityBounds, exceedsResidualPanel, residualBound } from '@/components/plots/collapse-view';
import { contractDocument } from '../../support/contract-document';
import { plotted, plottedExample } from '../../support/plotted-dataset';

function withActivity(activity: number, u: number) {
  const document = contractDocument();
  document.series[0].points = [{ ligands: { velline: 0 }, activity, u }];
  return plotted(document);
}

describe('bounds of the activity axis', () => {
  it('rest where all points lie near the curve', () => {
    expect(activityBounds(plottedExample('collapse'))).toEqual({ low: -0.17, high: 1.18 });
  });

  it('hold points outside with their error bars', () => {
    expect(activityBounds(withActivity(1.5, 0.1)).high).toBeCloseTo(1.62, 12);
    expect(activityBounds(withActivity(-0.4, 0.1)).low).toBeCloseTo(-0.52, 12);
  });
});

describe('bounds of the residual panel', () => {
  it('hold the limits and grow with the largest score', () => {
    expect(residualBound(plottedExample('collapse'))).toBeCloseTo(4.6, 12);
    const data = withActivity(0.76, 0.02);
    const { z } = data.series[0].assessed.points[0];
    expect(Math.abs(z)).toBeGreaterThan(4.6);
    expect(Math.abs(z)).toBeLessThan(8.4);
    expect(residualBound(data)).toBeCloseTo(Math.abs(z) + 0.6, 12);
    expect(exceedsResidualPanel(data)).toBe(false);
  });

  it('end at nine, which is then said', () => {
    const data = plottedExample('thousand-fold');
    expect(residualBound(data)).toBe(9);
    expect(exceedsResidualPanel(data)).toBe(true);
  });
});
