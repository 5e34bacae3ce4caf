/** The ranges of what a document may state: within them every intermediate of the computation stays finite. */
import { gapToKT } from './convert-statements';
import type { ConstantStatement, GapStatement } from './inputs';
import { baseUnitsPer, type ConcentrationUnit, concentrationKind } from './units';

/** the largest gap, and the largest standard uncertainty of one stated as an energy, either way, kT */
export const LARGEST_KT = 200;
/** the largest number of any kind that a document may state, either way */
export const LARGEST_NUMBER = 1e30;
/** most correlations that a series may state */
export const MOST_CORRELATIONS = 500;
/** the largest standard uncertainty of a constant or a ratio, relative: beyond it nothing is known, and its square would swamp the rest */
export const LARGEST_RELATIVE_U = 100;
/** concentrations and constants that are not 0: mol/L, and Pa */
export const CONCENTRATION_RANGES = { molar: [1e-15, 1e3], pressure: [1e-9, 1e9] } as const;
/** so that 0.001 pM passes as 1e-15 M in spite of rounding; relative */
export const RANGE_ROUNDING = 1e-12;

/** Whether a concentration in `unit` is 0 or of a size that a document may state. */
export function concentrationInRange(value: number, unit: ConcentrationUnit): boolean {
  if (value === 0) return true;
  const [lowest, highest] = CONCENTRATION_RANGES[concentrationKind(unit)];
  const size = value * baseUnitsPer(unit);
  return size >= lowest * (1 - RANGE_ROUNDING) && size <= highest * (1 + RANGE_ROUNDING);
}

/** Whether a dissociation constant is of a size that a document may state. */
export function constantInRange({ value, unit }: ConstantStatement): boolean {
  return value > 0 && concentrationInRange(value, unit);
}

/** Whether a gap and its uncertainty are of a size that a document may state. */
export function gapInRange(gap: GapStatement, temperatureKelvin: number): boolean {
  if (!Number.isFinite(gap.value) || (gap.unit === 'ratio' && gap.value <= 0)) return false;
  if (Math.abs(gap.value) > LARGEST_NUMBER || (gap.u ?? 0) > LARGEST_NUMBER) return false;
  const { valueKT, uKT } = gapToKT(gap, temperatureKelvin);
  return Math.abs(valueKT) <= LARGEST_KT && uKT <= (gap.unit === 'ratio' ? LARGEST_RELATIVE_U : LARGEST_KT);
}
