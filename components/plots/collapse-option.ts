/** The collapse and its residual panel as the chart library takes them. */
import type { LineSeriesOption } from 'echarts/charts';
import { layersOf, POINT_AT, SERIES_AT } from './collapse-layers';
import { rowsByFlag } from './collapse-points';
import { activityBounds, type CollapseView, PANEL_GAP, residualBound } from './collapse-view';
import { concentrationTicks } from './concentration-axis';
import { describePoint } from './describe-point';

export const TRAVEL_MILLISECONDS = 700;
const LEVELS = [0, 0.25, 0.5, 0.75, 1];

/** The option of the chart for a view of the collapse; energies in kT, activities without a unit. */
export function collapseOption(view: CollapseView): Record<string, unknown> {
  const { heights, colours } = view;
  const rows = rowsByFlag(view);
  return {
    animation: view.animate,
    animationDuration: 0,
    animationDurationUpdate: view.animate ? TRAVEL_MILLISECONDS : 0,
    animationEasingUpdate: 'cubicInOut',
    animationThreshold: 8000,
    textStyle: { fontFamily: colours.font, color: colours.ink },
    grid: [
      { left: 0, right: 0, top: 0, height: heights.plot },
      { left: 0, right: 0, top: heights.plot + PANEL_GAP, height: heights.residual },
    ],
    xAxis: [plotXAxis(view), { ...hiddenAxis(1), min: view.window.from, max: view.window.to }],
    yAxis: yAxes(view),
    tooltip: tooltip(view),
    series: [...layersOf(view, rows), levels(view), residualLimits(view)],
  };
}

const hiddenAxis = (gridIndex: number) => ({
  type: 'value',
  gridIndex,
  axisLine: { show: false },
  axisTick: { show: false },
  axisLabel: { show: false },
  splitLine: { show: false },
  animation: false,
});

function plotXAxis(view: CollapseView): Record<string, unknown> {
  if (view.by === 'energy' || view.axis === null) {
    return { ...hiddenAxis(0), min: view.window.from, max: view.window.to };
  }
  const ticks = concentrationTicks(view.axis);
  const labels = new Map(ticks.map(({ at, label }) => [at, label]));
  const places = ticks.map(({ at }) => at);
  return {
    ...hiddenAxis(0),
    min: view.axis.from,
    max: view.axis.to,
    position: 'bottom',
    axisTick: {
      show: true,
      inside: true,
      length: 6,
      customValues: places,
      lineStyle: { color: view.colours.soft },
    },
    axisLabel: {
      show: true,
      inside: true,
      margin: 9,
      customValues: places,
      color: view.colours.soft,
      fontSize: 12,
      formatter: (at: number) => labels.get(at) ?? '',
    },
  };
}

function yAxes(view: CollapseView): Record<string, unknown>[] {
  const { low, high } = activityBounds(view.data);
  const bound = residualBound(view.data);
  return [
    { ...hiddenAxis(0), min: low, max: high },
    { ...hiddenAxis(1), min: -bound, max: bound },
  ];
}

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

function levels({ colours }: CollapseView): LineSeriesOption {
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

function residualLimits({ colours }: CollapseView): LineSeriesOption {
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

/** What the plot says on pointing, drawn by the plot itself: no markup is ever made of submitted names. */
function tooltip(view: CollapseView): Record<string, unknown> {
  const { colours } = view;
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
    formatter: ({ data }: { data: number[] }) => {
      const lines = describePoint(view.data, { series: data[SERIES_AT], point: data[POINT_AT] });
      return lines.map(plainText).join('\n');
    },
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
