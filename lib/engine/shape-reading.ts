/**
 * A series as it reads with one of the alternatives of `shape.ts` taken for true: statements, concentrations
 * or activities are changed so that assessing the re-read series draws the points on the bent curve's terms.
 *
 *     expected = B + (A − B)·p(s·f + δ)   ⇔   (a − B)/(A − B) against p(s·f + δ)
 *
 * The energies of the re-read series are s·f + δ, f at α times the stated concentrations, to rounding.
 * Nothing is mutated; whatever else a series carries (label, variant) passes through.
 */
import type { ShapeEstimate, ShapeEstimateName } from './assessment';
import { temperatureOf } from './convert-statements';
import type { DatasetInput, GapStatement, ParametersInput, PointInput, SeriesInput } from './inputs';
import { AS_STATED, type Bend } from './shape-curve';
import { energyFromKT } from './units';

/**
 * Applies estimates of a shape to a series.
 *
 * @param dataset the dataset that the series stands in; gives the temperature
 * @param estimates δ in kT; s, A, B and α plain; what is left out stays as stated
 */
export function applyShape<S extends SeriesInput>(
  dataset: DatasetInput,
  series: S,
  estimates: readonly Pick<ShapeEstimate, 'name' | 'value'>[],
): S {
  const named: [ShapeEstimateName, number][] = estimates.map(({ name, value }) => [name, value]);
  const bend: Bend = { ...AS_STATED, ...Object.fromEntries(named) };
  const kelvin = temperatureOf(series.temperature ?? dataset.temperature);
  const points = series.points.map((point) => straighten(point, bend));
  return { ...series, parameters: bendParameters(series.parameters, bend, kelvin), points };
}

function bendParameters(parameters: ParametersInput, bend: Bend, kelvin: number): ParametersInput {
  const scaled = bend.slope === 1 ? parameters : scaleEnergies(parameters, bend.slope);
  return bend.offset === 0 ? scaled : { ...scaled, gap: shiftGap(scaled.gap, bend.offset, kelvin) };
}

/** f → s·f. A gap per site is multiplied by the sites already. */
function scaleEnergies(parameters: ParametersInput, slope: number): ParametersInput {
  const { gap, siteClasses, modulation } = parameters;
  return {
    ...parameters,
    ...(gap ? { gap: scaleGap(gap, slope) } : {}),
    siteClasses: siteClasses.map((one) => ({ ...one, sites: scaleNumber(one.sites, slope) })),
    ...(modulation
      ? { modulation: modulation.map((one) => ({ ...one, slope: scaleNumber(one.slope, slope) })) }
      : {}),
  };
}

function scaleNumber<Q extends { value: number; u?: number }>(quantity: Q, factor: number): Q {
  const { value, u } = quantity;
  return { ...quantity, value: value * factor, ...(u === undefined ? {} : { u: u * Math.abs(factor) }) };
}

/** A ratio's logarithm is what is scaled: L → L^s, u(ln L) with it. */
function scaleGap(gap: GapStatement, factor: number): GapStatement {
  if (gap.unit !== 'ratio') return scaleNumber(gap, factor);
  const value = gap.value ** factor;
  const relativeU = ((gap.u ?? 0) / gap.value) * Math.abs(factor);
  return { ...gap, value, ...(gap.u === undefined ? {} : { u: relativeU * value }) };
}

/** f → f + δ, in the gap's own unit and orientation; a new gap in kT where only gaps per site were stated. */
function shiftGap(gap: GapStatement | undefined, offsetKT: number, kelvin: number): GapStatement {
  if (gap === undefined) return { value: offsetKT, unit: 'kT', orientation: 'inactive-minus-active' };
  if (gap.unit === 'ratio') {
    const sign = gap.orientation === 'active-over-inactive' ? 1 : -1;
    return scaleNumber(gap, Math.exp(sign * offsetKT));
  }
  const sign = gap.orientation === 'inactive-minus-active' ? 1 : -1;
  return { ...gap, value: gap.value + sign * energyFromKT(offsetKT, gap.unit, kelvin) };
}

/** a → (a − B)/(A − B), its uncertainty and replicates with it; c → α·c. */
function straighten(point: PointInput, { ceiling, floor, stock }: Bend): PointInput {
  const height = ceiling - floor;
  const moved = stock === 1 ? point : { ...point, ligands: scaleAll(point.ligands, stock) };
  if (floor === 0 && height === 1) return moved;
  return rescaleActivity(moved, (activity) => (activity - floor) / height, 1 / Math.abs(height));
}

function scaleAll(ligands: Record<string, number>, factor: number): Record<string, number> {
  return Object.fromEntries(Object.entries(ligands).map(([id, value]) => [id, value * factor]));
}

/** The point with its activity, or its replicates, on another linear scale; `factor` multiplies a stated u. */
export function rescaleActivity(
  point: PointInput,
  rescale: (activity: number) => number,
  factor: number,
): PointInput {
  const { activity, replicates, u } = point;
  return {
    ...point,
    ...(activity === undefined ? {} : { activity: rescale(activity) }),
    ...(replicates === undefined ? {} : { replicates: replicates.map(rescale) }),
    ...(u === undefined ? {} : { u: u * factor }),
  };
}
