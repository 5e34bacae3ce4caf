'use client';

import { type ReactNode, useCallback, useMemo } from 'react';
import { PANEL_GAP } from './collapse-view';
import { LitLayer } from './lit-layer';
import { DATASET_AT, POINT_AT, SERIES_AT } from './overlay-layers';
import { overlayOption } from './overlay-option';
import type { OverlayPoint, OverlayView } from './overlay-view';
import { PlotCanvas } from './plot-canvas';
import { usePlotColours } from './plot-colours';
import type { PointPlace } from './plot-data';

export interface OverlayChartProps {
  view: Omit<OverlayView, 'colours'>;
  /** points to be lit, the rest dimmed; null for none */
  lit: readonly OverlayPoint[] | null;
  /** one sentence on what the chart shows */
  sentence: string;
  /** the dataset, by its place in the overlay's list, whose point is pointed at; null when none is */
  onPoint: (dataset: number | null) => void;
  onChoose: (dataset: number, place: PointPlace) => void;
  onDrawn: () => void;
  children: ReactNode;
}

/** All points of a selection with the residual panel, on a canvas as wide as the axis column. */
export default function OverlayChart(props: OverlayChartProps) {
  const { view, lit, sentence, onPoint, onChoose, onDrawn, children } = props;
  const colours = usePlotColours();
  const coloured = useMemo(() => ({ ...view, colours }), [view, colours]);
  const option = useMemo(() => overlayOption(coloured), [coloured]);
  const point = useCallback((item: number[] | undefined) => onPoint(datasetIn(item)), [onPoint]);
  const choose = useCallback(
    (item: number[] | undefined) => {
      const dataset = datasetIn(item);
      if (item && dataset !== null) onChoose(dataset, { series: item[SERIES_AT], point: item[POINT_AT] });
    },
    [onChoose],
  );
  return (
    <PlotCanvas
      option={option}
      height={view.heights.plot + view.heights.residual + PANEL_GAP}
      sentence={sentence}
      onPoint={point}
      onChoose={choose}
      onDrawn={onDrawn}
      dimmed={lit !== null}
    >
      {lit === null ? null : <LitLayer view={coloured} points={lit} />}
      {children}
    </PlotCanvas>
  );
}

function datasetIn(item: number[] | undefined): number | null {
  return item && item.length > POINT_AT ? item[DATASET_AT] : null;
}
