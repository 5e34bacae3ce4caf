/** One sentence on what the overlay shows, for those who do not see it. */

import { signedLabel } from '@/components/plots/axis-ruler';
import type { EnergyWindow } from '@/components/plots/energy-window';
import { formatCount } from '@/components/ui/format-quantity';
import type { DatasetList } from '@/schemas/dataset-answers';

export function collectionSentence(total: DatasetList['total'], { from, to }: EnergyWindow): string {
  const { datasets, points, onCurve, warning, offCurve } = total;
  return `Activity of ${counted(points, 'point')} in ${counted(datasets, 'dataset')} against free energy from ${signedLabel(from)} to ${signedLabel(to)} kT, beside the master curve: ${formatCount(onCurve)} on the curve, ${counted(warning, 'warning')}, ${formatCount(offCurve)} off the curve. The same stands in the tables below.`;
}

export function counted(count: number, one: string): string {
  return `${formatCount(count)} ${count === 1 ? one : `${one}s`}`;
}
