import type { AssessedPoint } from '@/lib/engine/assessment';
import { type EnergyWindow, isInside, pixelOf } from './energy-window';

/** What a strip draws of a point. */
export type StripPoint = Pick<AssessedPoint, 'energy' | 'z' | 'flag'>;

interface SeriesStripProps {
  points: readonly StripPoint[];
  window: EnergyWindow;
  /** width of the axis column, pixels: what makes the strip's axis the plot's */
  width: number;
  lit: boolean;
}

const HEIGHT = 56;
const MIDDLE = HEIGHT / 2;
/** Pixels a standard uncertainty, and where a stem is cut off. */
const PER_Z = 3;
const LONGEST_STEM = 24;

/**
 * A series as a strip on the energy axis: a tick a point; warnings stand out above or below, off-curve
 * points on stems as long as they miss, up where the activity is too high.
 */
export function SeriesStrip({ points, window, width, lit }: SeriesStripProps) {
  const shown = points.filter(({ energy }) => isInside(energy, window));
  const x = ({ energy }: StripPoint) => round(pixelOf(energy, window, width));
  const onCurve = shown.filter(({ flag }) => flag === 'on-curve');
  const warnings = shown.filter(({ flag }) => flag === 'warning');
  const offCurve = shown.filter(({ flag }) => flag === 'off-curve');
  return (
    <svg width={width} height={HEIGHT} aria-hidden="true" className="block">
      <line x1={0} x2={width} y1={MIDDLE} y2={MIDDLE} className="stroke-hairline" />
      <path
        d={onCurve.map((point) => `M${x(point)} ${MIDDLE - 5}v10`).join('')}
        className={lit ? 'stroke-act' : 'stroke-ink/60'}
      />
      <path
        d={warnings.map((point) => `M${x(point)} ${MIDDLE}v${-stem(point)}`).join('')}
        className="stroke-warn"
        strokeWidth={2}
      />
      <path
        d={offCurve.map((point) => `M${x(point)} ${MIDDLE}v${-stem(point)}`).join('')}
        className="stroke-off"
        strokeWidth={1.5}
      />
      <path
        d={offCurve.map((point) => diamondAt(x(point), MIDDLE - stem(point))).join('')}
        className="fill-off"
      />
    </svg>
  );
}

function stem({ z }: StripPoint): number {
  return round(Math.max(-LONGEST_STEM, Math.min(LONGEST_STEM, z * PER_Z)));
}

function diamondAt(x: number, y: number): string {
  return `M${x} ${y - 3.5}l3.5 3.5l-3.5 3.5l-3.5-3.5z`;
}

function round(pixel: number): number {
  return Math.round(pixel * 10) / 10;
}
