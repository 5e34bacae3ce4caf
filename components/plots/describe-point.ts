/** A point's figures in words, for what the plot says on pointing. Plain text: the plot draws it itself. */
import { formatNumber, formatPValue, formatQuantity, formatScore } from '@/components/ui/format-quantity';
import { unitLabel } from '@/components/ui/unit-label';
import { FLAG_WORDS, type PlotData, type PointPlace } from './plot-data';

/** Lines of text on one point: what was measured where, what was expected, how far apart they are. */
export function describePoint(data: PlotData, { series: s, point: i }: PointPlace): string[] {
  const series = data.series[s];
  const point = series.assessed.points[i];
  return [
    `${series.label}, point ${i + 1}: ${FLAG_WORDS[point.flag]}`,
    conditions(data, { series: s, point: i }).join(', '),
    `activity ${formatQuantity(point.activity, point.activityU)}${point.uncertainty === 'assumed' ? ' (assumed)' : ''}`,
    `expected ${formatQuantity(point.expected, point.expectedU)} at ${formatQuantity(point.energy, point.energyU, 'kT')}`,
    `residual ${formatScore(point.z)} standard uncertainties, p ${formatPValue(point.pValue)}`,
  ];
}

/** Concentrations and modulator values of a point, each with its name and unit. */
export function conditions(data: PlotData, { series: s, point: i }: PointPlace): string[] {
  const stated = data.series[s].stated.points[i];
  const ligands = data.document.ligands.map(
    ({ id, name, unit }) => `${name} ${formatNumber(stated.ligands[id] ?? 0)} ${unitLabel(unit)}`,
  );
  const modulators = (data.document.modulators ?? []).flatMap(({ id, name, unit }) => {
    const value = stated.modulators?.[id];
    return value === undefined ? [] : [`${name} ${formatNumber(value)} ${unit}`];
  });
  return [...ligands, ...modulators];
}
