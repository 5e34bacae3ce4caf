import {
  baseUnitsPer,
  type ConcentrationKind,
  type ConcentrationUnit,
  concentrationKind,
} from '@/lib/engine/units';

/** What is taken of concentrations and dissociation constants that are not 0: mol/L, and Pa. */
const RANGES: Record<ConcentrationKind, { lowest: number; highest: number; words: string }> = {
  molar: { lowest: 1e-15, highest: 1e3, words: '1e-15 to 1e3 M' },
  pressure: { lowest: 1e-9, highest: 1e9, words: '1e-9 to 1e9 Pa' },
};

/** so that 0.001 pM passes as 1e-15 M in spite of rounding; relative */
const ROUNDING = 1e-12;

export interface ConcentrationRange {
  lowest: number;
  highest: number;
  /** the range in M or Pa, as sentences say it */
  words: string;
}

/** The range of concentrations that are not 0, in `unit`. */
export function concentrationRange(unit: ConcentrationUnit): ConcentrationRange {
  const { lowest, highest, words } = RANGES[concentrationKind(unit)];
  const size = baseUnitsPer(unit);
  return { lowest: (lowest / size) * (1 - ROUNDING), highest: (highest / size) * (1 + ROUNDING), words };
}

const KIND_WORDS: Record<ConcentrationKind, string> = {
  molar: 'a concentration (M, mM, uM, nM or pM)',
  pressure: 'a partial pressure (Pa, kPa, mmHg or Torr)',
};

/** The kind of a unit in words, with the units that belong to it. */
export function sayKind(unit: ConcentrationUnit): string {
  return KIND_WORDS[concentrationKind(unit)];
}
