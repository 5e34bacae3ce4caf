import { describe, expect, it } from 'vitest';
import { layersOf, masterCurve, POINT_AT, responses, SERIES_AT } from '@/components/plots/collapse-layers';
import { rowsByFlag } from '@/components/plots/collapse-points';
import { type CollapseView, residualBound } from '@/components/plots/collapse-view';
import { logistic } from '@/lib/engine/logistic';
import { plotted, plottedExample, viewOf } from '../../support/plotted-dataset';

const data = plottedExample('thousand-fold');
/** Where the curve's activity stands in an item of the plot. */
const EXPECTED_AT = 4;

function itemsOf(view: CollapseView): Record<string, number[][]> {
  return Object.fromEntries(
    layersOf(view, rowsByFlag(view)).map(({ id, data: items }) => [id, items]),
  ) as never;
}

describe('layers of the collapse', () => {
  it('draw every point once in the plot and once in the residual panel', () => {
    const items = itemsOf(viewOf(data));
    const { onCurve, warning, offCurve } = data.assessment.summary;
    for (const panel of [0, 1]) {
      expect(items[`dots ${panel}`]).toHaveLength(onCurve);
      expect(items[`triangles ${panel}`]).toHaveLength(warning);
      expect(items[`diamonds ${panel}`]).toHaveLength(offCurve);
    }
    expect(items['error bars']).toHaveLength(onCurve + warning + offCurve);
  });

  it('give off-curve points the place on the curve that their stem drops to', () => {
    const items = itemsOf(viewOf(data))['diamonds 0'];
    expect(items.length).toBeGreaterThan(0);
    for (const item of items) {
      const point = data.series[item[SERIES_AT]].assessed.points[item[POINT_AT]];
      expect(item[1]).toBe(point.activity);
      expect(item[EXPECTED_AT]).toBeCloseTo(logistic(point.energy), 14);
    }
  });

  it('keep residuals by energy and within their panel', () => {
    const items = itemsOf(viewOf(data, { by: 'concentration' }));
    for (const item of items['diamonds 1']) {
      const point = data.series[item[SERIES_AT]].assessed.points[item[POINT_AT]];
      expect(item[0]).toBe(point.energy);
      expect(Math.sign(item[1])).toBe(Math.sign(point.z));
      expect(Math.abs(item[1])).toBeLessThan(residualBound(data));
      if (Math.abs(point.z) < 8) expect(item[1]).toBe(point.z);
    }
  });

  it('put the dimmed points on a layer of their own while a series is lit', () => {
    expect(itemsOf(viewOf(data))['dots 0 dimmed']).toEqual([]);
    const lit = itemsOf(viewOf(data, { lit: 1 }));
    const series = (items: number[][]) => new Set(items.map((item) => item[SERIES_AT]));
    expect(series(lit['dots 0'])).toEqual(new Set([1]));
    expect(series(lit['dots 0 dimmed'])).toEqual(new Set([0, 2, 3]));
    const counts = [...lit['dots 0'], ...lit['dots 0 dimmed']].length;
    expect(counts).toBe(data.assessment.summary.onCurve);
  });

  it('have error bars of the lit series only where points are many', () => {
    const [series] = data.document.series;
    const points = Array.from({ length: 301 }, (_, i) => series.points[i % series.points.length]);
    const many = plotted({
      ...data.document,
      series: ['a', 'b'].map((id) => ({ ...series, id, points })),
    });
    expect(itemsOf(viewOf(many))['error bars']).toEqual([]);
    expect(itemsOf(viewOf(many, { lit: 1 }))['error bars']).toHaveLength(301);
  });

  it('are the same layers in either view, so that points travel', () => {
    const ids = (by: 'energy' | 'concentration') => {
      const view = viewOf(data, { by });
      return layersOf(view, rowsByFlag(view)).map(({ id }) => id);
    };
    expect(ids('concentration')).toEqual(ids('energy'));
    expect(new Set(ids('energy')).size).toBe(ids('energy').length);
  });
});

describe('curves', () => {
  it('the master curve spans the window, by energy only', () => {
    const view = viewOf(data, { window: { from: -3, to: 5 } });
    const samples = masterCurve(view).data as number[][];
    expect([samples[0][0], samples.at(-1)?.[0]]).toEqual([-3, 5]);
    for (const [energy, activity] of samples) expect(activity).toBeCloseTo(logistic(energy), 14);
    expect(masterCurve({ ...view, by: 'concentration' }).data).toEqual([]);
  });

  it('the responses lie hidden in it by energy and come apart by concentration', () => {
    const by = (way: 'energy' | 'concentration') => responses(viewOf(data, { by: way }));
    for (const { lineStyle, data: samples } of by('energy')) {
      expect(lineStyle?.opacity).toBe(0);
      for (const [energy, activity] of samples as number[][])
        expect(activity).toBeCloseTo(logistic(energy), 14);
    }
    for (const { lineStyle } of by('concentration')) expect(lineStyle?.opacity).toBeGreaterThan(0.5);
    const first = (way: 'energy' | 'concentration') => by(way)[0].data as number[][];
    expect(first('concentration').map(([, y]) => y)).toEqual(first('energy').map(([, y]) => y));
  });

  it('those of other series are dimmed while one is lit', () => {
    const [a, b] = responses(viewOf(data, { by: 'concentration', lit: 1 }));
    expect(Number(a.lineStyle?.opacity)).toBeLessThan(Number(b.lineStyle?.opacity) / 5);
  });
});
