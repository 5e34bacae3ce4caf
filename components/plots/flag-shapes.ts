/** The shapes of flagged points on a canvas: told by shape and stem, never by colour alone. */
import type { CustomSeriesRenderItemReturn } from 'echarts/types/dist/shared';
import type { PlotColours } from './plot-colours';

const DIAMOND = 4.6;
const RING = 11;
const TRIANGLE = 'M0,-6 L6,5 L-6,5 Z';

interface FlagShape {
  /** pixels from the canvas' corner */
  x: number;
  y: number;
  colours: PlotColours;
  opacity: number;
  /** 1 where left out */
  size?: number;
}

/** A warning: a hollow triangle. */
export function triangleAt({ x, y, colours, opacity, size = 1 }: FlagShape): CustomSeriesRenderItemReturn {
  return {
    type: 'path',
    x,
    y,
    transition: ['x', 'y'],
    scaleX: size,
    scaleY: size,
    shape: { d: TRIANGLE },
    style: { fill: colours.ground, stroke: colours.warn, lineWidth: 1.5, opacity },
  };
}

/**
 * An off-curve point: a hollow diamond, on a stem where there is one.
 *
 * @param stemTo where the stem ends, pixels; null: no stem
 */
export function diamondAt(
  { x, y, colours, opacity, size = 1 }: FlagShape,
  stemTo: number | null,
): CustomSeriesRenderItemReturn {
  const head = {
    type: 'polygon' as const,
    scaleX: size,
    scaleY: size,
    shape: {
      points: [
        [0, -DIAMOND],
        [DIAMOND, 0],
        [0, DIAMOND],
        [-DIAMOND, 0],
      ],
    },
    style: { fill: colours.ground, stroke: colours.off, lineWidth: 1.5, opacity },
  };
  if (stemTo === null) return { type: 'group', x, y, transition: ['x', 'y'], children: [head] };
  const stem = {
    type: 'line' as const,
    // What is said stands beside the point, so the point itself is what is pointed at.
    silent: true,
    shape: { x1: 0, y1: 0, x2: 0, y2: stemTo - y },
    style: { stroke: colours.off, lineWidth: 1, opacity: opacity * 0.8 },
  };
  return { type: 'group', x, y, transition: ['x', 'y'], children: [stem, head] };
}

/** Around the point that is meant: a ring, away from its shape. */
export function ringAt({
  x,
  y,
  colours,
}: Pick<FlagShape, 'x' | 'y' | 'colours'>): CustomSeriesRenderItemReturn {
  return {
    type: 'circle',
    x,
    y,
    transition: ['x', 'y'],
    shape: { cx: 0, cy: 0, r: RING },
    style: { fill: 'transparent', stroke: colours.act, lineWidth: 2 },
  };
}
