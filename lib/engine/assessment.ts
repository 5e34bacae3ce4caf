/**
 * What the engine says of a dataset: plain objects with the names of the API. Energies in kT,
 * concentrations in the ligand's own unit, null where a quantity does not exist (the reason stands in
 * `notes`).
 */
import type { ParameterOrigin } from './inputs';
import type { ConcentrationUnit, EnergyUnit } from './units';

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
  | 'linear-uncertainty'
  | 'shape-not-tried'
  | 'no-degrees-of-freedom'
  | 'normalisation'
  | 'protein-concentration-not-stated'
  | 'uncertainty-too-wide';

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

/** One-step alternatives to the stated parameters, and two pairs of them. */
export type ShapeKind = 'offset' | 'slope' | 'ceiling' | 'floor' | 'stock' | 'offset+slope' | 'floor+ceiling';

/** offset in kT; slope, ceiling (A), floor (B) and stock (α) are plain numbers. */
export type ShapeEstimateName = 'offset' | 'slope' | 'ceiling' | 'floor' | 'stock';

export interface ShapeEstimate extends Estimate {
  name: ShapeEstimateName;
}

export interface ShapeAlternative {
  kind: ShapeKind;
  estimates: ShapeEstimate[];
  /** AIC of the alternative less that of the stated parameters: negative favours the alternative */
  deltaAIC: number;
}

export interface Shape {
  /** the alternative that is named, `none` where no AIC is at least 8 below that of the stated parameters */
  best: ShapeKind | 'none';
  /** the offset that the stated uncertainties alone would allow: mean of √(gᵀVg), kT */
  allowedByStatements: number;
  /** those that the series has points enough for, lowest AIC first */
  alternatives: ShapeAlternative[];
}

/** A discrete misreading of what the laboratory stated. */
export type Misreading =
  | { misreading: 'gap-orientation' }
  | { misreading: 'gap-scope' }
  | { misreading: 'swapped-constants' }
  | { misreading: 'inverted-activity' }
  /** `factor`: what the stated concentrations must be multiplied by */
  | { misreading: 'concentration-scale'; factor: number }
  /** `unit`: what the gap's number is in */
  | { misreading: 'gap-unit'; unit: EnergyUnit }
  | { misreading: 'association-constants' }
  /** `base`: whether the number of the ratio is its common or its natural logarithm */
  | { misreading: 'log-ratio'; base: '10' | 'e' };

/** A misreading that explains a series, with what it brings the residuals to. */
export type ConventionFinding = Misreading & {
  rmsZ: number;
  /** Σz² with the misreading less Σz² as stated */
  deltaSumZ2: number;
};

export interface SeriesAssessment extends QStatistic {
  id: string;
  origin: ParameterOrigin;
  temperatureK: number;
  /** g0 + Σ n_s g_s, kT */
  gapKT: number;
  /** Σ n_s */
  sites: number;
  derived: DerivedQuantities[];
  shape: Shape;
  /** best first */
  conventions: ConventionFinding[];
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
  /** misreadings that every series shows, best first */
  conventions: ConventionFinding[];
}

export interface Assessment {
  engine: string;
  policy: number;
  summary: AssessmentSummary;
  series: SeriesAssessment[];
}
