/**
 * How much the alternatives of shape may cost. A covariance D + W·Wᵀ of m points and k columns is factored some
 * sixty times a series, m·k² steps each; so W is narrowed to the directions that matter, and where too many do,
 * alternatives are left out and it is said. Counts of a document alone decide, so that every machine says the same.
 */
import type { Note } from './assessment';
import type { DatasetInput } from './inputs';
import { narrowFactor } from './narrow-factor';
import type { SeriesModel } from './series-model';
import type { EnergyRows } from './shape-energies';

/** Most points × columns² over all series of a dataset, for one factoring each: about a tenth of a second. */
const MOST_WORK = 100_000_000;

/** A part of u_f below this, kT, changes no variance by a millionth of a millionth of u_0². */
const NEGLIGIBLE_KT = 1e-8;

/** How many columns a covariance may have, so that all series of the dataset stay within the work. */
export function mostShapeColumns(dataset: DatasetInput): number {
  return Math.floor(Math.sqrt(MOST_WORK / pointsOf(dataset)));
}

/**
 * Whether energies at another stock are affordable: there the gradient is computed and narrowed at every step.
 *
 * @param rank columns of the narrowed gradient as stated
 */
export function mayRestock(dataset: DatasetInput, model: SeriesModel, rank: number): boolean {
  const columns = model.sharedKeys.length;
  return pointsOf(dataset) * columns * (model.correlation === null ? rank : columns) <= MOST_WORK;
}

/** The same energies with no more columns than independent directions; null where there are more than allowed. */
export function narrowRows(rows: EnergyRows, mostColumns: number): EnergyRows | null {
  const options = { negligible: NEGLIGIBLE_KT, mostColumns };
  // Some of the points often show already that there are too many.
  const some = Math.min(rows.energy.length, 2 * mostColumns);
  if (narrowFactor(rows.gradient.subarray(0, some * rows.rank), some, rows.rank, options) === null)
    return null;
  const narrowed = narrowFactor(rows.gradient, rows.energy.length, rows.rank, options);
  return narrowed && { ...rows, gradient: narrowed.factor, rank: narrowed.rank };
}

/** The same energies, taken as certain: in a series fitted to its own points C is the diagonal alone. */
export function withoutGradient(rows: EnergyRows): EnergyRows {
  return { ...rows, gradient: new Float64Array(0), rank: 0 };
}

/** Says which alternatives were not tried. */
export function noteShapesLeftOut(which: 'all' | 'stock'): Note {
  const what =
    which === 'all'
      ? 'Other shapes of the curve were not tried'
      : 'Another stock of the ligand was not tried';
  return {
    code: 'shape-not-tried',
    detail: `${what}: the dataset has too many points and independent uncertain quantities together. Fewer uncertain quantities a series, or fewer points a dataset, make it possible.`,
  };
}

function pointsOf({ series }: DatasetInput): number {
  return series.reduce((sum, { points }) => sum + points.length, 0);
}
