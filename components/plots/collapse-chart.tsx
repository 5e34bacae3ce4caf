'use client';

import { type ReactNode, useCallback, useMemo } from 'react';
import { POINT_AT, SERIES_AT } from './collapse-layers';
import { collapseOption } from './collapse-option';
import { type CollapseView, PANEL_GAP } from './collapse-view';
import { PlotCanvas } from './plot-canvas';
import { usePlotColours } from './plot-colours';
import type { PointPlace } from './plot-data';

export interface CollapseChartProps {
  view: Omit<CollapseView, 'colours'>;
  /** one sentence on what the chart shows */
  sentence: string;
  /** the point that is pointed at, null when none is */
  onPoint?: (place: PointPlace | null) => void;
  onChoose?: (place: PointPlace) => void;
  /** words that stand over the canvas */
  children: ReactNode;
}

/** The collapse with its residual panel, on a canvas as wide as the axis column. */
export default function CollapseChart({ view, sentence, onPoint, onChoose, children }: CollapseChartProps) {
  const colours = usePlotColours();
  const option = useMemo(() => collapseOption({ ...view, colours }), [view, colours]);
  const point = useCallback((item: number[] | undefined) => onPoint?.(placeIn(item)), [onPoint]);
  const choose = useCallback(
    (item: number[] | undefined) => {
      const place = placeIn(item);
      if (place) onChoose?.(place);
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
    >
      {children}
    </PlotCanvas>
  );
}

function placeIn(item: number[] | undefined): PointPlace | null {
  if (!item || item.length <= POINT_AT) return null;
  return { series: item[SERIES_AT], point: item[POINT_AT] };
}
