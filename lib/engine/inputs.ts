/**
 * What the engine reads of a dataset document: the numbers and their conventions, nothing else. A valid
 * document of `schemas/dataset-1.schema.json` fits these types as it stands. The engine trusts what it is
 * given: schema and meaning are checked once, at the border (`lib/documents`).
 */
import type {
  ConcentrationUnit,
  EnergyOrientation,
  EnergyUnit,
  RatioOrientation,
  TemperatureUnit,
} from './units';

/** Where the parameters of a series come from. `fitted-here`: from the very points that it shows. */
export type ParameterOrigin = 'independent' | 'fitted-elsewhere' | 'fitted-here';

export interface TemperatureStatement {
  value: number;
  unit: TemperatureUnit;
  /** standard uncertainty, K; 0 where left out */
  u?: number;
  sharedAs?: string;
}

/** An energy gap, or the change of one per unit of a modulator. */
export interface EnergyStatement {
  value: number;
  unit: EnergyUnit;
  orientation: EnergyOrientation;
  /** standard uncertainty in `unit`; 0 where left out */
  u?: number;
  sharedAs?: string;
}

/** An energy gap stated as an equilibrium constant between the two states. */
export interface RatioStatement {
  /** > 0 */
  value: number;
  unit: 'ratio';
  orientation: RatioOrientation;
  u?: number;
  sharedAs?: string;
}

export type GapStatement = EnergyStatement | RatioStatement;

export interface ConstantStatement {
  /** dissociation constant, > 0 */
  value: number;
  unit: ConcentrationUnit;
  u?: number;
  sharedAs?: string;
}

export interface SitesStatement {
  /** number of identical sites, (0, 1000], not necessarily an integer */
  value: number;
  u?: number;
  sharedAs?: string;
}

export interface BindingInput {
  ligand: string;
  /** null: does not bind the inactive state */
  inactive: ConstantStatement | null;
  /** null: does not bind the active state */
  active: ConstantStatement | null;
}

export interface SiteClassInput {
  id: string;
  sites: SitesStatement;
  gapPerSite?: GapStatement;
  binding: BindingInput[];
}

export interface ModulationInput {
  modulator: string;
  slope: EnergyStatement;
  /** the modulator's value at which the gap was stated */
  reference: number;
}

export interface CorrelationInput {
  a: string;
  b: string;
  r: number;
}

export interface ParametersInput {
  origin: ParameterOrigin;
  /** number of parameters fitted to these points; only with `fitted-here` */
  fittedCount?: number;
  gap?: GapStatement;
  siteClasses: SiteClassInput[];
  modulation?: ModulationInput[];
  correlations?: CorrelationInput[];
}

export interface PointInput {
  /** by ligand id, in the ligand's unit, ≥ 0; a ligand left out is 0 */
  ligands: Record<string, number>;
  /** by modulator id; one left out stands at its reference */
  modulators?: Record<string, number>;
  activity?: number;
  u?: number;
  replicates?: number[];
}

export interface SeriesInput {
  id: string;
  temperature?: TemperatureStatement;
  parameters: ParametersInput;
  points: PointInput[];
}

export interface LigandInput {
  id: string;
  /** what notes call it; the id where left out */
  name?: string;
  unit: ConcentrationUnit;
  concentration: 'free' | 'total';
  /** relative standard uncertainty of dispensing, independent from point to point */
  relativeU?: number;
  /** relative standard uncertainty of the stock, common to the whole dataset */
  stockRelativeU?: number;
}

export interface DatasetInput {
  temperature: TemperatureStatement;
  ligands: LigandInput[];
  modulators?: { id: string }[];
  assay?: { proteinConcentration?: { value: number; unit: ConcentrationUnit } };
  normalisation: { method: 'absolute' | 'two-reference' | 'series-min-max' };
  series: SeriesInput[];
}
