'use client';

import ReactEChartsCore from 'echarts-for-react/esm/core';
import { useMemo } from 'react';
import { charts } from './charts';
import { PANEL_GAP } from './collapse-view';
import { litOption } from './overlay-option';
import type { OverlayPoint, OverlayView } from './overlay-view';

interface LitLayerProps {
  view: OverlayView;
  points: readonly OverlayPoint[];
}

/** The points of one dataset on a canvas over that of all, which is dimmed meanwhile. */
export function LitLayer({ view, points }: LitLayerProps) {
  const option = useMemo(() => litOption(view, points), [view, points]);
  return (
    <div className="absolute inset-0">
      <ReactEChartsCore
        echarts={charts}
        option={option}
        lazyUpdate
        replaceMerge={['series']}
        style={{ height: view.heights.plot + view.heights.residual + PANEL_GAP }}
      />
    </div>
  );
}
