/**
 * What the engine says of a dataset: plain objects with the names of the API. Energies in kT,
 * concentrations in the ligand's own unit, null where a quantity does not exist (the reason stands in
 * `notes`).
 */
import type { ParameterOrigin } from './inputs';
import type { ConcentrationUnit } from './units';

export type Flag = 'on-curve' | 'warning' | 'off-curve';

/** Where the uncertainty of a measured activity comes from. */
export type ActivityUncertainty = 'stated' | 'replicates' | 'assumed';

export interface Estimate {
  value: number;
  /** standard uncertainty (k = 1), in the unit of the value */
  u: number;
}

export type NoteCode =
  | 'assumed-uncertainty'
  | 'circular'
  | 'correlations-not-stated'
  | 'depletion'
  | 'derived-not-defined'
  | 'no-degrees-of-freedom';

export interface Note {
  code: NoteCode;
  detail: string;
  /** indices of the points concerned, where it concerns some */
  points?: number[];
}

export interface AssessedPoint {
  index: number;
  /** free-energy coordinate f, kT */
  energy: number;
  energyU: number;
  activity: number;
  activityU: number;
  /** p(f), the activity that the statements predict */
  expected: number;
  expectedU: number;
  residual: number;
  residualU: number;
  z: number;
  /** two-sided */
  pValue: number;
  /** Benjamini–Hochberg adjustment of `pValue` within the dataset */
  q: number;
  flag: Flag;
  uncertainty: ActivityUncertainty;
}

/** What a series looks like for one ligand alone. Concentrations in `unit`. */
export interface DerivedQuantities {
  ligand: string;
  unit: ConcentrationUnit;
  leakiness: Estimate;
  saturation: Estimate;
  dynamicRange: Estimate;
  halfActivity: Estimate | null;
  ec50: Estimate | null;
  effectiveHill: Estimate | null;
}

export interface QStatistic {
  chiSquared: number;
  degreesOfFreedom: number;
  /** upper tail; null where no points are left or where an uncertainty was assumed */
  pValue: number | null;
  rmsZ: number;
}

export interface SeriesAssessment extends QStatistic {
  id: string;
  origin: ParameterOrigin;
  temperatureK: number;
  /** g0 + Σ n_s g_s, kT */
  gapKT: number;
  /** Σ n_s */
  sites: number;
  derived: DerivedQuantities[];
  notes: Note[];
  points: AssessedPoint[];
}

export interface AssessmentSummary extends QStatistic {
  points: number;
  onCurve: number;
  warning: number;
  offCurve: number;
  /** how many points chance alone would flag */
  expectedByChance: { warning: number; offCurve: number };
}

export interface Assessment {
  engine: string;
  policy: number;
  summary: AssessmentSummary;
  series: SeriesAssessment[];
}
