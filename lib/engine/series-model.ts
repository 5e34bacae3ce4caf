/**
 * A series' statements as the numbers that the equations need: everything in kT and in the ligands' own
 * units, in typed arrays, made once a series.
 */
import { energyStatementToKT, gapToKT, inverseConstant, temperatureOf } from './convert-statements';
import type { DatasetInput, SeriesInput } from './inputs';
import { type QuantityTable, uncertainQuantities } from './uncertain-quantities';

export interface SeriesModel extends QuantityTable {
  temperatureKelvin: number;
  classCount: number;
  ligandCount: number;
  /** n_s */
  sites: Float64Array;
  /** g_s, kT */
  gapPerSite: Float64Array;
  /** 1/K_I and 1/K_A, class × ligand, in the reciprocal of the ligand's unit; 0: does not bind */
  inverseInactive: Float64Array;
  inverseActive: Float64Array;
  /** g0 + Σ n_s g_s, kT */
  gapKT: number;
  /** the part of `gapKT` that was stated in kJ/mol, kcal/mol or meV */
  thermalGapKT: number;
  modulators: string[];
  /** x_m,ref */
  references: Float64Array;
  /** b_m, kT per unit of the modulator */
  slopes: Float64Array;
  /** b_m where stated in kJ/mol, kcal/mol or meV, else 0 */
  thermalSlopes: Float64Array;
  /** relative standard uncertainty of dispensing, by ligand */
  relativeU: Float64Array;
}

/**
 * Builds the model of a series.
 *
 * @param dataset a valid dataset
 * @param series one of its series
 */
export function buildSeriesModel(dataset: DatasetInput, series: SeriesInput): SeriesModel {
  const temperatureKelvin = temperatureOf(series.temperature ?? dataset.temperature);
  const ligandIndex = new Map(dataset.ligands.map((ligand, index) => [ligand.id, index]));
  const constants = bindingConstants(dataset, series, ligandIndex);
  return {
    temperatureKelvin,
    classCount: series.parameters.siteClasses.length,
    ligandCount: dataset.ligands.length,
    ...constants,
    ...gaps(series, temperatureKelvin),
    ...modulation(series, temperatureKelvin),
    relativeU: Float64Array.from(dataset.ligands, (ligand) => ligand.relativeU ?? 0),
    ...uncertainQuantities(dataset, series, temperatureKelvin, ligandIndex),
  };
}

function bindingConstants(
  dataset: DatasetInput,
  series: SeriesInput,
  ligandIndex: ReadonlyMap<string, number>,
): Pick<SeriesModel, 'inverseInactive' | 'inverseActive'> {
  const { siteClasses } = series.parameters;
  const ligandCount = dataset.ligands.length;
  const inverseInactive = new Float64Array(siteClasses.length * ligandCount);
  const inverseActive = new Float64Array(siteClasses.length * ligandCount);
  siteClasses.forEach((siteClass, s) => {
    for (const binding of siteClass.binding) {
      const l = ligandIndex.get(binding.ligand) ?? 0;
      inverseInactive[s * ligandCount + l] = inverseConstant(binding.inactive, dataset.ligands[l].unit);
      inverseActive[s * ligandCount + l] = inverseConstant(binding.active, dataset.ligands[l].unit);
    }
  });
  return { inverseInactive, inverseActive };
}

function gaps(
  series: SeriesInput,
  temperatureKelvin: number,
): Pick<SeriesModel, 'sites' | 'gapPerSite' | 'gapKT' | 'thermalGapKT'> {
  const { gap, siteClasses } = series.parameters;
  const sites = Float64Array.from(siteClasses, (siteClass) => siteClass.sites.value);
  const gapPerSite = new Float64Array(siteClasses.length);
  let gapKT = 0;
  let thermalGapKT = 0;
  if (gap) {
    const whole = gapToKT(gap, temperatureKelvin);
    gapKT = whole.valueKT;
    if (whole.dependsOnTemperature) thermalGapKT = whole.valueKT;
  }
  siteClasses.forEach((siteClass, s) => {
    if (!siteClass.gapPerSite) return;
    const perSite = gapToKT(siteClass.gapPerSite, temperatureKelvin);
    gapPerSite[s] = perSite.valueKT;
    gapKT += sites[s] * perSite.valueKT;
    if (perSite.dependsOnTemperature) thermalGapKT += sites[s] * perSite.valueKT;
  });
  return { sites, gapPerSite, gapKT, thermalGapKT };
}

function modulation(
  series: SeriesInput,
  temperatureKelvin: number,
): Pick<SeriesModel, 'modulators' | 'references' | 'slopes' | 'thermalSlopes'> {
  const entries = series.parameters.modulation ?? [];
  const converted = entries.map((entry) => energyStatementToKT(entry.slope, temperatureKelvin));
  return {
    modulators: entries.map((entry) => entry.modulator),
    references: Float64Array.from(entries, (entry) => entry.reference),
    slopes: Float64Array.from(converted, (slope) => slope.valueKT),
    thermalSlopes: Float64Array.from(converted, (slope) => (slope.dependsOnTemperature ? slope.valueKT : 0)),
  };
}
