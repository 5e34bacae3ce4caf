/**
 * Types of a dataset document. Generated from dataset-1.schema.json: change that, then run
 * `npx tsx schemas/generate-types.ts`.
 */

/**
 * Unit of an amount concentration.
 */
export type MolarUnit = 'M' | 'mM' | 'uM' | 'nM' | 'pM';
/**
 * Quantities of different series that are one and the same carry the same label; equal labels carry equal statements.
 */
export type SharedLabel = string;
/**
 * A short name that other parts of the document refer to: letters, digits, dot, underscore and hyphen, beginning with a letter or digit.
 */
export type Id = string;
/**
 * Unit of a concentration, or of a partial pressure.
 */
export type ConcentrationUnit = 'M' | 'mM' | 'uM' | 'nM' | 'pM' | 'Pa' | 'kPa' | 'mmHg' | 'Torr';
/**
 * An energy gap between the two states: an energy, or a ratio.
 */
export type Gap = RatioStatement | EnergyStatement;
/**
 * A dissociation constant, or null where the ligand does not bind this state.
 */
export type ConstantOrNull = null | Constant;
/**
 * gap, <class>/sites, <class>/gapPerSite, <class>/<ligand>/inactive, <class>/<ligand>/active or <modulator>/slope.
 */
export type QuantityName = string;
/**
 * A measured activity (no unit): 0 is inactive, 1 is active; noise may take it from -0.5 to 1.5.
 */
export type Activity = number;

/**
 * Measured activities of an allosteric protein against ligand concentration, with the two-state parameters that the laboratory states for them. Beyond this schema the server checks meaning: ids are unique, references resolve, units are of one kind, ranges hold after conversion.
 */
export interface DatasetDocument {
  /**
   * Name and version of this format.
   */
  format: 'curvekeep-dataset/1';
  /**
   * Title of the dataset.
   */
  title: string;
  /**
   * What was measured and why, in a paragraph.
   */
  abstract: string;
  /**
   * SPDX identifier of the licence.
   */
  licence: 'CC0-1.0' | 'CC-BY-4.0';
  /**
   * Slug of the protein–ligand system: lower-case letters and digits in groups joined by hyphens.
   */
  system: string;
  /**
   * The people who contributed, in the order in which they are cited.
   *
   * @maxItems 500
   */
  contributors: Contributor[];
  /**
   * Who paid for the work.
   *
   * @maxItems 100
   */
  funding?: Funding[];
  /**
   * Other works that this dataset relates to.
   *
   * @maxItems 500
   */
  related?: Related[];
  /**
   * How the activity was measured.
   */
  assay: {
    /**
     * What was read out.
     */
    readout: string;
    /**
     * Buffer, pH, salts and whatever else matters.
     */
    conditions: string;
    /**
     * Concentration of the protein, so that depletion can be judged where a ligand's concentration is total.
     */
    proteinConcentration?: {
      /**
       * The concentration, in the unit stated beside it, greater than 0.
       */
      value: number;
      unit: MolarUnit;
    };
  };
  temperature: Temperature;
  /**
   * The ligands of the dataset.
   *
   * @maxItems 50
   */
  ligands: Ligand[];
  /**
   * The modulators of the dataset.
   *
   * @maxItems 50
   */
  modulators?: Modulator[];
  /**
   * How activities were scaled to 0 and 1.
   */
  normalisation: {
    /**
     * absolute: not scaled; two-reference: to a stated 0 and 1; series-min-max: each series to its own smallest and largest.
     */
    method: 'absolute' | 'two-reference' | 'series-min-max';
    /**
     * What 0 and 1 stand for.
     */
    note?: string;
  };
  /**
   * The activity curves, 1 to 200.
   *
   * @minItems 1
   * @maxItems 200
   */
  series: Series[];
}
/**
 * A person who contributed.
 */
