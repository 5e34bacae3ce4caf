import { logistic } from '@/lib/engine/logistic';
import type { EnergyWindow } from './energy-window';

const LOW = -0.17;
const HIGH = 1.18;
/** The plot's share of the height; the rest is the residual panel. */
const PLOT_PERCENT = 71;
const LEVELS = [0, 0.25, 0.5, 0.75, 1];
const SAMPLES = 160;

const down = (activity: number) => ((HIGH - activity) / (HIGH - LOW)) * PLOT_PERCENT;

/** The shape of what comes, until the chart is there: the master curve and the two panels, drawn on the server. */
export function CurveOutline({ window }: { window: EnergyWindow }) {
  return (
    <svg className="absolute inset-0 size-full text-2xs" aria-hidden="true">
      {LEVELS.map((level) => (
        <g key={level}>
          <line x1="0" x2="100%" y1={`${down(level)}%`} y2={`${down(level)}%`} className="stroke-hairline" />
          <text x={8} y={`${down(level)}%`} dy={-4} className="figures fill-soft">
            {level.toFixed(2)}
          </text>
        </g>
      ))}
      <line x1="0" x2="100%" y1={`${PLOT_PERCENT}%`} y2={`${PLOT_PERCENT}%`} className="stroke-hairline" />
      <line x1="0" x2="100%" y1="85.5%" y2="85.5%" className="stroke-soft" />
      <svg width="100%" height="100%" viewBox="0 0 100 100" preserveAspectRatio="none" aria-hidden="true">
        <path
          d={curveAcross(window)}
          fill="none"
          className="stroke-ink"
          strokeWidth="2"
          vectorEffect="non-scaling-stroke"
        />
      </svg>
    </svg>
  );
}

function curveAcross({ from, to }: EnergyWindow): string {
  const places = Array.from({ length: SAMPLES + 1 }, (_, i) => {
    const activity = logistic(from + ((to - from) * i) / SAMPLES);
    return `${((i / SAMPLES) * 100).toFixed(3)} ${down(activity).toFixed(3)}`;
  });
  return `M${places.join('L')}`;
}
