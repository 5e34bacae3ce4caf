/** Small datasets of one series, for tests that set a few figures and read the energy back. */
import { assess } from '@/lib/engine/assess';
import type { SeriesAssessment } from '@/lib/engine/assessment';
import type {
  BindingInput,
  DatasetInput,
  GapStatement,
  LigandInput,
  ParametersInput,
  PointInput,
  SiteClassInput,
} from '@/lib/engine/inputs';

export const LIGAND = 'velline';

/** The constant L = inactive/active of the 1965 paper as a statement. */
export function allostericConstant(value: number, u = 0): GapStatement {
  return { value, unit: 'ratio', orientation: 'inactive-over-active', u };
}

/** One class with dissociation constants in µM; null: does not bind that state. */
export function siteClass(
  sites: number,
  inactive: number | null,
  active: number | null,
  relative: { inactive?: number; active?: number; sites?: number } = {},
  id = 'main',
): SiteClassInput {
  return {
    id,
    sites: { value: sites, u: relative.sites },
    binding: [bindingOf(LIGAND, inactive, active, relative)],
  };
}

export function bindingOf(
  ligand: string,
  inactive: number | null,
  active: number | null,
  relative: { inactive?: number; active?: number } = {},
): BindingInput {
  const stated = (value: number | null, u = 0) =>
    value === null ? null : { value, unit: 'uM' as const, u: u * value };
  return { ligand, inactive: stated(inactive, relative.inactive), active: stated(active, relative.active) };
}

export function datasetOf(
  parameters: Omit<ParametersInput, 'origin'> & { origin?: ParametersInput['origin'] },
  points: PointInput[],
  overrides: { ligands?: LigandInput[]; temperatureU?: number } = {},
): DatasetInput {
  return {
    temperature: { value: 298.15, unit: 'K', u: overrides.temperatureU },
    ligands: overrides.ligands ?? [{ id: LIGAND, unit: 'uM', concentration: 'free' }],
    modulators: [{ id: 'V' }],
    normalisation: { method: 'absolute' },
    series: [{ id: 'wt', parameters: { origin: 'independent', ...parameters }, points }],
  };
}

/** Points at concentrations of the one ligand, µM, with an activity that does not matter. */
export function pointsAt(...concentrations: number[]): PointInput[] {
  return concentrations.map((c) => ({ ligands: { [LIGAND]: c }, activity: 0.5, u: 0.02 }));
}

export function assessOne(dataset: DatasetInput): SeriesAssessment {
  return assess(dataset).series[0];
}

/** Every number of an assessment, with its path, for tests that look at all of them. */
export function* numbersOf(value: unknown, path = ''): Generator<[string, number]> {
  if (typeof value === 'number') yield [path, value];
  else if (value !== null && typeof value === 'object') {
    for (const [key, inner] of Object.entries(value)) yield* numbersOf(inner, `${path}/${key}`);
  }
}
