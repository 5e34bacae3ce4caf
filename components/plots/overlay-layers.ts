/** The layers of the overlay, from the back to the front: density or dots, the curve, warnings, off-curve points, what is lit. */
import type { CustomSeriesOption, LineSeriesOption, ScatterSeriesOption } from 'echarts/charts';
import type { CustomSeriesRenderItemAPI, CustomSeriesRenderItemReturn } from 'echarts/types/dist/shared';
import type { Flag } from '@/lib/engine/assessment';
import { diamondAt, triangleAt } from './flag-shapes';
import { masterCurveLine } from './master-curve';
import { OVERLAY_RESIDUAL_BOUND, type OverlayPoint, type OverlayView, singlePoints } from './overlay-view';

export type OverlayLayer = LineSeriesOption | ScatterSeriesOption | CustomSeriesOption;

/** Where things stand in a data item. */
export const DATASET_AT = 2;
export const SERIES_AT = 3;
export const POINT_AT = 4;
export const EXPECTED_AT = 5;
export const Z_AT = 6;
export const ACTIVITY_AT = 7;
export const FLAG_AT = 8;

/** A flag in a data item is its place here. */
export const FLAGS: readonly Flag[] = ['on-curve', 'warning', 'off-curve'];

/** Flagged points are many here, so each is a little smaller than in a dataset's own plot. */
const FLAGGED_SIZE = 0.82;
/** Dots of a few points are plain to see; of thousands their overlap shows where they are dense. */
const STRONGEST_DOTS = 0.75;
const FAINTEST_DOTS = 0.34;
/** A cell with one point, and how much is added up to the fullest one. */
const CELL_OF_ONE = 0.18;
const CELL_RANGE = 0.72;

type Panel = 0 | 1;
type Kind = 'base' | 'lit';

const panelAxes = (panel: Panel) => ({ xAxisIndex: panel, yAxisIndex: panel });

/** All layers of both panels. */
export function overlayLayers(view: OverlayView): OverlayLayer[] {
  return [
    cellsLayer(view),
    ...pointLayers(view, 'base', singlePoints(view.overlay)),
    masterCurveLine(view.window, view.colours),
  ];
}

/** What stands out of the rest, which is dimmed meanwhile: the points of one dataset, and the curve. */
export function litLayers(view: OverlayView, points: readonly OverlayPoint[]): OverlayLayer[] {
  return [...pointLayers(view, 'lit', points), masterCurveLine(view.window, view.colours)];
}

function pointLayers(view: OverlayView, kind: Kind, points: readonly OverlayPoint[]): OverlayLayer[] {
  const of = (flag: Flag) => points.filter((point) => point.flag === flag);
  return ([0, 1] as const).flatMap((panel) => {
    const items = (flag: Flag) => of(flag).map(panel === 0 ? plotItem : residualItem);
    return [
      dots(view, kind, panel, items('on-curve')),
      triangles(view, kind, panel, items('warning')),
      diamonds(view, kind, panel, items('off-curve')),
    ];
  });
}

function plotItem(point: OverlayPoint): number[] {
  const { energy, activity, dataset, series, point: index, expected, z, flag } = point;
  return [energy, activity, dataset, series, index, expected, z, activity, FLAGS.indexOf(flag)];
}

function residualItem(point: OverlayPoint): number[] {
  const bound = OVERLAY_RESIDUAL_BOUND - 0.7;
  const item = plotItem(point);
  item[1] = Math.max(-bound, Math.min(bound, point.z));
  return item;
}

/** How opaque each of so many dots is. */
export function dotOpacity(count: number): number {
  const share = Math.min(1, Math.log10(Math.max(1, count / 100)) / Math.log10(30));
  return STRONGEST_DOTS + (FAINTEST_DOTS - STRONGEST_DOTS) * share;
}

