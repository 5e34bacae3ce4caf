/**
 * The two-state model in the plainest arithmetic, to make the scenario's measurements with. It shares no code with
 * the engine on purpose: were a formula wrong in one of the two, the demonstration would not collapse.
 */
import type { Gap, Parameters, Temperature } from '@/schemas/dataset-1.generated';

/** Units of concentration and pressure in mol/L and Pa. */
const BASE: Record<string, number> = {
  ...{ M: 1, mM: 1e-3, uM: 1e-6, nM: 1e-9, pM: 1e-12 },
  ...{ Pa: 1, kPa: 1e3, mmHg: 133.322387415, Torr: 101325 / 760 },
};

/** kT per unit of energy at a temperature: 1/(R T) and 1/(k_B T). */
function kTPer(unit: string, kelvin: number): number {
  const perKilojoule = 1000 / (8.31446261815324 * kelvin);
  if (unit === 'kJ/mol') return perKilojoule;
  if (unit === 'kcal/mol') return 4.184 * perKilojoule;
  return unit === 'meV' ? 1 / (0.08617333262 * kelvin) : 1;
}

export function kelvinOf({ value, unit }: Temperature): number {
  return unit === 'K' ? value : value + 273.15;
}

/** A stated gap, inactive less active, in kT. */
export function gapKT({ value, unit, orientation }: Gap, kelvin: number): number {
  if (unit === 'ratio') return (orientation === 'inactive-over-active' ? -1 : 1) * Math.log(value);
  return (orientation === 'inactive-minus-active' ? 1 : -1) * value * kTPer(unit, kelvin);
}

export interface Surroundings {
  kelvin: number;
  /** by ligand id, in the ligand's unit */
  ligands: Record<string, number>;
  /** unit of each ligand by its id */
  units: Record<string, string>;
  modulators: Record<string, number>;
}

/** The energy of a complex with these parameters in these surroundings, kT. */
export function trueEnergy(parameters: Parameters, surroundings: Surroundings): number {
  const { kelvin, modulators } = surroundings;
  let energy = parameters.gap === undefined ? 0 : gapKT(parameters.gap, kelvin);
  for (const { sites, gapPerSite, binding } of parameters.siteClasses) {
    let [inactive, active] = [1, 1];
    for (const entry of binding) {
      const concentration =
        (surroundings.ligands[entry.ligand] ?? 0) * BASE[surroundings.units[entry.ligand]];
      if (entry.inactive) inactive += concentration / (entry.inactive.value * BASE[entry.inactive.unit]);
      if (entry.active) active += concentration / (entry.active.value * BASE[entry.active.unit]);
    }
    const gap = gapPerSite === undefined ? 0 : gapKT(gapPerSite, kelvin);
    energy += sites.value * (gap - Math.log(inactive / active));
  }
  for (const { modulator, slope, reference } of parameters.modulation ?? [])
    energy += gapKT(slope, kelvin) * ((modulators[modulator] ?? reference) - reference);
  return energy;
}

/** Expected activity at an energy, kT. */
export function trueActivity(energy: number): number {
  return 1 / (1 + Math.exp(-energy));
}
