/**
 * The discrete misreadings of what a laboratory stated, each with the series as it reads without it. A
 * reading changes statements and activities, never what they mean: uncertainties and correlations travel
 * with the numbers, so a re-read series is as complete as the one stated. Nothing is mutated.
 *
 * A reading that changes nothing, or that leaves the ranges which a document may hold, is none.
 */
import type { Misreading } from './assessment';
import type { DatasetInput, SeriesInput } from './inputs';
import { readAsDissociation, swapConstants } from './reread-constants';
import { moveGap, readGapIn, readGapLogarithm, reverseGap } from './reread-gap';
import { invertActivity, scaleConcentrations } from './reread-points';
import { ENERGY_UNITS } from './units';

/**
 * Every misreading that there is, the simplest and likeliest first: where two of them leave the very same
 * residuals the earlier one is named first.
 *
 * The very same: exchanged constants and an inverted activity, where there is no gap and no modulator; exchanged
 * and association constants, where K_I·K_A = 1 in their own unit; association constants and a concentration
 * scale, where one state alone is bound and K is a root or a power of a thousand. Nearly the same: two readings
 * that multiply the gap by like factors, as gap-scope with n = 4 and kJ/mol for kcal/mol (4.184), with n = 2.5
 * and kT for kJ/mol (2.479), or log-ratio by chance; there the residuals decide, and the other one is reported
 * beside it. Turning the gap round, exchanging the constants and inverting the activity are three different
 * things: any two of them together are the third.
 */
export const MISREADINGS: readonly Misreading[] = [
  { misreading: 'gap-orientation' },
  ...ENERGY_UNITS.map((unit) => ({ misreading: 'gap-unit' as const, unit })),
  { misreading: 'gap-scope' },
  { misreading: 'swapped-constants' },
  { misreading: 'inverted-activity' },
  ...[1e-3, 1e3, 1e-6, 1e6].map((factor) => ({ misreading: 'concentration-scale' as const, factor })),
  { misreading: 'log-ratio', base: '10' },
  { misreading: 'log-ratio', base: 'e' },
  { misreading: 'association-constants' },
];

/**
 * A series as it reads where one statement was meant otherwise.
 *
 * @param dataset the valid dataset that the series stands in; gives temperature and units of the ligands
 * @param series as stated; whatever else it carries (label, variant) passes through
 * @returns the series re-read, or null where this is no reading of it
 */
export function rereadSeries<S extends SeriesInput>(
  dataset: DatasetInput,
  series: S,
  misreading: Misreading,
): S | null {
  switch (misreading.misreading) {
    case 'gap-orientation':
      return reverseGap(dataset, series);
    case 'gap-scope':
      return moveGap(dataset, series);
    case 'gap-unit':
      return readGapIn(dataset, series, misreading.unit);
    case 'log-ratio':
      return readGapLogarithm(dataset, series, misreading.base);
    case 'swapped-constants':
      return swapConstants(dataset, series);
    case 'association-constants':
      return readAsDissociation(series);
    case 'inverted-activity':
      return invertActivity(series);
    case 'concentration-scale':
      return scaleConcentrations(dataset, series, misreading.factor);
  }
}

/** Whether two misreadings are one and the same, with their factor, unit or base. */
export function sameMisreading(one: Misreading, other: Misreading): boolean {
  if (one.misreading === 'concentration-scale')
    return other.misreading === 'concentration-scale' && one.factor === other.factor;
  if (one.misreading === 'gap-unit') return other.misreading === 'gap-unit' && one.unit === other.unit;
  if (one.misreading === 'log-ratio') return other.misreading === 'log-ratio' && one.base === other.base;
  return one.misreading === other.misreading;
}
