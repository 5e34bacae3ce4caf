import { logistic } from '@/lib/engine/logistic';

const FROM_KT = -8;
const TO_KT = 8;
const BOTTOM = -0.12;
const TOP = 1.2;
const LEVELS = [0, 0.25, 0.5, 0.75, 1];

const across = (energy: number) => ((energy - FROM_KT) / (TO_KT - FROM_KT)) * 100;
const down = (activity: number) => ((TOP - activity) / (TOP - BOTTOM)) * 100;

function curvePath(): string {
  const steps = 160;
  const points = Array.from({ length: steps + 1 }, (_, i) => {
    const energy = FROM_KT + ((TO_KT - FROM_KT) * i) / steps;
    return `${across(energy).toFixed(3)} ${down(logistic(energy)).toFixed(3)}`;
  });
  return `M${points.join('L')}`;
}

/** The window of energies that the figure shows, kT: what stands below it on the axis must show the same. */
export const CURVE_FIGURE_WINDOW = { from: FROM_KT, to: TO_KT } as const;

/** The master curve by itself, drawn on the server; its energy axis is an `EnergyRuler` below it. */
export function CurveFigure() {
  return (
    <svg
      className="block h-72 w-full text-2xs sm:h-96"
      role="img"
      aria-label="The master curve: activity rises from 0 to 1 with the free-energy coordinate and is one half at 0 kT"
    >
      {LEVELS.map((level) => (
        <g key={level}>
          <line x1="0" x2="100%" y1={`${down(level)}%`} y2={`${down(level)}%`} className="stroke-hairline" />
          <text x={9} y={`${down(level)}%`} dy={-5} className="figures fill-soft">
            {level.toFixed(2)}
          </text>
        </g>
      ))}
      <text x={9} y={16} className="fill-ink font-semibold">
        Activity
      </text>
      <line
        x1="50%"
        x2="50%"
        y1={`${down(0)}%`}
        y2={`${down(0.5)}%`}
        className="stroke-field"
        strokeDasharray="1 3"
      />
      <svg width="100%" height="100%" viewBox="0 0 100 100" preserveAspectRatio="none" aria-hidden="true">
        <path
          d={curvePath()}
          fill="none"
          className="stroke-ink"
          strokeWidth="2"
          vectorEffect="non-scaling-stroke"
        />
      </svg>
      <text x={9} y="97%" className="fill-soft">
        favours inactive
      </text>
      <text x="100%" dx={-9} y="97%" textAnchor="end" className="fill-soft">
        favours active
      </text>
    </svg>
  );
}