export interface Contributor {
  /**
   * The contributor's name.
   */
  name: string;
  /**
   * ORCID iD: four groups of four digits, the last character a check character (ISO 7064 MOD 11-2).
   */
  orcid?: string;
  /**
   * What the contributor did, in CRediT terms (ANSI/NISO Z39.104).
   *
   * @maxItems 50
   *
   * Items: A CRediT role.
   */
  roles: (
    | 'Conceptualization'
    | 'Data curation'
    | 'Formal analysis'
    | 'Funding acquisition'
    | 'Investigation'
    | 'Methodology'
    | 'Project administration'
    | 'Resources'
    | 'Software'
    | 'Supervision'
    | 'Validation'
    | 'Visualization'
    | 'Writing – original draft'
    | 'Writing – review & editing'
  )[];
}
/**
 * A grant or another source of money.
 */
export interface Funding {
  /**
   * The funder's name.
   */
  funder: string;
  /**
   * Number or name of the award.
   */
  award?: string;
}
/**
 * Another work that this dataset relates to.
 */
export interface Related {
  /**
   * A DOI such as 10.5072/example, or an https address.
   */
  identifier: string;
  /**
   * How this dataset relates to that work, as a DataCite relation type (metadata schema 4.7).
   */
  relation:
    | 'IsCitedBy'
    | 'Cites'
    | 'IsSupplementTo'
    | 'IsSupplementedBy'
    | 'IsContinuedBy'
    | 'Continues'
    | 'Describes'
    | 'IsDescribedBy'
    | 'HasMetadata'
    | 'IsMetadataFor'
    | 'HasVersion'
    | 'IsVersionOf'
    | 'IsNewVersionOf'
    | 'IsPreviousVersionOf'
    | 'IsPartOf'
    | 'HasPart'
    | 'IsPublishedIn'
    | 'IsReferencedBy'
    | 'References'
    | 'IsDocumentedBy'
    | 'Documents'
    | 'IsCompiledBy'
    | 'Compiles'
    | 'IsVariantFormOf'
    | 'IsOriginalFormOf'
    | 'IsIdenticalTo'
    | 'IsReviewedBy'
    | 'Reviews'
    | 'IsDerivedFrom'
    | 'IsSourceOf'
    | 'IsRequiredBy'
    | 'Requires'
    | 'Obsoletes'
    | 'IsObsoletedBy'
    | 'Collects'
    | 'IsCollectedBy'
    | 'IsTranslationOf'
    | 'HasTranslation'
    | 'Other';
}
/**
 * A temperature between 200 and 450 K.
 */
export interface Temperature {
  /**
   * The temperature, in the unit stated beside it.
   */
  value: number;
  /**
   * Kelvin, or degrees Celsius.
   */
  unit: 'K' | 'degC';
  /**
   * Standard uncertainty (k = 1), in kelvin; 0 where left out.
   */
  u?: number;
  sharedAs?: SharedLabel;
}
/**
 * A ligand of the dataset.
 */
export interface Ligand {
  id: Id;
  /**
   * The ligand's name.
   */
  name: string;
  unit: ConcentrationUnit;
  /**
   * Whether the points give the free concentration or the total one.
   */
  concentration: 'free' | 'total';
  /**
   * Relative standard uncertainty of dispensing, independent from point to point; 0 where left out.
   */
  relativeU?: number;
  /**
   * Relative standard uncertainty of the stock, common to the whole dataset; 0 where left out.
   */
  stockRelativeU?: number;
}
/**
 * Something other than a ligand that shifts the gap, such as membrane potential.
 */
export interface Modulator {
  id: Id;
  /**
   * The modulator's name.
   */
  name: string;
  /**
   * Unit in which the points give this modulator; 1 where it has none.
   */
  unit: string;
}
/**
 * One activity curve: one variant under one condition, with its stated parameters.
 */
export interface Series {
  id: Id;
  /**
   * The series' name as readers see it.
   */
  label: string;
  /**
   * The protein variant.
   */
  variant: string;
  temperature?: Temperature;
  parameters: Parameters;
  /**
   * The measured points; at least 1, at most 20,000 in the whole dataset.
   *
   * @maxItems 20000
   */
  points: Point[];
}
/**
 * The parameters that the laboratory states for a series.
 */
