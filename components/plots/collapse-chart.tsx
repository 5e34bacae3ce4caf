'use client';

import ReactEChartsCore from 'echarts-for-react/esm/core';
import { type ReactNode, useMemo } from 'react';
import { charts } from './charts';
import { POINT_AT, SERIES_AT } from './collapse-layers';
import { collapseOption } from './collapse-option';
import { type CollapseView, PANEL_GAP } from './collapse-view';
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
  const events = useMemo(
    () => ({
      mouseover: (event: { data?: number[] }) => onPoint?.(placeIn(event.data)),
      mouseout: () => onPoint?.(null),
      click: (event: { data?: number[] }) => {
        const place = placeIn(event.data);
        if (place) onChoose?.(place);
      },
    }),
    [onPoint, onChoose],
  );
  return (
    <div role="img" aria-label={sentence} className="relative">
      <ReactEChartsCore
        echarts={charts}
        option={option}
        onEvents={events}
        lazyUpdate
        replaceMerge={['series']}
        style={{ height: view.heights.plot + view.heights.residual + PANEL_GAP }}
      />
      <div className="pointer-events-none absolute inset-0">{children}</div>
    </div>
  );
}

function placeIn(data: number[] | undefined): PointPlace | null {
  if (!data || data.length <= POINT_AT) return null;
  return { series: data[SERIES_AT], point: data[POINT_AT] };
}
