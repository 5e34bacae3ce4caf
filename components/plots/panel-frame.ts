/** What both plots stand in: two panels over one energy axis, with their levels, limits and what is said on pointing. */
import type { LineSeriesOption } from 'echarts/charts';
import { type CollapseHeights, PANEL_GAP } from './collapse-view';
import type { PlotColours } from './plot-colours';

const LEVELS = [0, 0.25, 0.5, 0.75, 1];

/** The plot above, the residual panel below, both from edge to edge. */
export function panelGrids({ plot, residual }: CollapseHeights): Record<string, unknown>[] {
  return [
    { left: 0, right: 0, top: 0, height: plot },
    { left: 0, right: 0, top: plot + PANEL_GAP, height: residual },
  ];
}

/** An axis that draws nothing itself: levels, limits and the page's ruler are its marks. */
export const hiddenAxis = (gridIndex: number) => ({
  type: 'value',
  gridIndex,
  axisLine: { show: false },
  axisTick: { show: false },
  axisLabel: { show: false },
  splitLine: { show: false },
  animation: false,
});

/** A series without points that carries lines and their labels. */
function ruled(id: string, panel: 0 | 1, lines: Record<string, unknown>[]): LineSeriesOption {
  return {
    id,
    type: 'line',
    xAxisIndex: panel,
    yAxisIndex: panel,
    data: [],
    silent: true,
    markLine: { z: 1, silent: true, symbol: 'none', animation: false, precision: 6, data: lines as never },
  };
}

/** The levels of activity, 0 to 1 by quarters. */
export function levels(colours: PlotColours): LineSeriesOption {
  const line = (level: number) => ({
    yAxis: level,
    lineStyle: { color: colours.hairline, type: 'solid', width: 1 },
    label: {
      position: 'insideStartTop',
      distance: [8, 3],
      formatter: level.toFixed(2),
      color: colours.soft,
      fontSize: 12,
    },
  });
  return { ...ruled('levels', 0, LEVELS.map(line)), z: 1 };
}

/** The limits of the residual panel: two and three standard uncertainties. */
export function residualLimits(colours: PlotColours): LineSeriesOption {
  const line = (z: number, type: 'solid' | 'dotted', color: string, label = '') => ({
    yAxis: z,
    lineStyle: { color, type, width: 1 },
    label: {
      show: label !== '',
      position: z > 0 ? 'insideEndTop' : 'insideEndBottom',
      distance: [8, 2],
      formatter: label,
      color: colours.soft,
      fontSize: 12,
    },
  });
  const lines = [
    line(0, 'solid', colours.soft),
    line(2, 'solid', colours.hairline),
    line(-2, 'solid', colours.hairline),
    line(3, 'dotted', colours.off, '+3'),
    line(-3, 'dotted', colours.off, '\u22123'),
  ];
  return { ...ruled('residual limits', 1, lines), z: 1 };
}

/**
 * What the plot says on pointing, drawn by the plot itself: no markup is ever made of submitted names.
 *
 * @param linesOn lines of text on the point whose data item is given
 */
export function pointTooltip(
  colours: PlotColours,
  linesOn: (item: number[]) => string[],
): Record<string, unknown> {
  return {
    trigger: 'item',
    renderMode: 'richText',
    confine: true,
    position: cornerAwayFrom,
    transitionDuration: 0,
    backgroundColor: colours.ground,
    borderColor: colours.ink,
    borderWidth: 1,
    borderRadius: 0,
    padding: [8, 10],
    shadowBlur: 0,
    shadowColor: 'transparent',
    extraCssText: '',
    textStyle: { color: colours.ink, fontSize: 13, lineHeight: 19, fontFamily: colours.font },
    formatter: ({ data }: { data: number[] }) => linesOn(data).map(plainText).join('\n'),
  };
}

/** The corner of the plot that a sigmoid leaves empty, upper left, unless the point itself is there. */
function cornerAwayFrom(
  [x, y]: [number, number],
  _params: unknown,
  _element: unknown,
  _area: unknown,
  {
    contentSize: [width, height],
    viewSize: [whole],
  }: { contentSize: [number, number]; viewSize: [number, number] },
): [number, number] {
  const isThere = x < width + 80 && y < height + 50;
  return isThere ? [whole - width - 12, height + 60] : [48, 26];
}

/** Braces and bars would start the library's own styling. */
function plainText(text: string): string {
  return text.replace(/\{/g, '(').replace(/\}/g, ')').replace(/\|/g, '¦');
}
