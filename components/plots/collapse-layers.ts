/** The layers of the collapse, from the back to the front. Off-curve is told by shape and stem, never by colour alone. */
import type { CustomSeriesOption, LineSeriesOption, ScatterSeriesOption } from 'echarts/charts';
import type { CustomSeriesRenderItemAPI, CustomSeriesRenderItemReturn } from 'echarts/types/dist/shared';
import type { PointRow, RowsByFlag } from './collapse-points';
import { type CollapseView, LARGE, MOST_ERROR_BARS, residualBound } from './collapse-view';
import { diamondAt, ringAt, triangleAt } from './flag-shapes';
import { masterCurveLine } from './master-curve';

export type Layer = LineSeriesOption | ScatterSeriesOption | CustomSeriesOption;

const DIMMED = 0.13;
/** Flagged points of other series stay plain to see: they are what is looked for. */
const DIMMED_FLAGGED = 0.6;
/** Where a row's series and point stand in a data item. */
export const SERIES_AT = 2;
export const POINT_AT = 3;

/** In which of the two panels a layer is drawn. */
type Panel = 0 | 1;

const panelAxes = (panel: Panel) => ({ xAxisIndex: panel, yAxisIndex: panel });

function opacityOf(view: CollapseView, series: number, full = 1, dimmed = DIMMED): number {
  return view.lit === null || view.lit === series ? full : full * dimmed;
}

function colourOf(view: CollapseView, series: number): string {
  const { colour } = view.data.series[series];
  if (view.lit === series && colour === null) return view.colours.act;
  return colour === null ? view.colours.ink : view.colours.series[colour - 1];
}

/** The master curve over the window: by energy only. */
export function masterCurve(view: CollapseView): LineSeriesOption {
  const line = masterCurveLine(view.window, view.colours);
  return view.by === 'energy' ? line : { ...line, data: [] };
}

/** The separate responses: hidden in the master curve by energy, apart by concentration. */
export function responses(view: CollapseView): LineSeriesOption[] {
  return view.curves.map(({ series, samples }, k) => ({
    id: `response ${k}`,
    type: 'line',
    ...panelAxes(0),
    data: samples.map(({ place, energy, expected }) => [view.by === 'energy' ? energy : place, expected]),
    showSymbol: false,
    silent: true,
    z: 3,
    lineStyle: {
      color: colourOf(view, series),
      width: 1.5,
      opacity: view.by === 'energy' ? 0 : opacityOf(view, series, 0.9),
    },
  }));
}

function plotItem(row: PointRow): number[] {
  return [row.x, row.activity, row.series, row.point, row.expected, row.activityU, row.energyU];
}

function residualItem(view: CollapseView): (row: PointRow) => number[] {
  const bound = residualBound(view.data) - 0.7;
  return (row) => [row.energy, Math.max(-bound, Math.min(bound, row.z)), row.series, row.point];
}

const seriesIn = (item: unknown): number => (item as number[])[SERIES_AT];

/** On-curve points of one panel: small filled dots. */
function dots(view: CollapseView, panel: Panel, data: number[][]): ScatterSeriesOption {
  const large = data.length > LARGE;
  const full = panel === 0 ? 0.85 : 0.7;
  return {
    id: `dots ${panel}`,
    type: 'scatter',
    ...panelAxes(panel),
    data,
    symbolSize: large ? 3 : panel === 0 ? 7 : 5,
    large,
    z: 5,
    clip: true,
    emphasis: { disabled: true },
    itemStyle: large
      ? { color: view.colours.soft, opacity: view.lit === null ? 0.5 : DIMMED }
      : {
          color: ({ data: item }) => colourOf(view, seriesIn(item)),
          opacity: full,
          borderColor: view.colours.ground,
          borderWidth: 0.5,
        },
  };
}

/** Splits rows so that dimmed ones are a layer of their own: a layer has one opacity. */
function dimmedDots(view: CollapseView, panel: Panel, data: number[][]): ScatterSeriesOption[] {
  const layer = dots(view, panel, data);
  if (view.lit === null) return [layer, { ...layer, id: `dots ${panel} dimmed`, data: [] }];
  const isLit = (item: number[]) => item[SERIES_AT] === view.lit;
  return [
    {
      ...layer,
      data: data.filter(isLit),
      large: false,
      symbolSize: panel === 0 ? 7 : 5,
      itemStyle: { color: ({ data: item }) => colourOf(view, seriesIn(item)), opacity: 0.95 },
    },
    {
      ...layer,
      id: `dots ${panel} dimmed`,
      data: data.filter((item) => !isLit(item)),
      itemStyle: { ...layer.itemStyle, opacity: DIMMED },
    },
  ];
}

