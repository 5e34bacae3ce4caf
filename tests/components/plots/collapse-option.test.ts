import { describe, expect, it } from 'vitest';
import { collapseOption } from '@/components/plots/collapse-option';
import { contractDocument } from '../../support/contract-document';
import { plotted, plottedExample, viewOf } from '../../support/plotted-dataset';

const data = plottedExample('collapse');

/** The members that are looked at here. */
interface SeenOption {
  animation: boolean;
  animationDurationUpdate: number;
  grid: { left: number; right: number; top: number; height: number }[];
  xAxis: {
    min: number;
    max: number;
    axisLabel: { customValues?: number[]; formatter?: (at: number) => string };
  }[];
  tooltip: { renderMode: string; formatter: (item: { data: number[] }) => string };
}

const seen = (view: Parameters<typeof collapseOption>[0]) => collapseOption(view) as unknown as SeenOption;

describe('the chart’s option', () => {
  it('spans the canvas, so that plot, ruler and strips share one axis', () => {
    const { grid, xAxis } = seen(viewOf(data, { window: { from: -7, to: 3 } }));
    for (const { left, right } of grid) expect([left, right]).toEqual([0, 0]);
    for (const { min, max } of xAxis) expect([min, max]).toEqual([-7, 3]);
    // Under the line between the panels stands what the lower one is, and no residual.
    expect(grid[1].top).toBe(grid[0].height + 1 + 24);
    expect(grid[1].top + grid[1].height).toBe(300 + 1 + 120);
  });

  it('by concentration shows the ligand’s axis above the residuals’ energies', () => {
    const view = viewOf(data, { by: 'concentration' });
    const { xAxis } = seen(view);
    expect([xAxis[0].min, xAxis[0].max]).toEqual([view.axis?.from, view.axis?.to]);
    expect([xAxis[1].min, xAxis[1].max]).toEqual([-10, 10]);
    const { customValues = [], formatter } = xAxis[0].axisLabel;
    expect(customValues.map((at) => formatter?.(at))).toEqual(
      expect.arrayContaining(['0', '1', '10', '100']),
    );
  });

  it('lets nothing travel where motion is not wanted', () => {
    expect(seen(viewOf(data, { animate: false }))).toMatchObject({
      animation: false,
      animationDurationUpdate: 0,
    });
    expect(seen(viewOf(data)).animationDurationUpdate).toBeGreaterThan(0);
  });

  it('says a point as rich text in which submitted names style nothing', () => {
    const document = contractDocument();
    document.series[0].label = '<img src=x> {a|b}';
    const { tooltip } = seen(viewOf(plotted(document)));
    expect(tooltip.renderMode).toBe('richText');
    const text = tooltip.formatter({ data: [0, 0, 0, 1] });
    expect(text).toContain('<img src=x> (a¦b), point 2');
    expect(text).not.toMatch(/[{}|]/);
  });
});
