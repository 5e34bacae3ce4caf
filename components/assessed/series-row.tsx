import { RowFrame } from '@/components/layout/row-frame';
import type { EnergyWindow } from '@/components/plots/energy-window';
import type { PlotSeries } from '@/components/plots/plot-data';
import { RowFigures } from '@/components/plots/row-figures';
import { SeriesStrip } from '@/components/plots/series-strip';
import { SeriesDot } from './series-dot';

export interface SeriesRowProps {
  series: PlotSeries;
  window: EnergyWindow;
  width: number;
  lit: boolean;
  chosen: boolean;
  onLight: (on: boolean) => void;
  onChoose: () => void;
  /** why it misses, in a few words */
  why?: string | null;
}

/** A series as a row on the page's columns: name, strip, figures. Pointing at it or focusing it lights its points. */
export function SeriesRow(props: SeriesRowProps) {
  const { series, window, width, lit, chosen, onLight, onChoose, why } = props;
  const { assessed, stated } = series;
  const onCurve = assessed.points.filter(({ flag }) => flag === 'on-curve').length;
  return (
    <li onPointerEnter={() => onLight(true)} onPointerLeave={() => onLight(false)}>
      <RowFrame
        lit={lit}
        who={
          <button
            type="button"
            aria-pressed={chosen}
            onClick={onChoose}
            onFocus={() => onLight(true)}
            onBlur={() => onLight(false)}
            className="block w-full py-2 text-left lg:min-h-14"
          >
            <span
              className={`flex items-baseline gap-2 font-semibold ${chosen ? 'underline underline-offset-4' : ''}`}
            >
              <SeriesDot colour={series.colour} />
              <span className="truncate">{series.label}</span>
            </span>
            <span className="block truncate text-sm text-soft">
              {why ? <span className="text-off">{why} · </span> : null}
              {subtitle(series)}
            </span>
          </button>
        }
        axis={<SeriesStrip points={assessed.points} window={window} width={width} lit={lit} />}
        verdict={
          <RowFigures
            onCurve={onCurve}
            points={stated.points.length}
            rmsZ={assessed.rmsZ}
            pValue={assessed.pValue}
          />
        }
      />
    </li>
  );
}

function subtitle({ stated, assessed, label }: PlotSeries): string {
  const parts = [
    stated.variant === label ? null : stated.variant,
    `${stated.points.length} points`,
    assessed.origin === 'fitted-here' ? 'parameters fitted to these points' : null,
    stated.temperature ? `${assessed.temperatureK.toFixed(2)} K` : null,
  ];
  return parts.filter(Boolean).join(' · ');
}
