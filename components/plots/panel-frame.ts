/** What both plots stand in: two panels over one energy axis, with their levels, limits and what is said on pointing. */
import type { LineSeriesOption } from 'echarts/charts';
import { type CollapseHeights, PANEL_GAP } from './collapse-view';
import type { PlotColours } from './plot-colours';

const LEVELS = [0, 0.25, 0.5, 0.75, 1];
/** Where the residual panel says what it is, pixels: no residual is drawn there. */
export const RESIDUAL_HEAD = 24;

/** The plot above, the residual panel below, both from edge to edge. */
export function panelGrids({ plot, residual }: CollapseHeights): Record<string, unknown>[] {
  return [
    { left: 0, right: 0, top: 0, height: plot },
    { left: 0, right: 0, top: plot + PANEL_GAP + RESIDUAL_HEAD, height: residual - RESIDUAL_HEAD },
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

/** A line across a panel, and what is written at it. */
interface RuledLine {
  at: number;
  type: 'solid' | 'dotted';
  color: string;
  label?: string;
}

/** Lines behind the points, and their words before them, with a rim of the ground around each letter. */
function ruled(
  id: string,
  panel: 0 | 1,
  lines: readonly RuledLine[],
  colours: PlotColours,
): LineSeriesOption[] {
  const said = lines.filter(({ label }) => label !== undefined);
  return [
    carrier(
      id,
      panel,
      1,
      lines.map(({ at, type, color }) => ({
        yAxis: at,
        label: { show: false },
        lineStyle: { color, type, width: 1 },
      })),
    ),
    carrier(
      `${id}, words`,
      panel,
      8,
      said.map(({ at, label }) => ({
        yAxis: at,
        lineStyle: { color: 'transparent' },
        label: words(panel, at, label, colours),
      })),
    ),
  ];
}

/** A series without points that carries lines or their words. */
function carrier(id: string, panel: 0 | 1, z: number, data: Record<string, unknown>[]): LineSeriesOption {
  return {
    id,
    type: 'line',
    xAxisIndex: panel,
    yAxisIndex: panel,
    data: [],
    silent: true,
    z,
    markLine: { z, silent: true, symbol: 'none', animation: false, precision: 6, data: data as never },
  };
}

/** Levels are written at the left above their line; limits at the right, away from the middle. */
function words(panel: 0 | 1, at: number, label: string | undefined, { soft, ground }: PlotColours) {
  const side = panel === 0 ? 'insideStartTop' : at > 0 ? 'insideEndTop' : 'insideEndBottom';
  return {
    position: side,
    distance: [8, at < 0 ? 7 : 3],
    formatter: label,
    color: soft,
    fontSize: 12,
    textBorderColor: ground,
    textBorderWidth: 3,
  };
}

/** The levels of activity, 0 to 1 by quarters. */
export function levels(colours: PlotColours): LineSeriesOption[] {
  const lines = LEVELS.map((at) => ({
    at,
    type: 'solid' as const,
    color: colours.hairline,
    label: at.toFixed(2),
  }));
  return ruled('levels', 0, lines, colours);
}

/** The limits of the residual panel: two and three standard uncertainties. */
export function residualLimits(colours: PlotColours): LineSeriesOption[] {
  const lines: RuledLine[] = [
    { at: 0, type: 'solid', color: colours.soft },
    { at: 2, type: 'solid', color: colours.hairline },
    { at: -2, type: 'solid', color: colours.hairline },
    { at: 3, type: 'dotted', color: colours.off, label: '+3' },
    { at: -3, type: 'dotted', color: colours.off, label: '\u22123' },
  ];
  return ruled('residual limits', 1, lines, colours);
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
    confine: false,
    position: besidePoint(colours),
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

/** How far from the point, and from the canvas' edges, it stands, pixels. */
const AWAY = 14;
const LEAST_EDGE = 4;

interface DrawnText {
  setStyle: (style: Record<string, unknown>) => void;
  getBoundingRect: () => { width: number; height: number };
}

/**
 * Beside the point, on the side that a sigmoid leaves empty: above and to the left of the lower half, below and to the
 * right of the upper one. The library draws rich text in a face of its own, so the page's is set here, before measuring.
 */
function besidePoint({ font }: Pick<PlotColours, 'font'>) {
  return (
    [x, y]: [number, number],
    _params: unknown,
    element: DrawnText,
    _area: unknown,
    { viewSize: [across, down] }: { viewSize: [number, number] },
  ): [number, number] => {
    element.setStyle({ font: `13px ${font}`, lineHeight: 19 });
    const { width, height } = element.getBoundingRect();
    const isUpper = y < down * UPPER_HALF;
    const left = isUpper ? x + AWAY : x - width - AWAY;
    const top = isUpper ? y + AWAY : y - height - AWAY;
    return [between(left, across - width), between(top, down - height)];
  };
}

/** Where activity one half stands, as a share of the height of both panels. */
const UPPER_HALF = 0.36;

function between(place: number, most: number): number {
  return Math.max(LEAST_EDGE, Math.min(most - LEAST_EDGE, place));
}

/** Braces and bars would start the library's own styling. */
function plainText(text: string): string {
  return text.replace(/\{/g, '(').replace(/\}/g, ')').replace(/\|/g, '¦');
}
