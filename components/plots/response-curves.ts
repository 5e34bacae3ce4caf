/**
 * The curves that a dataset's statements predict against the concentration of one ligand. By energy they
 * all are the master curve; the same samples, moved, are the separate responses.
 */
import { logistic } from '@/lib/engine/logistic';
import { predictEnergies } from '@/lib/engine/predict-energies';
import type { Point } from '@/schemas/dataset-1.generated';
import type { ConcentrationAxis } from './concentration-axis';
import type { PlotData, PlotSeries } from './plot-data';

const SAMPLES = 72;
/** Beyond so many curves nobody can follow one. */
const MOST_CURVES = 48;
const MOST_CURVES_PER_SERIES = 6;

export interface ResponseCurve {
  series: number;
  samples: { place: number; energy: number; expected: number }[];
}

/** The curves of all series along an axis, one for each set of other conditions; at most 48. */
export function responseCurves(data: PlotData, axis: ConcentrationAxis): ResponseCurve[] {
  const curves: ResponseCurve[] = [];
  data.series.forEach((series, s) => {
    for (const condition of conditionsOf(series, axis.ligand)) {
      if (curves.length < MOST_CURVES) curves.push(sampleCurve(data, s, condition, axis));
    }
  });
  return curves;
}

type Condition = Pick<Point, 'ligands' | 'modulators'>;

/** The distinct sets of everything else (other ligands, modulators) under which a series was measured. */
function conditionsOf(series: PlotSeries, ligand: string): Condition[] {
  const found = new Map<string, Condition>();
  for (const point of series.stated.points) {
    const ligands = { ...point.ligands };
    delete ligands[ligand];
    const condition = { ligands, modulators: point.modulators };
    const key = JSON.stringify([nonZeroEntries(ligands), modulatorEntries(series, point)]);
    if (!found.has(key)) found.set(key, condition);
    if (found.size === MOST_CURVES_PER_SERIES) break;
  }
  return [...found.values()];
}

/** A ligand that is left out is 0. */
function nonZeroEntries(values: Record<string, number>): [string, number][] {
  return Object.entries(values)
    .filter(([, value]) => value !== 0)
    .sort(([a], [b]) => (a < b ? -1 : 1));
}

/** A modulator that is left out stands at its reference. */
function modulatorEntries({ stated }: PlotSeries, { modulators }: Point): [string, number][] {
  return (stated.parameters.modulation ?? []).map(({ modulator, reference }) => [
    modulator,
    modulators?.[modulator] ?? reference,
  ]);
}

function sampleCurve(
  data: PlotData,
  s: number,
  condition: Condition,
  axis: ConcentrationAxis,
): ResponseCurve {
  const start = axis.zeroAt === null ? axis.from : axis.zeroAt + 0.4;
  const places = Array.from({ length: SAMPLES }, (_, i) => start + ((axis.to - start) * i) / (SAMPLES - 1));
  const points = places.map((place) => ({
    ...condition,
    ligands: { ...condition.ligands, [axis.ligand]: 10 ** place },
  }));
  const energies = predictEnergies(data.document, data.series[s].stated, points);
  return {
    series: s,
    samples: places.map((place, i) => ({ place, energy: energies[i], expected: logistic(energies[i]) })),
  };
}
