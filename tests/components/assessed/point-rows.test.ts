import { describe, expect, it } from 'vitest';
import { pointRows } from '@/components/assessed/point-rows';
import { plottedExample } from '../../support/plotted-dataset';

const data = plottedExample('thousand-fold');
const EVERYTHING = { from: -100, to: 100 };

describe('rows of the table', () => {
  it('are all points, in order, each with a key of its own', () => {
    const rows = pointRows(data, { series: null, flag: null, window: EVERYTHING });
    expect(rows).toHaveLength(data.assessment.summary.points);
    expect(new Set(rows.map(({ key }) => key)).size).toBe(rows.length);
    expect(rows.slice(0, 3).map(({ key }) => key)).toEqual(['0/0', '0/1', '0/2']);
  });

  it('can be those of one series', () => {
    const rows = pointRows(data, { series: 2, flag: null, window: EVERYTHING });
    expect(new Set(rows.map(({ series }) => series.label))).toEqual(new Set(['S88N']));
    expect(rows).toHaveLength(14);
  });

  it('can be those of one flag', () => {
    const rows = pointRows(data, { series: null, flag: 'off-curve', window: EVERYTHING });
    expect(rows).toHaveLength(data.assessment.summary.offCurve);
    expect(rows.every(({ point }) => point.flag === 'off-curve')).toBe(true);
  });

  it('are those in the window, edges included', () => {
    const { energy } = data.series[0].assessed.points[4];
    const rows = pointRows(data, { series: null, flag: null, window: { from: energy, to: 1 } });
    expect(rows.some(({ key }) => key === '0/4')).toBe(true);
    expect(rows.every(({ point }) => point.energy >= energy && point.energy <= 1)).toBe(true);
    expect(rows.length).toBeLessThan(data.assessment.summary.points);
  });

  it('can be the flagged ones, the furthest off first', () => {
    const rows = pointRows(data, { series: null, flag: 'flagged', window: EVERYTHING, order: 'miss' });
    const { warning, offCurve } = data.assessment.summary;
    expect(rows).toHaveLength(warning + offCurve);
    const misses = rows.map(({ point }) => Math.abs(point.z));
    expect(misses).toEqual([...misses].sort((a, b) => b - a));
  });

  it('can stand by energy', () => {
    const rows = pointRows(data, { series: null, flag: null, window: EVERYTHING, order: 'energy' });
    const energies = rows.map(({ point }) => point.energy);
    expect(energies).toEqual([...energies].sort((a, b) => a - b));
    expect(rows).toHaveLength(data.assessment.summary.points);
  });

  it('can be none', () => {
    expect(pointRows(data, { series: 0, flag: 'off-curve', window: EVERYTHING })).toEqual([]);
  });
});