function dots(view: OverlayView, kind: Kind, panel: Panel, data: number[][]): ScatterSeriesOption {
  const isLit = kind === 'lit';
  return {
    id: `${kind} dots ${panel}`,
    type: 'scatter',
    ...panelAxes(panel),
    data,
    symbolSize: isLit ? 5.5 : panel === 0 ? 4.4 : 3.4,
    z: 3,
    clip: true,
    emphasis: { disabled: true },
    itemStyle: {
      color: isLit ? view.colours.act : view.colours.soft,
      opacity: isLit ? 1 : dotOpacity(data.length),
    },
  };
}

function flagged(
  panel: Panel,
  data: number[][],
): Pick<CustomSeriesOption, 'type' | 'data' | 'clip' | 'encode'> {
  return { type: 'custom', ...panelAxes(panel), data, clip: true, encode: { x: 0, y: 1 } };
}

function triangles(view: OverlayView, kind: Kind, panel: Panel, data: number[][]): CustomSeriesOption {
  return {
    ...flagged(panel, data),
    id: `${kind} triangles ${panel}`,
    z: 6,
    renderItem: (_, api) => triangleAt(shapeOf(view, api)),
  };
}

function diamonds(view: OverlayView, kind: Kind, panel: Panel, data: number[][]): CustomSeriesOption {
  return {
    ...flagged(panel, data),
    id: `${kind} diamonds ${panel}`,
    z: 7,
    renderItem: (_, api) =>
      diamondAt(
        shapeOf(view, api),
        panel === 0 ? api.coord([api.value(0), api.value(EXPECTED_AT)])[1] : null,
      ),
  };
}

function shapeOf({ colours }: OverlayView, api: CustomSeriesRenderItemAPI) {
  const [x, y] = api.coord([api.value(0), api.value(1)]);
  return { x, y, colours, opacity: 1, size: FLAGGED_SIZE };
}

/** How opaque a cell is: by the logarithm of its count, so that single points are seen beside thousands. */
export function cellOpacity(points: number, most: number): number {
  return CELL_OF_ONE + CELL_RANGE * (most <= 1 ? 0 : Math.log(points) / Math.log(most));
}

/** Density: a small rectangle a cell, where points are too many to draw each. */
function cellsLayer(view: OverlayView): CustomSeriesOption {
  const { overlay } = view;
  const data = overlay.points === null ? cellItems(view) : [];
  const most = data.reduce((largest, [, , points]) => Math.max(largest, points), 1);
  return {
    id: 'cells',
    type: 'custom',
    ...panelAxes(0),
    data,
    silent: true,
    z: 2,
    clip: true,
    animation: false,
    encode: { x: 0, y: 1 },
    renderItem: (_, api) => cell(view, most, api),
  };
}

/** Cells in the window as [energy, activity, points, flag]; off-curve ones only where single points were left out. */
function cellItems({ overlay, window }: OverlayView): number[][] {
  const { cells, grid, offCurve } = overlay;
  const items = cells.energyCell.map((i, k) => [
    i * grid.energy,
    cells.activityCell[k] * grid.activity,
    cells.points[k],
    FLAGS.indexOf(cells.flag[k]),
  ]);
  return items.filter(
    ([energy, , , flag]) =>
      energy + grid.energy >= window.from &&
      energy <= window.to &&
      (FLAGS[flag] !== 'off-curve' || offCurve.total > offCurve.shown),
  );
}

function cell(view: OverlayView, most: number, api: CustomSeriesRenderItemAPI): CustomSeriesRenderItemReturn {
  const { grid } = view.overlay;
  const [energy, activity] = [Number(api.value(0)), Number(api.value(1))];
  const [left, bottom] = api.coord([energy, activity]);
  const [right, top] = api.coord([energy + grid.energy, activity + grid.activity]);
  const { ink, warn, off } = view.colours;
  return {
    type: 'rect',
    shape: { x: left, y: top, width: right - left, height: bottom - top },
    style: {
      fill: [ink, warn, off][Number(api.value(3))],
      opacity: cellOpacity(Number(api.value(2)), most),
    },
  };
}
