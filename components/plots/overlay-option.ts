/** The overlay and its residual panel as the chart library takes them. */
import { describeOverlayPoint } from './describe-overlay-point';
import { litLayers, type OverlayLayer, overlayLayers } from './overlay-layers';
import {
  OVERLAY_RESIDUAL_BOUND,
  type OverlayPoint,
  type OverlayView,
  overlayActivityBounds,
} from './overlay-view';
import { hiddenAxis, levels, panelGrids, pointTooltip, residualLimits } from './panel-frame';

/** Everything that is selected. */
export function overlayOption(view: OverlayView): Record<string, unknown> {
  return {
    ...panelsWith(view, overlayLayers(view)),
    tooltip: pointTooltip(view.colours, (item) => describeOverlayPoint(view.overlay, item)),
  };
}

/** What is lit, on a layer of its own over the rest: pointing at a row must not draw thousands of points again. */
export function litOption(view: OverlayView, points: readonly OverlayPoint[]): Record<string, unknown> {
  return panelsWith(view, litLayers(view, points));
}

function panelsWith(view: OverlayView, layers: OverlayLayer[]): Record<string, unknown> {
  const { colours, heights, window } = view;
  const { low, high } = overlayActivityBounds(view);
  const across = { min: window.from, max: window.to };
  return {
    animation: false,
    textStyle: { fontFamily: colours.font, color: colours.ink },
    grid: panelGrids(heights),
    xAxis: [
      { ...hiddenAxis(0), ...across },
      { ...hiddenAxis(1), ...across },
    ],
    yAxis: [
      { ...hiddenAxis(0), min: low, max: high },
      { ...hiddenAxis(1), min: -OVERLAY_RESIDUAL_BOUND, max: OVERLAY_RESIDUAL_BOUND },
    ],
    series: [...layers, ...levels(colours), ...residualLimits(colours)],
  };
}
