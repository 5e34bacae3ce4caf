/**
 * The energies that a series' statements give at points that nobody measured, for drawing its response.
 */
import { createSiteState, energyOf, occupySites } from './energy';
import type { DatasetInput, PointInput, SeriesInput } from './inputs';
import { readPoint } from './point-table';
import { buildSeriesModel } from './series-model';

/**
 * f at each of the given points, kT.
 *
 * @param points concentrations ≥ 0 in the ligands' units; activities are not read
 */
export function predictEnergies(
  dataset: DatasetInput,
  series: SeriesInput,
  points: readonly Pick<PointInput, 'ligands' | 'modulators'>[],
): Float64Array {
  const model = buildSeriesModel(dataset, series);
  const state = createSiteState(model);
  const concentrations = new Float64Array(model.ligandCount);
  return Float64Array.from(points, (point) => {
    readPoint(dataset, model, point, concentrations, state.displacement);
    occupySites(model, concentrations, 0, state);
    return energyOf(model, state);
  });
}
