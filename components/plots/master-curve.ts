/** The master curve as a line of the plots. */
import type { LineSeriesOption } from 'echarts/charts';
import { logistic } from '@/lib/engine/logistic';
import type { EnergyWindow } from './energy-window';
import type { PlotColours } from './plot-colours';

const CURVE_SAMPLES = 240;

/** The curve across a window, in the upper panel. */
export function masterCurveLine({ from, to }: EnergyWindow, colours: PlotColours): LineSeriesOption {
  return {
    id: 'master curve',
    type: 'line',
    xAxisIndex: 0,
    yAxisIndex: 0,
    data: Array.from({ length: CURVE_SAMPLES + 1 }, (_, i) => {
      const energy = from + ((to - from) * i) / CURVE_SAMPLES;
      return [energy, logistic(energy)];
    }),
    showSymbol: false,
    silent: true,
    animation: false,
    z: 4,
    lineStyle: { color: colours.ink, width: 2 },
  };
}
