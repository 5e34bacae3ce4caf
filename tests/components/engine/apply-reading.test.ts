import { describe, expect, it } from 'vitest';
import { applyReading } from '@/components/engine/apply-reading';
import { plottedExample } from '@/tests/support/plotted-dataset';

const { document } = plottedExample('collapse');

describe('a document read otherwise', () => {
  it('changes the series concerned, and no other', () => {
    const read = applyReading(document, {
      kind: 'convention',
      series: ['wt'],
      misreading: { misreading: 'gap-orientation' },
    });
    expect(read.series[0].parameters.gap?.orientation).toBe('active-minus-inactive');
    expect(read.series.slice(1)).toEqual(document.series.slice(1));
    expect(document.series[0].parameters.gap?.orientation).toBe('inactive-minus-active');
  });

  it('puts scaled activities back between two limits, uncertainties with them', () => {
    const read = applyReading(document, { kind: 'range', series: 'T61A', low: 0.2, high: 0.7 });
    const [stated, back] = [document.series[1].points[0], read.series[1].points[0]];
    expect(back.activity).toBeCloseTo(0.2 + 0.5 * (stated.activity ?? 0), 12);
    expect(back.u).toBeCloseTo(0.5 * (stated.u ?? 0), 12);
  });

  it('leaves a series as it is to which a reading does not apply', () => {
    const read = applyReading(document, {
      kind: 'convention',
      series: ['wt'],
      misreading: { misreading: 'log-ratio', base: '10' },
    });
    expect(read).toEqual(document);
  });

  it('moves one series by its shape', () => {
    const estimates = [{ name: 'offset' as const, value: 0.5, u: 0.1 }];
    const read = applyReading(document, { kind: 'shape', series: 'wt', estimates });
    expect(read.series[0].parameters.gap?.value).toBeCloseTo(2.9, 12);
  });
});
