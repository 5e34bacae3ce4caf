/**
 * Whether another shape of curve would fit a series better than its statements: an offset, a slope, a ceiling,
 * a floor, a wrong stock, or one of two pairs, each fitted by generalised least squares with the full
 * covariance taken anew at the fit, and compared by
 *
 *     AIC = rᵀC⁻¹r + ln det C + 2k,   each with C at its own fit
 *
 * Source: Akaike, IEEE Trans. Autom. Control 19, 716 (1974).
 */
import type {
  Note,
  Shape,
  ShapeAlternative,
  ShapeEstimate,
  ShapeEstimateName,
  ShapeKind,
} from './assessment';
import { fitLeastSquares, type Noise } from './generalised-least-squares';
import type { DatasetInput, SeriesInput } from './inputs';
import type { ScoredSeries } from './q-statistic';
import { AS_STATED, type Bend, BentCurve } from './shape-curve';
import { type EnergyRows, meanStatedU, SeriesEnergies } from './shape-energies';
import { mayRestock, mostShapeColumns, narrowRows, noteShapesLeftOut, withoutGradient } from './shape-work';

/** An alternative is named from this much AIC below the statements on. */
const NAMED_BELOW = -8;

/** An alternative of k numbers is tried where the series has at least k + SPARE_POINTS points. */
const SPARE_POINTS = 2;

/** u of an estimate beyond which the points do not say anything of it: no fit. */
const WIDEST_U = 1000;

const ALTERNATIVES: Readonly<Record<ShapeKind, readonly ShapeEstimateName[]>> = {
  offset: ['offset'],
  slope: ['slope'],
  ceiling: ['ceiling'],
  floor: ['floor'],
  stock: ['stock'],
  'offset+slope': ['offset', 'slope'],
  'floor+ceiling': ['floor', 'ceiling'],
};

/** At another stock, gradients of so many columns are taken as they are. */
const CARRIED_COLUMNS = 24;

/** Longest step of a fit: kT for the offset, of ln α for the stock. */
const LONGEST_STEP: Bend = { offset: 2, slope: 0.5, ceiling: 1, floor: 1, stock: 1 };

/** What the fits of one series share. */
interface Subject {
  curve: BentCurve;
  energies: SeriesEnergies;
  stated: EnergyRows;
  /** overwritten for every other factor of the stock */
  restocked: EnergyRows | undefined;
  /** C as stated, where every fit starts */
  noiseAsStated: Noise;
  aicAsStated: number;
  fittedHere: boolean;
  mostColumns: number;
}

/**
 * The shape of a series.
 *
 * @param scored the same series, with its model and table
 * @returns alternatives that the points determine, lowest AIC first; energies in kT; and a note where some were
 *   left out, since there is too much to compute
 */
export function fitShape(
  dataset: DatasetInput,
  series: SeriesInput,
  scored: ScoredSeries,
): { shape: Shape; notes: Note[] } {
  const energies = new SeriesEnergies(dataset, series, scored.model);
  const asWritten = energies.at(1);
  const allowedByStatements = meanStatedU(asWritten);
  const subject = prepare(scored, energies, asWritten, mostShapeColumns(dataset));
  if (subject === null) {
    return {
      shape: { best: 'none', allowedByStatements, alternatives: [] },
      notes: [noteShapesLeftOut('all')],
    };
  }
  const restocks = mayRestock(dataset, scored.model, subject.stated.rank);
  const alternatives = fitAlternatives(subject, scored.table.count, restocks);
  const named = alternatives.length > 0 && alternatives[0].deltaAIC <= NAMED_BELOW;
  return {
    shape: { best: named ? alternatives[0].kind : 'none', allowedByStatements, alternatives },
    notes: restocks || !energies.hasOneLigand() ? [] : [noteShapesLeftOut('stock')],
  };
}

/** What the fits share, or null where the statements have too many independent directions. */
function prepare(
  { table, fittedHere }: ScoredSeries,
  energies: SeriesEnergies,
  rows: EnergyRows,
  mostColumns: number,
): Subject | null {
  const variance = table.activityU.map((u) => u * u + table.modelFloor ** 2);
  const stated = fittedHere ? withoutGradient(rows) : narrowRows(rows, mostColumns);
  if (stated === null) return null;
  const { residual, noise } = new BentCurve(table.activity, variance).bend(stated, AS_STATED, []);
  const noiseAsStated = noise();
  return {
    curve: new BentCurve(table.activity, variance),
    energies,
    stated,
    restocked: undefined,
    noiseAsStated,
    aicAsStated: noiseAsStated.quadraticForm(residual) + noiseAsStated.logDeterminant(),
    fittedHere,
    mostColumns,
  };
}

function fitAlternatives(subject: Subject, points: number, restocks: boolean): ShapeAlternative[] {
  const alternatives: ShapeAlternative[] = [];
  for (const [kind, free] of Object.entries(ALTERNATIVES) as [ShapeKind, readonly ShapeEstimateName[]][]) {
    if (points < free.length + SPARE_POINTS) continue;
    if (kind === 'stock' && !(restocks && subject.energies.hasOneLigand())) continue;
    const alternative = fitAlternative(subject, kind, free);
    if (alternative) alternatives.push(alternative);
  }
  return alternatives.sort((a, b) => a.deltaAIC - b.deltaAIC);
}

function fitAlternative(
  subject: Subject,
  kind: ShapeKind,
  free: readonly ShapeEstimateName[],
): ShapeAlternative | null {
  const start = free.map((name) => coordinateOf(name, AS_STATED[name]));
  const fit = fitLeastSquares({
    start,
    longestStep: free.map((name) => LONGEST_STEP[name]),
    at: (coordinates) => {
      const bend = bendAt(free, coordinates);
      const trial = subject.curve.bend(rowsAt(subject, bend), bend, free);
      return coordinates === start ? { ...trial, noise: () => subject.noiseAsStated } : trial;
    },
  });
  if (fit === null) return null;
  const estimates = free.map((name, j) => estimateOf(name, fit.values[j], fit.u[j]));
  const deltaAIC = fit.chiSquared + fit.logDeterminant + 2 * free.length - subject.aicAsStated;
  if (!Number.isFinite(deltaAIC) || !estimates.every(({ u }) => u < WIDEST_U)) return null;
  return { kind, estimates, deltaAIC };
}

function rowsAt(subject: Subject, { stock }: Bend): EnergyRows {
  if (stock === 1) return subject.stated;
  subject.restocked = subject.energies.at(stock, subject.restocked);
  if (subject.fittedHere) return withoutGradient(subject.restocked);
  // Few columns are dearer to narrow than to carry along.
  if (subject.restocked.rank <= CARRIED_COLUMNS) return subject.restocked;
  return narrowRows(subject.restocked, subject.mostColumns) ?? subject.restocked;
}

/** A stock is fitted in its logarithm, so that it stays positive; the rest as it is. */
function coordinateOf(name: ShapeEstimateName, value: number): number {
  return name === 'stock' ? Math.log(value) : value;
}

function bendAt(free: readonly ShapeEstimateName[], coordinates: readonly number[]): Bend {
  const bend: Record<ShapeEstimateName, number> = { ...AS_STATED };
  free.forEach((name, j) => {
    bend[name] = name === 'stock' ? Math.exp(coordinates[j]) : coordinates[j];
  });
  return bend;
}

function estimateOf(name: ShapeEstimateName, coordinate: number, u: number): ShapeEstimate {
  if (name !== 'stock') return { name, value: coordinate, u };
  const value = Math.exp(coordinate);
  return { name, value, u: value * u };
}
