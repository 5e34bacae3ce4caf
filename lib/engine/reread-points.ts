/** Readings of the measured points: activities turned upside down, concentrations of another size. */
import type { DatasetInput, PointInput, SeriesInput } from './inputs';
import { concentrationInRange } from './stated-ranges';

/** a → 1 − a, replicates too; uncertainties stay. */
export function invertActivity<S extends SeriesInput>(series: S): S {
  return { ...series, points: series.points.map(invertPoint) };
}

function invertPoint(point: PointInput): PointInput {
  const { activity, replicates } = point;
  return {
    ...point,
    ...(activity === undefined ? {} : { activity: 1 - activity }),
    ...(replicates === undefined ? {} : { replicates: replicates.map((value) => 1 - value) }),
  };
}

/** Every concentration times `factor`; null where none is above 0, or where one leaves its range. */
export function scaleConcentrations<S extends SeriesInput>(
  dataset: DatasetInput,
  series: S,
  factor: number,
): S | null {
  const unitOf = new Map(dataset.ligands.map(({ id, unit }) => [id, unit]));
  let any = false;
  const points: PointInput[] = [];
  for (const point of series.points) {
    const ligands: Record<string, number> = {};
    for (const [id, value] of Object.entries(point.ligands)) {
      ligands[id] = value * factor;
      any ||= value > 0;
      if (!concentrationInRange(ligands[id], unitOf.get(id) ?? 'M')) return null;
    }
    points.push({ ...point, ligands });
  }
  return any ? { ...series, points } : null;
}
