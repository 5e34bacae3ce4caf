import { describe, expect, it } from 'vitest';
import { rowsByFlag } from '@/components/plots/collapse-points';
import { countFlags, energiesOf, plotDataOf, unitOfLigand } from '@/components/plots/plot-data';
import { plottedExample, viewOf } from '../../support/plotted-dataset';

const data = plottedExample('thousand-fold');

function allRows(by: 'energy' | 'concentration') {
  return Object.values(rowsByFlag(viewOf(data, { by }))).flat();
}

describe('points of the collapse', () => {
  it('stand by their energies, and each is there once', () => {
    const rows = allRows('energy');
    for (const row of rows) {
      expect(row.x).toBe(data.series[row.series].assessed.points[row.point].energy);
      expect(row.x).toBe(row.energy);
    }
    expect(new Set(rows.map(({ series, point }) => `${series}/${point}`)).size).toBe(
      data.assessment.summary.points,
    );
  });

  it('stand by the logarithm of the concentration, 0 at its own place', () => {
    const view = viewOf(data, { by: 'concentration' });
    for (const row of allRows('concentration')) {
      const c = data.document.series[row.series].points[row.point].ligands.velline;
      expect(row.x).toBeCloseTo(c === 0 ? (view.axis?.zeroAt ?? Number.NaN) : Math.log10(c), 12);
    }
  });

  it('travel only sideways between the two', () => {
    const [before, after] = [allRows('energy'), allRows('concentration')];
    expect(after.map(({ x: _, ...rest }) => rest)).toEqual(before.map(({ x: _, ...rest }) => rest));
    expect(after.map(({ x }) => x)).not.toEqual(before.map(({ x }) => x));
  });

  it('are grouped by their flag', () => {
    const rows = rowsByFlag(viewOf(data));
    const { onCurve, warning, offCurve } = data.assessment.summary;
    expect([rows['on-curve'].length, rows.warning.length, rows['off-curve'].length]).toEqual([
      onCurve,
      warning,
      offCurve,
    ]);
    for (const { series, point } of rows['off-curve'])
      expect(data.series[series].assessed.points[point].flag).toBe('off-curve');
  });

  it('stay by energy where there is no ligand', () => {
    const rows = Object.values(rowsByFlag(viewOf(data, { by: 'concentration', axis: null }))).flat();
    for (const row of rows) expect(row.x).toBe(row.energy);
  });
});

describe('what plots draw', () => {
  it('counts the flags that the summary counts', () => {
    const { onCurve, warning, offCurve } = data.assessment.summary;
    expect(countFlags(data.series.flatMap(({ assessed }) => assessed.points))).toEqual({
      'on-curve': onCurve,
      warning,
      'off-curve': offCurve,
    });
    expect([...energiesOf(data)]).toHaveLength(data.assessment.summary.points);
  });

  it('has colours for up to six series', () => {
    expect(data.series.map(({ colour }) => colour)).toEqual([1, 2, 3, 4]);
    const [series] = data.document.series;
    const document = { ...data.document, series: Array.from({ length: 7 }, () => series) };
    const many = plotDataOf(document, data.assessment);
    expect(new Set(many.series.map(({ colour }) => colour))).toEqual(new Set([null]));
  });

  it('knows a ligand’s unit', () => {
    expect(unitOfLigand(data.document, 'velline')).toBe('uM');
  });
});
