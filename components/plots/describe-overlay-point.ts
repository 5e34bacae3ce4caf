/** A point of the overlay in words: whose it is, what was measured, how far it misses. Plain text, drawn by the plot. */
import { formatFixed, formatScore } from '@/components/ui/format-quantity';
import type { Overlay } from '@/schemas/overlay';
import {
  ACTIVITY_AT,
  DATASET_AT,
  EXPECTED_AT,
  FLAG_AT,
  FLAGS,
  POINT_AT,
  SERIES_AT,
  Z_AT,
} from './overlay-layers';
import { FLAG_WORDS } from './plot-data';

/** Longer titles are cut: the tooltip must fit a narrow plot. */
const LONGEST_TITLE = 44;

/** @param item a data item of the overlay's layers */
export function describeOverlayPoint(overlay: Overlay, item: number[]): string[] {
  const dataset = overlay.datasets[item[DATASET_AT]];
  if (dataset === undefined) return [];
  const series = dataset.series[item[SERIES_AT]];
  return [
    shortened(dataset.title),
    `${dataset.accession} · ${dataset.lab.name}`,
    `${shortened(series ?? 'series')}, point ${item[POINT_AT] + 1}: ${FLAG_WORDS[FLAGS[item[FLAG_AT]]]}`,
    `activity ${formatFixed(item[ACTIVITY_AT], 3)}, expected ${formatFixed(item[EXPECTED_AT], 3)} at ${formatFixed(item[0], 2)} kT`,
    `residual ${formatScore(item[Z_AT])} standard uncertainties`,
  ];
}

function shortened(text: string): string {
  return text.length <= LONGEST_TITLE ? text : `${text.slice(0, LONGEST_TITLE - 1).trimEnd()}…`;
}
