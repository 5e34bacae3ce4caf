/** How the height of a plot is shared by its two panels. */
import { type CollapseHeights, PANEL_GAP } from './collapse-view';

/** The residual panel's share of the height, and how tall the two may grow to fill their column. */
const RESIDUAL_SHARE = 0.29;
const SHORTEST = 400;
const TALLEST = 840;

/** @param height of the column, pixels */
export function heightsIn(height: number): CollapseHeights {
  const whole = Math.max(SHORTEST, Math.min(TALLEST, height)) - PANEL_GAP;
  const residual = Math.round(whole * RESIDUAL_SHARE);
  return { plot: whole - residual, residual };
}
