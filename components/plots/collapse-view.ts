/** How the collapse is being looked at, and where its parts stand in pixels. */
import type { ConcentrationAxis } from './concentration-axis';
import type { EnergyWindow } from './energy-window';
import type { PlotColours } from './plot-colours';
import type { PlotData, PointPlace } from './plot-data';
import type { ResponseCurve } from './response-curves';

export interface CollapseView {
  data: PlotData;
  window: EnergyWindow;
  /** the ligand whose concentrations could be shown, with the curves that the statements predict along it */
  axis: ConcentrationAxis | null;
  curves: ResponseCurve[];
  /** whether points stand by energy or by concentration */
  by: 'energy' | 'concentration';
  /** series whose points are lit, the rest dimmed */
  lit: number | null;
  /** the point that the page was opened at; null for none */
  marked: PointPlace | null;
  colours: PlotColours;
  /** whether points may travel */
  animate: boolean;
  heights: CollapseHeights;
}

export interface CollapseHeights {
  plot: number;
  residual: number;
}

/** Space between the plot and the residual panel: the line between them. */
export const PANEL_GAP = 1;
/** Error bars are drawn for all points up to so many, beyond only for the series that is lit. */
export const MOST_ERROR_BARS = 600;
/** Above this points are drawn in one sweep, in one colour. */
export const LARGE = 3000;

/** Bounds of the activity axis: the curve with air, wider where points lie outside; rounded so that it rests. */
export function activityBounds(data: PlotData): { low: number; high: number } {
  let low = -0.17;
  let high = 1.18;
  for (const { assessed } of data.series) {
    for (const { activity, activityU } of assessed.points) {
      low = Math.min(low, activity - activityU - 0.02);
      high = Math.max(high, activity + activityU + 0.02);
    }
  }
  return { low, high };
}

const LEAST_Z = 4.6;
const MOST_Z = 9;

/** Half the height of the residual panel in standard uncertainties; what is beyond stands at its edge. */
export function residualBound(data: PlotData): number {
  let largest = LEAST_Z;
  for (const { assessed } of data.series) {
    for (const { z } of assessed.points) largest = Math.max(largest, Math.abs(z) + 0.6);
  }
  return Math.min(largest, MOST_Z);
}

/** Whether some points are beyond the residual panel and stand at its edge. */
export function exceedsResidualPanel(data: PlotData): boolean {
  return data.series.some(({ assessed }) => assessed.points.some(({ z }) => Math.abs(z) > MOST_Z));
}