export interface Parameters {
  /**
   * Where the parameters come from: independent of any fit to response curves, fitted to other data, or fitted to the very points shown here.
   */
  origin: 'independent' | 'fitted-elsewhere' | 'fitted-here';
  /**
   * How many parameters were fitted to these points; with origin fitted-here only.
   */
  fittedCount?: number;
  gap?: Gap;
  /**
   * The classes of binding sites.
   *
   * @maxItems 50
   */
  siteClasses: SiteClass[];
  /**
   * What the modulators do to the gap.
   *
   * @maxItems 50
   */
  modulation?: Modulation[];
  /**
   * Correlations between stated quantities; 0 where left out.
   *
   * @maxItems 500
   */
  correlations?: Correlation[];
}
/**
 * An energy gap stated as the equilibrium constant between the two states.
 */
export interface RatioStatement {
  /**
   * The ratio of the two states' populations without ligand (no unit), greater than 0.
   */
  value: number;
  /**
   * Always ratio.
   */
  unit: 'ratio';
  /**
   * Which state's population is divided by which.
   */
  orientation: 'inactive-over-active' | 'active-over-inactive';
  /**
   * Standard uncertainty (k = 1) of the ratio; 0 where left out.
   */
  u?: number;
  sharedAs?: SharedLabel;
}
/**
 * An energy, with the unit and the orientation in which it is meant.
 */
export interface EnergyStatement {
  /**
   * The energy, in the unit stated beside it; at most 200 kT either way.
   */
  value: number;
  /**
   * Unit of the energy.
   */
  unit: 'kT' | 'kJ/mol' | 'kcal/mol' | 'meV';
  /**
   * Which state's energy is subtracted from which.
   */
  orientation: 'inactive-minus-active' | 'active-minus-inactive';
  /**
   * Standard uncertainty (k = 1), in the unit of the value; 0 where left out.
   */
  u?: number;
  sharedAs?: SharedLabel;
}
/**
 * A class of identical, independent sites.
 */
export interface SiteClass {
  id: Id;
  sites: Sites;
  gapPerSite?: Gap;
  /**
   * One entry for each ligand that binds this class.
   *
   * @maxItems 50
   */
  binding: Binding[];
}
/**
 * The number of identical, independent sites of a class.
 */
export interface Sites {
  /**
   * The number of sites (no unit), greater than 0 and at most 1000; need not be an integer.
   */
  value: number;
  /**
   * Standard uncertainty (k = 1) of the number; 0 where left out.
   */
  u?: number;
  sharedAs?: SharedLabel;
}
/**
 * How one ligand binds the sites of a class in the two states. Ligands of one class compete for the same site.
 */
export interface Binding {
  ligand: Id;
  inactive: ConstantOrNull;
  active: ConstantOrNull;
}
/**
 * A dissociation constant.
 */
export interface Constant {
  /**
   * The dissociation constant, in the unit stated beside it; between 1e-15 and 1e3 M, or 1e-9 and 1e9 Pa.
   */
  value: number;
  unit: ConcentrationUnit;
  /**
   * Standard uncertainty (k = 1), in the unit of the value; 0 where left out.
   */
  u?: number;
  sharedAs?: SharedLabel;
}
/**
 * What one modulator does to the energy gap: slope times (value less reference).
 */
export interface Modulation {
  modulator: Id;
  slope: EnergyStatement;
  /**
   * The modulator's value at which the gap was stated, in the modulator's unit.
   */
  reference: number;
}
/**
 * The correlation between two stated quantities of the series, as they are stated.
 */
export interface Correlation {
  a: QuantityName;
  b: QuantityName;
  /**
   * Correlation coefficient, from -1 to 1.
   */
  r: number;
}
/**
 * One measured activity at one set of concentrations.
 */
export interface Point {
  /**
   * Concentration of each ligand by its id, in the ligand's own unit, 0 or more; a ligand left out is 0.
   */
  ligands: {
    /**
     * A concentration in the ligand's own unit, 0 or more.
     */
    [k: string]: number;
  };
  /**
   * Value of each modulator by its id, in the modulator's own unit; one left out stands at its reference.
   */
  modulators?: {
    /**
     * The modulator's value in its own unit.
     */
    [k: string]: number;
  };
  activity?: Activity;
  /**
   * Standard uncertainty (k = 1) of the activity, greater than 0.
   */
  u?: number;
  /**
   * Repeated measurements of the activity, two or more, in place of activity.
   *
   * @minItems 2
   * @maxItems 200
   */
  replicates?: Activity[];
}
