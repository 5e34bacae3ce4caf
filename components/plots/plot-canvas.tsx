'use client';

import ReactEChartsCore from 'echarts-for-react/esm/core';
import { type ReactNode, useMemo } from 'react';
import { charts } from './charts';

interface PlotCanvasProps {
  option: Record<string, unknown>;
  /** pixels */
  height: number;
  /** one sentence on what the plot shows */
  sentence: string;
  /** the data item that is pointed at; undefined when none is */
  onPoint: (item: number[] | undefined) => void;
  onChoose: (item: number[] | undefined) => void;
  /** fainter, under what is lit in the children */
  dimmed?: boolean;
  /** once something is drawn */
  onDrawn?: () => void;
  /** words that stand over the canvas */
  children: ReactNode;
}

/** A plot on a canvas as wide as its column. */
export function PlotCanvas({
  option,
  height,
  sentence,
  onPoint,
  onChoose,
  dimmed = false,
  onDrawn,
  children,
}: PlotCanvasProps) {
  const events = useMemo(
    () => ({
      mouseover: (event: { data?: number[] }) => onPoint(event.data),
      mouseout: () => onPoint(undefined),
      click: (event: { data?: number[] }) => onChoose(event.data),
    }),
    [onPoint, onChoose],
  );
  return (
    <div role="img" aria-label={sentence} className="relative">
      {/* Around the chart, not on it: with a new class the chart would draw everything again. */}
      <div className={dimmed ? 'opacity-25' : ''}>
        <ReactEChartsCore
          echarts={charts}
          option={option}
          onEvents={events}
          onChartReady={onDrawn}
          lazyUpdate
          replaceMerge={['series']}
          style={{ height }}
        />
      </div>
      <div className="pointer-events-none absolute inset-0">{children}</div>
    </div>
  );
}