/** Warnings: hollow triangles. */
function triangles(view: CollapseView, panel: Panel, data: number[][]): CustomSeriesOption {
  return {
    id: `triangles ${panel}`,
    type: 'custom',
    ...panelAxes(panel),
    data,
    z: 6,
    clip: true,
    encode: { x: 0, y: 1 },
    renderItem: (_, api) => triangleAt(shapeOf(view, api)),
  };
}

/** Off-curve points: hollow diamonds; in the plot on a stem that drops to the curve. */
function diamonds(view: CollapseView, panel: Panel, data: number[][]): CustomSeriesOption {
  return {
    id: `diamonds ${panel}`,
    type: 'custom',
    ...panelAxes(panel),
    data,
    z: 7,
    clip: true,
    encode: { x: 0, y: 1 },
    renderItem: (_, api) =>
      diamondAt(shapeOf(view, api), panel === 0 ? api.coord([api.value(0), api.value(4)])[1] : null),
  };
}

function shapeOf(view: CollapseView, api: CustomSeriesRenderItemAPI) {
  const [x, y] = api.coord([api.value(0), api.value(1)]);
  return {
    x,
    y,
    colours: view.colours,
    opacity: opacityOf(view, Number(api.value(SERIES_AT)), 1, DIMMED_FLAGGED),
  };
}

/** A ring around the point that the page was opened at. */
function ring(view: CollapseView, panel: Panel, rows: readonly PointRow[]): CustomSeriesOption {
  const isMarked = ({ series, point }: PointRow) =>
    series === view.marked?.series && point === view.marked.point;
  return {
    id: `ring ${panel}`,
    type: 'custom',
    ...panelAxes(panel),
    data: rows.filter(isMarked).map(panel === 0 ? plotItem : residualItem(view)),
    silent: true,
    z: 9,
    clip: false,
    encode: { x: 0, y: 1 },
    renderItem: (_, api) => {
      const [x, y] = api.coord([api.value(0), api.value(1)]);
      return ringAt({ x, y, colours: view.colours });
    },
  };
}

/** One standard uncertainty either way: of the measurement up and down, of the energy left and right. */
function errorBars(view: CollapseView, rows: readonly PointRow[]): CustomSeriesOption {
  const shown = rows.length <= MOST_ERROR_BARS ? rows : rows.filter(({ series }) => series === view.lit);
  return {
    id: 'error bars',
    type: 'custom',
    ...panelAxes(0),
    data: shown.map(plotItem),
    silent: true,
    z: 4,
    clip: true,
    encode: { x: 0, y: 1 },
    renderItem: (_, api) => errorBar(view, api),
  };
}

function errorBar(view: CollapseView, api: CustomSeriesRenderItemAPI): CustomSeriesRenderItemReturn {
  const [px, py] = [Number(api.value(0)), Number(api.value(1))];
  const [x, y] = api.coord([px, py]);
  const up = api.coord([px, py + Number(api.value(5))])[1] - y;
  const across = view.by === 'energy' ? api.coord([px + Number(api.value(6)), py])[0] - x : 0;
  const style = {
    stroke: colourOf(view, Number(api.value(SERIES_AT))),
    lineWidth: 1,
    opacity: opacityOf(view, Number(api.value(SERIES_AT)), 0.55),
  };
  return {
    type: 'group',
    x,
    y,
    transition: ['x', 'y'],
    children: [
      { type: 'line', shape: { x1: 0, y1: -up, x2: 0, y2: up }, style },
      { type: 'line', shape: { x1: -across, y1: 0, x2: across, y2: 0 }, style },
    ],
  };
}

/** All layers of both panels. */
export function layersOf(view: CollapseView, rows: RowsByFlag): Layer[] {
  const residual = residualItem(view);
  const all = [...rows['on-curve'], ...rows.warning, ...rows['off-curve']];
  return [
    ...responses(view),
    masterCurve(view),
    errorBars(view, all),
    ...dimmedDots(view, 0, rows['on-curve'].map(plotItem)),
    triangles(view, 0, rows.warning.map(plotItem)),
    diamonds(view, 0, rows['off-curve'].map(plotItem)),
    ...dimmedDots(view, 1, rows['on-curve'].map(residual)),
    triangles(view, 1, rows.warning.map(residual)),
    diamonds(view, 1, rows['off-curve'].map(residual)),
    ring(view, 0, all),
    ring(view, 1, all),
  ];
}
