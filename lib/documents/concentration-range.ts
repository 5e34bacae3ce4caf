import { CONCENTRATION_RANGES, RANGE_ROUNDING } from '@/lib/engine/stated-ranges';
import {
  baseUnitsPer,
  type ConcentrationKind,
  type ConcentrationUnit,
  concentrationKind,
} from '@/lib/engine/units';

/** In words, what is taken of concentrations and dissociation constants that are not 0: mol/L, and Pa. */
const WORDS: Record<ConcentrationKind, string> = {
  molar: '1e-15 to 1e3 M',
  pressure: '1e-9 to 1e9 Pa',
};

export interface ConcentrationRange {
  lowest: number;
  highest: number;
  /** the range in M or Pa, as sentences say it */
  words: string;
}

/** The range of concentrations that are not 0, in `unit`. */
export function concentrationRange(unit: ConcentrationUnit): ConcentrationRange {
  const kind = concentrationKind(unit);
  const [lowest, highest] = CONCENTRATION_RANGES[kind];
  const size = baseUnitsPer(unit);
  return {
    lowest: (lowest / size) * (1 - RANGE_ROUNDING),
    highest: (highest / size) * (1 + RANGE_ROUNDING),
    words: WORDS[kind],
  };
}

const KIND_WORDS: Record<ConcentrationKind, string> = {
  molar: 'a concentration (M, mM, uM, nM or pM)',
  pressure: 'a partial pressure (Pa, kPa, mmHg or Torr)',
};

/** The kind of a unit in words, with the units that belong to it. */
export function sayKind(unit: ConcentrationUnit): string {
  return KIND_WORDS[concentrationKind(unit)];
}
