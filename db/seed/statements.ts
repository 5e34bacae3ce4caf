/** Short ways to write what laboratories state; every number with its unit, orientation and uncertainty. */
import type {
  ConcentrationUnit,
  Constant,
  EnergyStatement,
  Gap,
  Parameters,
  Point,
  SiteClass,
} from '@/schemas/dataset-1.generated';

type EnergyUnit = EnergyStatement['unit'];

/** An energy, inactive less active. */
export function gap(value: number, unit: EnergyUnit, u: number, sharedAs?: string): EnergyStatement {
  return { value, unit, orientation: 'inactive-minus-active', u, ...shared(sharedAs) };
}

/** The same the other way round: active less inactive. */
export function reversedGap(value: number, unit: EnergyUnit, u: number): EnergyStatement {
  return { value, unit, orientation: 'active-minus-inactive', u };
}

/** The constant L of the 1965 paper, inactive over active. */
export function ratioL(value: number, u: number): Gap {
  return { value, unit: 'ratio', orientation: 'inactive-over-active', u };
}

/** Its reciprocal, active over inactive. */
export function ratioActive(value: number, u: number): Gap {
  return { value, unit: 'ratio', orientation: 'active-over-inactive', u };
}

export function constant(value: number, unit: ConcentrationUnit, u: number, sharedAs?: string): Constant {
  return { value, unit, u, ...shared(sharedAs) };
}

/** A class of sites that binds one ligand in either state. */
export function oneLigandClass(
  sites: SiteClass['sites'],
  ligand: string,
  inactive: Constant | null,
  active: Constant | null,
  id = 'main',
): SiteClass {
  return { id, sites, binding: [{ ligand, inactive, active }] };
}

export function independent(parameters: Omit<Parameters, 'origin'>): Parameters {
  return { origin: 'independent', ...parameters };
}

/** Without ligand, then concentrations in equal ratios to three digits, as a dilution gives them. */
export function titration(ligand: string, from: number, to: number, steps: number): Pick<Point, 'ligands'>[] {
  const series = Array.from({ length: steps }, (_, step) =>
    Number((from * (to / from) ** (step / (steps - 1))).toPrecision(3)),
  );
  return [0, ...series].map((value) => ({ ligands: { [ligand]: value } }));
}

/** The same conditions with something more of each. */
export function withMore(
  conditions: Pick<Point, 'ligands' | 'modulators'>[],
  more: { ligands?: Record<string, number>; modulators?: Record<string, number> },
): Pick<Point, 'ligands' | 'modulators'>[] {
  return conditions.map(({ ligands, modulators }) => ({
    ligands: { ...ligands, ...more.ligands },
    ...(more.modulators || modulators ? { modulators: { ...modulators, ...more.modulators } } : {}),
  }));
}

function shared(sharedAs: string | undefined): { sharedAs?: string } {
  return sharedAs === undefined ? {} : { sharedAs };
}
