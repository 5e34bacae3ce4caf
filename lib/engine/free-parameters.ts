/**
 * Which numbers a refit may change: the parameters that somebody frees, resolved to single values, each with the
 * places in the series that it stands for. A value is fitted as a variable in which its sign holds: ln K (of the
 * ligand's unit), ln n, and g and b in kT.
 */
import { energyStatementToKT, gapToKT, temperatureOf } from './convert-statements';
import type { ConstantStatement, DatasetInput, SeriesInput } from './inputs';
import { CONCENTRATION_RANGES, LARGEST_KT, LARGEST_NUMBER } from './stated-ranges';
import { baseUnitsPer, type ConcentrationUnit, concentrationKind } from './units';

/** How many values a refit fits at most. */
export const MOST_FREE_VALUES = 40;

export const FREE_PARAMETERS = ['gap', 'gapPerSite', 'sites', 'inactive', 'active', 'slope'] as const;

export type FreeParameterKind = (typeof FREE_PARAMETERS)[number];

/** A parameter that is freed: one value per series, or one for the whole dataset. */
export interface FreeParameter {
  parameter: FreeParameterKind;
  /** of `gapPerSite`, `sites`, `inactive` and `active` */
  siteClass?: string;
  /** of `inactive` and `active` */
  ligand?: string;
  /** of `slope` */
  modulator?: string;
  share: 'series' | 'dataset';
}

/** Where a parameter stands in one series. */
export interface FreePlace {
  seriesIndex: number;
  /** index of the site class, or of the modulation entry, or 0 */
  place: number;
  /** index of the ligand in the dataset, or 0 */
  ligand: number;
  /** the value as stated: K in `unit`, n, or kT */
  stated: number;
  unit: ConcentrationUnit | 'kT' | null;
}

/** One number to be fitted. */
export interface FreeValue {
  parameter: FreeParameter;
  /** id of its series; null where one value stands for all */
  series: string | null;
  places: FreePlace[];
  /** that of its first place */
  unit: FreePlace['unit'];
  /** the value that the fit starts from, in `unit`: as stated, or the mean (of K and n the geometric) of what is stated */
  stated: number;
  /** whether it is fitted as a logarithm */
  logarithmic: boolean;
  /** what the value in `unit` is multiplied by to stand in the ligand's unit; 1 for all but constants */
  factor: number;
  /** the same bounds as for a document, in the variable that is fitted */
  lower: number;
  upper: number;
  /** by how much the variable may change in one step, and beyond which standard error it is not determined */
  step: number;
}

/** a document may state any number above 0; below this the sites would do nothing */
const SITES_RANGE = [1e-6, 1000] as const;

/** How many values `free` comes to in a dataset. */
export function countFreeValues(dataset: DatasetInput, free: readonly FreeParameter[]): number {
  return free.reduce((count, parameter) => {
    const places = placesOf(dataset, parameter).length;
    return count + (parameter.share === 'series' ? places : Math.min(1, places));
  }, 0);
}

/** The places of a freed parameter, at most one a series, in the order of the series; none where no series has it. */
export function placesOf(dataset: DatasetInput, parameter: FreeParameter): FreePlace[] {
  return dataset.series.flatMap((series, seriesIndex) => {
    const found = placeIn(dataset, series, parameter);
    return found === null ? [] : [{ seriesIndex, ...found }];
  });
}

/** The values to fit, in the order of `free` and within it of the series. */
export function freeValues(dataset: DatasetInput, free: readonly FreeParameter[]): FreeValue[] {
  return free.flatMap((parameter) => {
    const places = placesOf(dataset, parameter);
    if (places.length === 0) return [];
    if (parameter.share === 'dataset') return [freeValueOf(dataset, parameter, places, null)];
    return places.map((place) =>
      freeValueOf(dataset, parameter, [place], dataset.series[place.seriesIndex].id),
    );
  });
}

type Found = Omit<FreePlace, 'seriesIndex'>;

function placeIn(dataset: DatasetInput, series: SeriesInput, parameter: FreeParameter): Found | null {
  const kelvin = temperatureOf(series.temperature ?? dataset.temperature);
  const { gap, modulation = [] } = series.parameters;
  if (parameter.parameter === 'gap')
    return gap ? { place: 0, ligand: 0, stated: gapToKT(gap, kelvin).valueKT, unit: 'kT' } : null;
  if (parameter.parameter !== 'slope') return placeInClass(dataset, series, parameter, kelvin);
  const place = modulation.findIndex(({ modulator }) => modulator === parameter.modulator);
  if (place < 0) return null;
  return {
    place,
    ligand: 0,
    stated: energyStatementToKT(modulation[place].slope, kelvin).valueKT,
    unit: 'kT',
  };
}

