/**
 * Statements as laboratories make them → kT. The sign tells how the coordinate f moves with the number
 * stated: +1 for inactive − active (and ln of active/inactive), −1 for the opposite.
 */
import type { ConstantStatement, EnergyStatement, GapStatement, TemperatureStatement } from './inputs';
import { baseUnitsPer, type ConcentrationUnit, energyPerKT, toKelvin } from './units';

export interface ConvertedEnergy {
  /** contribution to f, kT; positive favours the active state */
  valueKT: number;
  /** standard uncertainty, kT; ≥ 0 */
  uKT: number;
  /** sign of ∂f/∂(number as stated) */
  sign: 1 | -1;
  /** whether the conversion used the temperature (kJ/mol, kcal/mol, meV) */
  dependsOnTemperature: boolean;
}

/**
 * An energy gap in kT.
 *
 * @param temperatureKelvin of the series, 200 to 450 K
 */
export function gapToKT(gap: GapStatement, temperatureKelvin: number): ConvertedEnergy {
  if (gap.unit !== 'ratio') return energyStatementToKT(gap, temperatureKelvin);
  const sign = gap.orientation === 'active-over-inactive' ? 1 : -1;
  return {
    valueKT: sign * Math.log(gap.value),
    uKT: (gap.u ?? 0) / gap.value,
    sign,
    dependsOnTemperature: false,
  };
}

/** An energy, or an energy per unit of a modulator, in kT (per unit of the modulator). */
export function energyStatementToKT(energy: EnergyStatement, temperatureKelvin: number): ConvertedEnergy {
  const sign = energy.orientation === 'inactive-minus-active' ? 1 : -1;
  const perKT = energyPerKT(energy.unit, temperatureKelvin);
  return {
    valueKT: (sign * energy.value) / perKT,
    uKT: (energy.u ?? 0) / perKT,
    sign,
    dependsOnTemperature: energy.unit !== 'kT',
  };
}

/** 1/K in the reciprocal of the ligand's unit; 0 for a state that is not bound. */
export function inverseConstant(constant: ConstantStatement | null, ligandUnit: ConcentrationUnit): number {
  if (constant === null) return 0;
  if (constant.unit === ligandUnit) return 1 / constant.value;
  return baseUnitsPer(ligandUnit) / (constant.value * baseUnitsPer(constant.unit));
}

/** Absolute temperature of a statement, K. */
export function temperatureOf(statement: TemperatureStatement): number {
  return toKelvin(statement.value, statement.unit);
}
