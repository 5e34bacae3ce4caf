/**
 * What a least-squares fit says about the variables that it found: standard errors and correlations from the
 * inverse of the normal matrix JᵀJ, and which variables the data do not determine. The inverse is taken from the
 * singular values of J with its columns scaled to length 1; their ratio squared is the condition number of the
 * scaled normal matrix.
 *
 * Source: Bates & Watts, Nonlinear Regression Analysis and Its Applications (1988), sections 2.3 and 3.3; Belsley,
 * Kuh & Welsch, Regression Diagnostics (1980), chapter 3, for tracing a near dependence to its variables.
 */
import { normOf, singularFactors, triangularise } from './orthogonal-factors';

/** Beyond this condition number of the scaled normal matrix, variables cannot be told apart. */
const LARGEST_CONDITION = 1e8;

/** A variable belongs to a weak direction where its part of that unit vector is at least this. */
const LEAST_PART = 0.1;

/** Singular values below this share of the largest are rounding and taken as this large. */
const RANK_FLOOR = 1e-14;

export interface FitUncertainty {
  /** from (JᵀJ)⁻¹, not rescaled by the residuals; null where nothing depends on the variable */
  standardErrors: (number | null)[];
  /** n×n; null where nothing depends on one of the two */
  correlations: (number | null)[][];
  /** whether the variable belongs to a direction along which the data cannot tell variables apart */
  entangled: boolean[];
}

/**
 * Uncertainties of the n variables of a fit.
 *
 * @param jacobian derivatives of the weighted residuals, m×n row by row
 * @param held variables that stand at a bound: taken as given there
 */
export function uncertaintyOfFit(
  jacobian: Float64Array,
  m: number,
  n: number,
  held: readonly boolean[] = [],
): FitUncertainty {
  const lengths = columnLengths(jacobian, m, n);
  const told = Array.from({ length: n }, (_, j) => j).filter((j) => lengths[j] > 0 && !held[j]);
  const directions = directionsOf(jacobian, m, n, told, lengths);
  const covariance = inverseOf(directions, told.length);
  const size = told.length;
  const placeOf = Array.from({ length: n }, (_, j) => told.indexOf(j));
  const spread = (a: number) => Math.sqrt(covariance[a * size + a]);
  return {
    standardErrors: placeOf.map((a, j) => (a < 0 ? null : finiteOrNull(spread(a) / lengths[j]))),
    correlations: placeOf.map((a, i) =>
      placeOf.map((b, j) => {
        if (i === j) return 1;
        return a < 0 || b < 0 ? null : within(covariance[a * size + b] / (spread(a) * spread(b)));
      }),
    ),
    entangled: placeOf.map(
      (a) => a >= 0 && directions.some(({ weak, vector }) => weak && involves(vector[a])),
    ),
  };
}

const involves = (part: number) => Math.abs(part) >= LEAST_PART;
const within = (r: number) => Math.min(1, Math.max(-1, r));
const finiteOrNull = (value: number) => (Number.isFinite(value) ? value : null);

function columnLengths(jacobian: Float64Array, m: number, n: number): Float64Array {
  const column = new Float64Array(m);
  return Float64Array.from({ length: n }, (_, j) => {
    for (let i = 0; i < m; i++) column[i] = jacobian[i * n + j];
    return normOf(column);
  });
}

interface Direction {
  /** unit vector among the scaled variables */
  vector: Float64Array;
  /** singular value, not below the rounding of the largest */
  value: number;
  weak: boolean;
}

function directionsOf(
  jacobian: Float64Array,
  m: number,
  n: number,
  told: readonly number[],
  lengths: Float64Array,
): Direction[] {
  const size = told.length;
  const scaled = new Float64Array(m * size);
  for (let i = 0; i < m; i++) {
    told.forEach((j, a) => {
      scaled[i * size + a] = jacobian[i * n + j] / lengths[j];
    });
  }
  const { factor } = triangularise(scaled, new Float64Array(m), m, size);
  const { values, right } = singularFactors(factor, size);
  const largest = values.reduce((most, value) => Math.max(most, value), 0);
  return right.map((vector, k) => {
    const value = Math.max(values[k], RANK_FLOOR * largest);
    return { vector, value, weak: (largest / value) ** 2 > LARGEST_CONDITION };
  });
}

/** Σ_k v_k v_kᵀ / s_k² */
function inverseOf(directions: readonly Direction[], size: number): Float64Array {
  const inverse = new Float64Array(size * size);
  for (const { vector, value } of directions) {
    for (let a = 0; a < size; a++) {
      for (let b = 0; b < size; b++) inverse[a * size + b] += (vector[a] / value) * (vector[b] / value);
    }
  }
  return inverse;
}
