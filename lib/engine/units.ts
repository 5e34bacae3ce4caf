/**
 * Units in which laboratories state energies, concentrations, pressures and temperatures, and their
 * conversion. All factors are exact by definition (SI, 2019; thermochemical calorie; conventional mmHg;
 * Torr = 101325/760 Pa), so a conversion is good to one rounding.
 *
 * Source: The International System of Units (SI Brochure, 9th edition, BIPM 2019).
 */

/** Boltzmann constant, J/K. Exact. */
export const BOLTZMANN_JOULE_PER_KELVIN = 1.380649e-23;
/** Avogadro constant, 1/mol. Exact. */
export const AVOGADRO_PER_MOLE = 6.02214076e23;
/** Elementary charge, C. Exact. */
export const ELEMENTARY_CHARGE_COULOMB = 1.602176634e-19;
/** Molar gas constant k_B·N_A, J/(mol K). Exact: the product has these digits and no more. */
export const GAS_CONSTANT_JOULE_PER_MOLE_KELVIN = 8.31446261815324;
/** Zero of the Celsius scale, K. Exact. */
export const CELSIUS_ZERO_KELVIN = 273.15;

export const ENERGY_UNITS = ['kT', 'kJ/mol', 'kcal/mol', 'meV'] as const;
export const GAP_UNITS = [...ENERGY_UNITS, 'ratio'] as const;
export const MOLAR_UNITS = ['M', 'mM', 'uM', 'nM', 'pM'] as const;
export const PRESSURE_UNITS = ['Pa', 'kPa', 'mmHg', 'Torr'] as const;
export const CONCENTRATION_UNITS = [...MOLAR_UNITS, ...PRESSURE_UNITS] as const;
export const TEMPERATURE_UNITS = ['K', 'degC'] as const;
export const ENERGY_ORIENTATIONS = ['inactive-minus-active', 'active-minus-inactive'] as const;
export const RATIO_ORIENTATIONS = ['inactive-over-active', 'active-over-inactive'] as const;

export type EnergyUnit = (typeof ENERGY_UNITS)[number];
export type GapUnit = (typeof GAP_UNITS)[number];
export type ConcentrationUnit = (typeof CONCENTRATION_UNITS)[number];
export type TemperatureUnit = (typeof TEMPERATURE_UNITS)[number];
export type EnergyOrientation = (typeof ENERGY_ORIENTATIONS)[number];
export type RatioOrientation = (typeof RATIO_ORIENTATIONS)[number];
export type ConcentrationKind = 'molar' | 'pressure';

const BASE_UNITS_PER: Record<ConcentrationUnit, number> = {
  M: 1,
  mM: 1e-3,
  uM: 1e-6,
  nM: 1e-9,
  pM: 1e-12,
  Pa: 1,
  kPa: 1e3,
  mmHg: 133.322387415,
  Torr: 101325 / 760,
};

/** Whether a unit counts amount per volume or partial pressure. The two never convert into each other. */
export function concentrationKind(unit: ConcentrationUnit): ConcentrationKind {
  return (MOLAR_UNITS as readonly string[]).includes(unit) ? 'molar' : 'pressure';
}

/** Mol/L (or Pa) in one of `unit`. */
export function baseUnitsPer(unit: ConcentrationUnit): number {
  return BASE_UNITS_PER[unit];
}

/**
 * A concentration or pressure in another unit of its kind.
 *
 * @param value in `from`, ≥ 0
 * @returns the value in `to`, or null where the two units are of different kinds
 */
export function convertConcentration(
  value: number,
  from: ConcentrationUnit,
  to: ConcentrationUnit,
): number | null {
  if (concentrationKind(from) !== concentrationKind(to)) return null;
  return from === to ? value : (value * BASE_UNITS_PER[from]) / BASE_UNITS_PER[to];
}

/** Absolute temperature in K of a stated temperature. */
export function toKelvin(value: number, unit: TemperatureUnit): number {
  return unit === 'K' ? value : value + CELSIUS_ZERO_KELVIN;
}

/**
 * The size of one kT in an energy unit at a temperature.
 *
 * @param temperatureKelvin absolute temperature, K, > 0
 * @returns R·T in kJ/mol or kcal/mol, k_B·T in meV, 1 for kT
 */
export function energyPerKT(unit: EnergyUnit, temperatureKelvin: number): number {
  switch (unit) {
    case 'kT':
      return 1;
    case 'kJ/mol':
      return (GAS_CONSTANT_JOULE_PER_MOLE_KELVIN * temperatureKelvin) / 1000;
    case 'kcal/mol':
      return (GAS_CONSTANT_JOULE_PER_MOLE_KELVIN * temperatureKelvin) / 4184;
    case 'meV':
      return ((BOLTZMANN_JOULE_PER_KELVIN * temperatureKelvin) / ELEMENTARY_CHARGE_COULOMB) * 1000;
  }
}

/** An energy in `unit` at a temperature, expressed in kT. */
export function energyToKT(value: number, unit: EnergyUnit, temperatureKelvin: number): number {
  return value / energyPerKT(unit, temperatureKelvin);
}

/** An energy in kT at a temperature, expressed in `unit`. */
export function energyFromKT(valueKT: number, unit: EnergyUnit, temperatureKelvin: number): number {
  return valueKT * energyPerKT(unit, temperatureKelvin);
}
