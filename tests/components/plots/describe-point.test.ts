import { describe, expect, it } from 'vitest';
import { conditions, describePoint } from '@/components/plots/describe-point';
import { contractDocument } from '../../support/contract-document';
import { plotted, plottedExample } from '../../support/plotted-dataset';

describe('a point in words', () => {
  it('says what was measured where, what was expected, and how far apart they are', () => {
    const data = plotted(contractDocument());
    const [point] = data.series[0].assessed.points;
    const lines = describePoint(data, { series: 0, point: 0 });
    expect(lines[0]).toBe('wild type, point 1: on curve');
    expect(lines[1]).toBe('velline 0 µM, membrane potential 0 mV');
    expect(lines[2]).toBe('activity 0.910 ± 0.020');
    expect(lines[3]).toMatch(/^expected 0\.9\d+ ± 0\.0\d+ at 2\.40 ± 0\.10.kT$/);
    expect(lines[4]).toMatch(/^residual −?\d\.\d+ standard uncertainties, p 0\.\d+$/);
    expect(lines[4].includes('−')).toBe(point.z < 0);
  });

  it('marks an uncertainty that was assumed', () => {
    const document = contractDocument();
    document.series[0].points[0] = { ligands: { velline: 0 }, activity: 0.9 };
    expect(describePoint(plotted(document), { series: 0, point: 0 })[2]).toMatch(/\(assumed\)$/);
  });

  it('says the flag in words', () => {
    const data = plottedExample('thousand-fold');
    const point = data.series[3].assessed.points.findIndex(({ flag }) => flag === 'off-curve');
    expect(describePoint(data, { series: 3, point })[0]).toBe(`G143C, point ${point + 1}: off curve`);
  });

  it('makes no markup of a name, and none is taken away', () => {
    const document = contractDocument();
    document.series[0].label = '<b>x</b>';
    expect(describePoint(plotted(document), { series: 0, point: 0 })[0]).toBe('<b>x</b>, point 1: on curve');
  });

  it('names every ligand, and a modulator only where it is stated', () => {
    const data = plottedExample('mixed-classes');
    expect(conditions(data, { series: 5, point: 3 })).toEqual([
      'ocarate 9.56 µM',
      'selnate 50 µM',
      'membrane potential 40 mV',
    ]);
    expect(conditions(plotted(contractDocument()), { series: 0, point: 1 })).toEqual(['velline 12.5 µM']);
  });
});