function placeInClass(
  dataset: DatasetInput,
  series: SeriesInput,
  { parameter, siteClass, ligand }: FreeParameter,
  kelvin: number,
): Found | null {
  const place = series.parameters.siteClasses.findIndex(({ id }) => id === siteClass);
  if (place < 0) return null;
  const { sites, gapPerSite, binding } = series.parameters.siteClasses[place];
  if (parameter === 'sites') return { place, ligand: 0, stated: sites.value, unit: null };
  if (parameter === 'gapPerSite')
    return gapPerSite ? { place, ligand: 0, stated: gapToKT(gapPerSite, kelvin).valueKT, unit: 'kT' } : null;
  const bound = binding.find((one) => one.ligand === ligand);
  const constant: ConstantStatement | null =
    bound === undefined ? null : parameter === 'inactive' ? bound.inactive : bound.active;
  if (constant === null) return null;
  const index = dataset.ligands.findIndex(({ id }) => id === ligand);
  return { place, ligand: index, stated: constant.value, unit: constant.unit };
}

function freeValueOf(
  dataset: DatasetInput,
  parameter: FreeParameter,
  places: FreePlace[],
  series: string | null,
): FreeValue {
  const [{ unit }] = places;
  const base = { parameter, series, places, unit, factor: 1, step: 1 };
  switch (parameter.parameter) {
    case 'inactive':
    case 'active':
      return { ...base, ...constantOf(dataset, places) };
    case 'sites': {
      const [lower, upper] = SITES_RANGE.map(Math.log);
      return {
        ...base,
        stated: meanOf(
          places.map(({ stated }) => stated),
          true,
        ),
        logarithmic: true,
        lower,
        upper,
      };
    }
    default: {
      const step = parameter.parameter === 'slope' ? 1 / spanOf(dataset, places) : 1;
      const stated = meanOf(
        places.map(({ stated }) => stated),
        false,
      );
      return {
        ...base,
        step,
        stated,
        logarithmic: false,
        lower: -LARGEST_KT * step,
        upper: LARGEST_KT * step,
      };
    }
  }
}

function constantOf(
  dataset: DatasetInput,
  places: readonly FreePlace[],
): Pick<FreeValue, 'stated' | 'logarithmic' | 'factor' | 'lower' | 'upper'> {
  const ligandUnit = dataset.ligands[places[0].ligand].unit;
  const sizeOf = (place: FreePlace) => baseUnitsPer(place.unit as ConcentrationUnit);
  const inFirstUnit = places.map((place) =>
    place.unit === places[0].unit ? place.stated : (place.stated * sizeOf(place)) / sizeOf(places[0]),
  );
  const [lower, upper] = CONCENTRATION_RANGES[concentrationKind(ligandUnit)].map((limit) =>
    Math.log(limit / baseUnitsPer(ligandUnit)),
  );
  const factor = places[0].unit === ligandUnit ? 1 : sizeOf(places[0]) / baseUnitsPer(ligandUnit);
  return { stated: meanOf(inFirstUnit, true), logarithmic: true, factor, lower, upper };
}

/** The mean, or the geometric one; a number that all agree on as it stands, without rounding. */
function meanOf(values: readonly number[], geometric: boolean): number {
  if (values.every((value) => value === values[0])) return values[0];
  const sum = values.reduce((total, value) => total + (geometric ? Math.log(value) : value), 0);
  return geometric ? Math.exp(sum / values.length) : sum / values.length;
}

/** The largest |x_m − x_m,ref| among the points of the places, 1 where the modulator never leaves its reference. */
function spanOf(dataset: DatasetInput, places: readonly FreePlace[]): number {
  let span = 0;
  for (const { seriesIndex, place } of places) {
    const { points, parameters } = dataset.series[seriesIndex];
    const entry = parameters.modulation?.[place];
    if (!entry) continue;
    for (const { modulators } of points)
      span = Math.max(span, Math.abs((modulators?.[entry.modulator] ?? entry.reference) - entry.reference));
  }
  return span === 0 ? 1 : Math.max(span, LARGEST_KT / LARGEST_NUMBER);
}
