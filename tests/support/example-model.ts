/**
 * The two-state model in the plainest arithmetic, and seeded noise, to make the example documents with. It
 * shares no code with the engine, so that the examples also test it.
 */

export interface TrueClass {
  sites: number;
  gapPerSiteKT?: number;
  /** by ligand: dissociation constants in the ligand's unit; null: does not bind that state */
  constants: Record<string, { inactive: number | null; active: number | null }>;
}

export interface TrueSeries {
  gapKT: number;
  classes: TrueClass[];
  /** kT per unit of the modulator, by its id; all references are 0 */
  slopesKT?: Record<string, number>;
}

/** Expected activity at given concentrations and modulator values. */
export function expectedActivity(
  truth: TrueSeries,
  ligands: Record<string, number>,
  modulators: Record<string, number> = {},
): number {
  let energy = truth.gapKT;
  for (const { sites, gapPerSiteKT = 0, constants } of truth.classes) {
    let [inactive, active] = [1, 1];
    for (const [ligand, constant] of Object.entries(constants)) {
      const concentration = ligands[ligand] ?? 0;
      if (constant.inactive !== null) inactive += concentration / constant.inactive;
      if (constant.active !== null) active += concentration / constant.active;
    }
    energy += sites * (gapPerSiteKT - Math.log(inactive / active));
  }
  for (const [id, slope] of Object.entries(truth.slopesKT ?? {})) energy += slope * (modulators[id] ?? 0);
  return 1 / (1 + Math.exp(-energy));
}

/** Normally distributed numbers, mean 0 and standard deviation 1, the same ones for the same seed. */
export function seededNormal(seed: number): () => number {
  let state = seed >>> 0;
  const uniform = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  return () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
}

/** A series of concentrations in equal ratios, as a dilution gives them, to three significant digits. */
export function dilution(from: number, to: number, count: number): number[] {
  return Array.from({ length: count }, (_, step) => significant(from * (to / from) ** (step / (count - 1))));
}

export function significant(value: number, digits = 3): number {
  return Number(value.toPrecision(digits));
}
