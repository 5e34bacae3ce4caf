/**
 * Whether another shape of curve would fit a series better than its statements: an offset, a slope, a ceiling,
 * a floor, a wrong stock, or one of two pairs, each fitted by generalised least squares with the full
 * covariance taken anew at the fit, and compared by
 *
 *     AIC = rᵀC⁻¹r + ln det C + 2k,   each with C at its own fit
 *
 * Source: Akaike, IEEE Trans. Autom. Control 19, 716 (1974).
 */
import type { Shape, ShapeAlternative, ShapeEstimate, ShapeEstimateName, ShapeKind } from './assessment';
import { fitLeastSquares, type Noise } from './generalised-least-squares';
import type { DatasetInput, SeriesInput } from './inputs';
import { narrowFactor } from './narrow-factor';
import type { ScoredSeries } from './q-statistic';
import { AS_STATED, type Bend, BentCurve } from './shape-curve';
import { type EnergyRows, meanStatedU, SeriesEnergies } from './shape-energies';

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
}

/**
 * The shape of a series.
 *
 * @param scored the same series, with its model and table
 * @returns alternatives that the points determine, lowest AIC first; energies in kT
 */
export function fitShape(dataset: DatasetInput, series: SeriesInput, scored: ScoredSeries): Shape {
  const energies = new SeriesEnergies(dataset, series, scored.model);
  const asWritten = energies.at(1);
  const subject = prepare(scored, energies, asWritten);
  const alternatives: ShapeAlternative[] = [];
  for (const [kind, free] of Object.entries(ALTERNATIVES) as [ShapeKind, readonly ShapeEstimateName[]][]) {
    if (scored.table.count < free.length + SPARE_POINTS) continue;
    if (kind === 'stock' && !energies.hasOneLigand()) continue;
    const alternative = fitAlternative(subject, kind, free);
    if (alternative) alternatives.push(alternative);
  }
  alternatives.sort((a, b) => a.deltaAIC - b.deltaAIC);
  const named = alternatives.length > 0 && alternatives[0].deltaAIC <= NAMED_BELOW;
  return {
    best: named ? alternatives[0].kind : 'none',
    allowedByStatements: meanStatedU(asWritten),
    alternatives,
  };
}

function prepare({ table, fittedHere }: ScoredSeries, energies: SeriesEnergies, rows: EnergyRows): Subject {
  const variance = table.activityU.map((u) => u * u + table.modelFloor ** 2);
  const stated = fittedHere ? withoutParameters(rows) : narrowed(rows);
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
  };
}

/** In a series fitted to its own points C is the diagonal alone. */
function withoutParameters(rows: EnergyRows): EnergyRows {
  return { ...rows, gradient: new Float64Array(0), rank: 0 };
}

function narrowed(rows: EnergyRows): EnergyRows {
  const { factor, rank } = narrowFactor(rows.gradient, rows.energy.length, rows.rank);
  return { ...rows, gradient: factor, rank };
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
  return subject.fittedHere ? withoutParameters(subject.restocked) : subject.restocked;
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
