/** A dataset with the estimates of a refit in the place of what was stated. */
import type {
  CorrelationInput,
  DatasetInput,
  GapStatement,
  ParametersInput,
  SeriesInput,
  SiteClassInput,
} from './inputs';
import type { RefitEstimate, RefitResult } from './refit';
import { LARGEST_KT, LARGEST_RELATIVE_U, MOST_CORRELATIONS } from './stated-ranges';
import type { ConcentrationUnit } from './units';

type Fitted = Pick<RefitResult, 'estimates' | 'correlations'>;

/** An estimate as it is to be stated, by one series or by several under one label. */
interface Placed {
  index: number;
  estimate: RefitEstimate;
  label: string | undefined;
}

/**
 * A copy of a dataset in which the series that were fitted state the estimates: gaps in kT, inactive − active;
 * constants in the unit of the estimate; standard errors and correlations where determined; origin `fitted-here`.
 * A shared estimate carries one label in all series. It counts in `fittedCount` of one of them only, in turn, so that
 * the degrees of freedom of the dataset are right; each fitted series counts at least 1.
 *
 * @param dataset the one that was refitted; it is not changed
 */
export function applyEstimates<D extends DatasetInput>(dataset: D, fitted: Fitted): D {
  const labels = unusedLabels(dataset, fitted.estimates);
  const placed = dataset.series.map((series) =>
    fitted.estimates.flatMap((estimate, index): Placed[] =>
      isIn(estimate, series) ? [{ index, estimate, label: labels[index] }] : [],
    ),
  );
  const counts = fittedCounts(placed, fitted.estimates);
  const series = dataset.series.map((one, i) =>
    placed[i].length === 0 ? one : refittedSeries(one, placed[i], counts[i], fitted.correlations),
  );
  return { ...dataset, series };
}

/** The name of a fitted parameter within its series, as correlations name it. */
function nameOf({ parameter, siteClass, ligand, modulator }: RefitEstimate): string {
  switch (parameter) {
    case 'gap':
      return 'gap';
    case 'slope':
      return `${modulator}/slope`;
    case 'inactive':
    case 'active':
      return `${siteClass}/${ligand}/${parameter}`;
    default:
      return `${siteClass}/${parameter}`;
  }
}

/** Whether a series states what was estimated. */
function isIn(estimate: RefitEstimate, { id, parameters }: SeriesInput): boolean {
  if (estimate.series !== null && estimate.series !== id) return false;
  const { parameter, siteClass, ligand, modulator } = estimate;
  if (parameter === 'gap') return parameters.gap !== undefined;
  if (parameter === 'slope')
    return parameters.modulation?.some((entry) => entry.modulator === modulator) ?? false;
  const found = parameters.siteClasses.find((one) => one.id === siteClass);
  if (parameter === 'sites' || parameter === 'gapPerSite') return found?.[parameter] !== undefined;
  return (found?.binding.find((one) => one.ligand === ligand)?.[parameter] ?? null) !== null;
}

/** How many of the estimates each series counts as its own. */
function fittedCounts(placed: readonly Placed[][], estimates: readonly RefitEstimate[]): number[] {
  const counts = placed.map((own) => own.filter(({ estimate }) => estimate.series !== null).length);
  estimates.forEach((estimate, index) => {
    if (estimate.series !== null) return;
    const sharing = placed.flatMap((own, i) => (own.some((one) => one.index === index) ? [i] : []));
    const fewest = sharing.reduce((best, i) => (counts[i] < counts[best] ? i : best), sharing[0]);
    if (fewest !== undefined) counts[fewest]++;
  });
  return counts.map((count) => Math.max(1, count));
}

/** A label for each shared estimate that no statement of the dataset carries; undefined for the others. */
function unusedLabels(dataset: DatasetInput, estimates: readonly RefitEstimate[]): (string | undefined)[] {
  const used = JSON.stringify(dataset.series.map(({ temperature, parameters }) => [temperature, parameters]));
  let prefix = 'refit';
  while (used.includes(`"${prefix}-`) || dataset.temperature.sharedAs?.startsWith(prefix)) prefix += '-new';
  return estimates.map(({ series }, index) => (series === null ? `${prefix}-${index + 1}` : undefined));
}

function refittedSeries(
  series: SeriesInput,
  placed: readonly Placed[],
  fittedCount: number,
  correlations: Fitted['correlations'],
): SeriesInput {
  const { correlations: stated = [], ...rest } = series.parameters;
  const replaced = placed.reduce<ParametersInput>(withEstimate, rest);
  const names = new Set(placed.map(({ estimate }) => nameOf(estimate)));
  const all = [
    ...stated.filter(({ a, b }) => !names.has(a) && !names.has(b)),
    ...correlationsOf(placed, correlations),
  ];
  const kept = all.length > 0 && all.length <= MOST_CORRELATIONS ? { correlations: all } : {};
  return { ...series, parameters: { ...replaced, origin: 'fitted-here', fittedCount, ...kept } };
}

/** Correlations between the determined estimates of one series. */
function correlationsOf(placed: readonly Placed[], matrix: Fitted['correlations']): CorrelationInput[] {
  const determined = placed.filter(({ estimate }) => estimate.determined);
  return determined.flatMap((one, i) =>
    determined.slice(i + 1).flatMap((other) => {
      const r = matrix[one.index][other.index];
      return r === null ? [] : [{ a: nameOf(one.estimate), b: nameOf(other.estimate), r }];
    }),
  );
}

/** The standard error as a document may state it; null where the value is not determined, or beyond what it may. */
function statableU({ determined, u, unit, value }: RefitEstimate): number | null {
  if (!determined || u === null) return null;
  return u <= (unit === 'kT' ? LARGEST_KT : LARGEST_RELATIVE_U * value) ? u : null;
}

function withEstimate(parameters: ParametersInput, { estimate, label }: Placed): ParametersInput {
  const { parameter, siteClass, value, unit } = estimate;
  const u = statableU(estimate);
  const statement = {
    value,
    ...(u === null ? {} : { u }),
    ...(label === undefined ? {} : { sharedAs: label }),
  };
  const gap: GapStatement = { ...statement, unit: 'kT', orientation: 'inactive-minus-active' };
  const inClass = (change: (one: SiteClassInput) => SiteClassInput): ParametersInput => ({
    ...parameters,
    siteClasses: parameters.siteClasses.map((one) => (one.id === siteClass ? change(one) : one)),
  });
  switch (parameter) {
    case 'gap':
      return { ...parameters, gap };
    case 'gapPerSite':
      return inClass((one) => ({ ...one, gapPerSite: gap }));
    case 'sites':
      return inClass((one) => ({ ...one, sites: statement }));
    case 'slope': {
      const slope = { ...gap, unit: 'kT' as const, orientation: 'inactive-minus-active' as const };
      const modulation = parameters.modulation?.map((entry) =>
        entry.modulator === estimate.modulator ? { ...entry, slope } : entry,
      );
      return { ...parameters, modulation };
    }
    default: {
      const constant = { ...statement, unit: unit as ConcentrationUnit };
      return inClass((one) => ({
        ...one,
        binding: one.binding.map((bound) =>
          bound.ligand === estimate.ligand ? { ...bound, [parameter]: constant } : bound,
        ),
      }));
    }
  }
}
