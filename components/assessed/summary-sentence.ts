/** One sentence on what the collapse shows, for those who do not see it. */
import type { PlotData } from '@/components/plots/plot-data';
import { formatCount, formatNumber } from '@/components/ui/format-quantity';
import type { Look } from './assessed-view';

export function sentenceOn(data: PlotData, { window, byLigand }: Look): string {
  const { points, onCurve, warning, offCurve } = data.assessment.summary;
  const against =
    byLigand === null
      ? `free energy from ${formatNumber(window.from)} to ${formatNumber(window.to)} kT, beside the master curve`
      : `the concentration of ${data.document.ligands.find(({ id }) => id === byLigand)?.name ?? byLigand}`;
  return `Activity of ${counted(points, 'point')} in ${counted(data.series.length, 'series', 'series')} against ${against}: ${formatCount(onCurve)} on the curve, ${counted(warning, 'warning')}, ${formatCount(offCurve)} off the curve.`;
}

function counted(count: number, one: string, many = `${one}s`): string {
  return `${formatCount(count)} ${count === 1 ? one : many}`;
}
