/** The collapse and its residual panel as the chart library takes them. */
import { layersOf, POINT_AT, SERIES_AT } from './collapse-layers';
import { rowsByFlag } from './collapse-points';
import { activityBounds, type CollapseView, residualBound } from './collapse-view';
import { concentrationTicks } from './concentration-axis';
import { describePoint } from './describe-point';
import { hiddenAxis, levels, panelGrids, pointTooltip, residualLimits } from './panel-frame';

export const TRAVEL_MILLISECONDS = 700;

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
    grid: panelGrids(heights),
    xAxis: [plotXAxis(view), { ...hiddenAxis(1), min: view.window.from, max: view.window.to }],
    yAxis: yAxes(view),
    tooltip: pointTooltip(colours, (item) =>
      describePoint(view.data, { series: item[SERIES_AT], point: item[POINT_AT] }),
    ),
    series: [...layersOf(view, rows), ...levels(colours), ...residualLimits(colours)],
  };
}

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
