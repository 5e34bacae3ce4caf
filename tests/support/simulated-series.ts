/**
 * Series as a laboratory would measure them, for statistical tests: the true parameters and concentrations are
 * drawn from what is stated, the activity follows the true curve, and noise of the stated size is added. The
 * model is that of `example-model.ts`, which shares no code with the engine.
 */
import type { ShapeEstimateName } from '@/lib/engine/assessment';
import type { DatasetInput, PointInput, SeriesInput } from '@/lib/engine/inputs';
import { expectedActivity } from './example-model';
import type { Random } from './random';

/** Standard uncertainties that the simulated series state. */
const GAP_U = 0.1;
const CONSTANT_RELATIVE_U = 0.06;
const DISPENSING_RELATIVE_U = 0.03;

export interface SimulationOptions {
  points: number;
  /** of a single reading, in activity */
  activityU: number;
  /** readings a point; 1: the point states `u` */
  replicates: number;
  /** what the true curve is bent by: B + (A − B)·p(s·f + δ) at α times the stated concentrations */
  bend: Partial<Record<ShapeEstimateName, number>>;
}

const DEFAULTS: SimulationOptions = { points: 14, activityU: 0.02, replicates: 1, bend: {} };

/** What a simulated system states. */
interface Stated {
  gap: number;
  sites: number;
  inactive: number;
  active: number;
}

/** A dataset of one simulated series, with a system drawn anew. */
export function simulateDataset(random: Random, options: Partial<SimulationOptions> = {}): DatasetInput {
  return datasetOfSimulated([simulateSeries(random, 'wt', options)]);
}

export function datasetOfSimulated(series: SeriesInput[]): DatasetInput {
  return {
    temperature: { value: 298.15, unit: 'K' },
    ligands: [{ id: 'velline', unit: 'uM', concentration: 'free', relativeU: DISPENSING_RELATIVE_U }],
    normalisation: { method: 'absolute' },
    series,
  };
}

export function simulateSeries(
  random: Random,
  id: string,
  overrides: Partial<SimulationOptions> = {},
): SeriesInput {
  const options = { ...DEFAULTS, ...overrides };
  const stated = drawSystem(random);
  return {
    id,
    parameters: {
      origin: 'independent',
      gap: { value: stated.gap, unit: 'kT', orientation: 'inactive-minus-active', u: GAP_U },
      siteClasses: [
        {
          id: 'main',
          sites: { value: stated.sites },
          binding: [
            { ligand: 'velline', inactive: constant(stated.inactive), active: constant(stated.active) },
          ],
        },
      ],
    },
    points: measurePoints(random, stated, drawTruth(random, stated), options),
  };
}

/** Complexes of 2 to 6 sites, whose ligand turns them off from 0.7 to 4 kT downwards. */
function drawSystem(random: Random): Stated {
  const inactive = 10 ** random.uniform(0, 2);
  return {
    gap: random.uniform(0.7, 4),
    sites: Math.floor(random.uniform(2, 7)),
    inactive,
    active: inactive * 10 ** random.uniform(1.5, 3),
  };
}

function constant(value: number) {
  return { value, unit: 'uM' as const, u: CONSTANT_RELATIVE_U * value };
}

function drawTruth(random: Random, stated: Stated): Stated {
  return {
    ...stated,
    gap: stated.gap + GAP_U * random.normal(),
    inactive: stated.inactive * Math.exp(CONSTANT_RELATIVE_U * random.normal()),
    active: stated.active * Math.exp(CONSTANT_RELATIVE_U * random.normal()),
  };
}

function measurePoints(
  random: Random,
  stated: Stated,
  truth: Stated,
  options: SimulationOptions,
): PointInput[] {
  const middle = stated.inactive * (Math.exp(stated.gap / stated.sites) - 1);
  return Array.from({ length: options.points }, (_, i) => {
    // From no ligand over a twentieth of the half-activity concentration to ten times as much.
    const c = i === 0 ? 0 : middle * 10 ** (-1.3 + (2.3 * (i - 1)) / (options.points - 2));
    const dispensed = c * Math.exp(DISPENSING_RELATIVE_U * random.normal());
    const activity = bentActivity(truth, dispensed, options.bend);
    const readings = Array.from(
      { length: options.replicates },
      () => activity + options.activityU * random.normal(),
    );
    const ligands = { velline: c };
    return options.replicates === 1
      ? { ligands, activity: readings[0], u: options.activityU }
      : { ligands, replicates: readings };
  });
}

function bentActivity(truth: Stated, c: number, bend: SimulationOptions['bend']): number {
  const { offset = 0, slope = 1, ceiling = 1, floor = 0, stock = 1 } = bend;
  const { gap, sites, inactive, active } = truth;
  const p = expectedActivity(
    { gapKT: gap, classes: [{ sites, constants: { velline: { inactive, active } } }] },
    { velline: stock * c },
  );
  const energy = slope * Math.log(p / (1 - p)) + offset;
  return floor + (ceiling - floor) / (1 + Math.exp(-energy));
}
