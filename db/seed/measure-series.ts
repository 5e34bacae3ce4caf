/** The measurement of a series: what its laboratory writes down, noise and mistakes included. */
import type { Parameters, Point, Series } from '@/schemas/dataset-1.generated';
import type { Random } from './random';
import type { Mistake, Readout, SeriesRecipe } from './recipe';
import { trueActivity } from './true-response';

/** What no two-state description is trusted beyond; the invented proteins scatter by as much. */
const MODEL_SCATTER = 0.01;
const DECIMALS = 3;

/**
 * The series as it stands in the document.
 *
 * @param energies true energy of each condition, kT
 */
export function measureSeries(recipe: SeriesRecipe, energies: number[], random: Random): Series {
  const { conditions, readout, mistake } = recipe;
  const expected = distorted(energies.map(trueActivity), mistake);
  const points = conditions.map((condition, i): Point => {
    const shift = mistake?.kind === 'bad-points' ? (mistake.shifts[i] ?? 0) : 0;
    const real = expected[i] + shift + MODEL_SCATTER * random.normal();
    return { ...written(condition, mistake), ...read(real, readout, random) };
  });
  const { id, label, variant, temperature } = recipe;
  const parameters = mistake?.kind === 'reversed-gap' ? reversed(recipe.parameters) : recipe.parameters;
  return { id, label, variant, ...(temperature ? { temperature } : {}), parameters, points };
}

function distorted(expected: number[], mistake: Mistake | undefined): number[] {
  if (mistake?.kind === 'ceiling') return expected.map((value) => value * mistake.factor);
  if (mistake?.kind !== 'own-range') return expected;
  const [lowest, highest] = [Math.min(...expected), Math.max(...expected)];
  return expected.map((value) => (value - lowest) / (highest - lowest));
}

function written(
  { ligands, modulators }: Pick<Point, 'ligands' | 'modulators'>,
  mistake: Mistake | undefined,
): Pick<Point, 'ligands' | 'modulators'> {
  const factor = mistake?.kind === 'concentration-slip' ? mistake.factor : 1;
  const entries = Object.entries(ligands).map(([id, value]) => [id, Number((value * factor).toPrecision(3))]);
  return { ligands: Object.fromEntries(entries), ...(modulators ? { modulators } : {}) };
}

function read(real: number, readout: Readout, random: Random): Partial<Point> {
  if ('replicates' in readout) {
    const readings = Array.from({ length: readout.replicates }, () =>
      rounded(real + readout.spread * random.normal()),
    );
    return { replicates: readings };
  }
  if ('unstated' in readout) return { activity: rounded(real + readout.spread * random.normal()) };
  return { activity: rounded(real + readout.u * random.normal()), u: readout.u };
}

function rounded(value: number): number {
  // A negative zero would not survive JSON.
  return Number(value.toFixed(DECIMALS)) + 0;
}

function reversed(parameters: Parameters): Parameters {
  const { gap } = parameters;
  if (gap === undefined) return parameters;
  if (gap.unit === 'ratio') {
    const other =
      gap.orientation === 'inactive-over-active' ? 'active-over-inactive' : 'inactive-over-active';
    return { ...parameters, gap: { ...gap, orientation: other } };
  }
  const other =
    gap.orientation === 'inactive-minus-active' ? 'active-minus-inactive' : 'inactive-minus-active';
  return { ...parameters, gap: { ...gap, orientation: other } };
}
