/** Readings of the energy gap: its orientation, whether it is per site, its unit, and a ratio's logarithm. */
import { temperatureOf } from './convert-statements';
import type { DatasetInput, GapStatement, SeriesInput, SiteClassInput } from './inputs';
import { renameCorrelations, withParameters } from './reread-parameters';
import { gapInRange } from './stated-ranges';
import type { EnergyUnit } from './units';

const REVERSED = {
  'inactive-minus-active': 'active-minus-inactive',
  'active-minus-inactive': 'inactive-minus-active',
  'inactive-over-active': 'active-over-inactive',
  'active-over-inactive': 'inactive-over-active',
} as const;

/** Every gap with the opposite orientation. Its number stays, and so do its correlations; slopes stay too. */
export function reverseGap<S extends SeriesInput>(dataset: DatasetInput, series: S): S | null {
  return mapGaps(dataset, series, (gap) => (isZero(gap) ? gap : reversed(gap)));
}

function reversed(gap: GapStatement): GapStatement {
  return gap.unit === 'ratio'
    ? { ...gap, orientation: REVERSED[gap.orientation] }
    : { ...gap, orientation: REVERSED[gap.orientation] };
}

/** Every gap's number, and its uncertainty, in another unit of energy. */
export function readGapIn<S extends SeriesInput>(
  dataset: DatasetInput,
  series: S,
  unit: EnergyUnit,
): S | null {
  return mapGaps(dataset, series, (gap) =>
    gap.unit === 'ratio' || gap.unit === unit || isZero(gap) ? gap : { ...gap, unit },
  );
}

/** Every ratio's number as the logarithm of the ratio: u(ln L) is u·ln 10, or u. */
export function readGapLogarithm<S extends SeriesInput>(
  dataset: DatasetInput,
  series: S,
  base: '10' | 'e',
): S | null {
  return mapGaps(dataset, series, (gap) => {
    if (gap.unit !== 'ratio') return gap;
    const value = base === '10' ? 10 ** gap.value : Math.exp(gap.value);
    return { ...gap, value, ...scaledU(gap, value * (base === '10' ? Math.LN10 : 1)) };
  });
}

/**
 * A gap of the whole complex as one per site, in every class, or a gap per site as that of the whole complex.
 * None where both are stated.
 */
export function moveGap<S extends SeriesInput>(dataset: DatasetInput, series: S): S | null {
  const { gap, siteClasses } = series.parameters;
  const stating = siteClasses.filter(({ gapPerSite }) => gapPerSite !== undefined);
  if (gap !== undefined) return stating.length > 0 ? null : spreadGap(dataset, series, gap);
  return stating.length === 1 ? gatherGap(series, stating[0]) : divideGaps(dataset, series);
}

/** g0 → Σ n_s·g0: one and the same gap in every class, so that its uncertainty counts once. */
function spreadGap<S extends SeriesInput>(dataset: DatasetInput, series: S, gap: GapStatement): S | null {
  const { siteClasses } = series.parameters;
  const sites = siteClasses.reduce((sum, siteClass) => sum + siteClass.sites.value, 0);
  if (isZero(gap) || sites === 1) return null;
  const label = siteClasses.length > 1 ? { sharedAs: gap.sharedAs ?? labelFor(dataset, series) } : {};
  const names = siteClasses.map(({ id }) => `${id}/gapPerSite`);
  const correlations = renameCorrelations(series.parameters, (name) => (name === 'gap' ? names : [name]));
  if (correlations === null) return null;
  const { gap: _, ...rest } = series.parameters;
  const spread = siteClasses.map((siteClass) => ({ ...siteClass, gapPerSite: { ...gap, ...label } }));
  return { ...series, parameters: { ...rest, ...correlations, siteClasses: spread } };
}

function labelFor(dataset: DatasetInput, series: SeriesInput): string {
  return `gap per site, series ${dataset.series.findIndex(({ id }) => id === series.id) + 1}`;
}

/** n_s·g_s → g_s where one class alone states it: the gap of the whole complex. */
function gatherGap<S extends SeriesInput>(series: S, stating: SiteClassInput): S | null {
  const { gapPerSite: gap, sites, id } = stating;
  if (gap === undefined || isZero(gap) || sites.value === 1) return null;
  const correlations = renameCorrelations(series.parameters, (name) => [
    name === `${id}/gapPerSite` ? 'gap' : name,
  ]);
  if (correlations === null) return null;
  const siteClasses = series.parameters.siteClasses.map(({ gapPerSite: _, ...siteClass }) => siteClass);
  return withParameters(series, { ...correlations, gap, siteClasses });
}

/** g_s → g_s/n_s in each of several classes. Gaps that are no longer alike are no longer one quantity. */
function divideGaps<S extends SeriesInput>(dataset: DatasetInput, series: S): S | null {
  const { siteClasses } = series.parameters;
  const kelvin = temperatureOf(series.temperature ?? dataset.temperature);
  const sitesOfLabel = new Map<string | undefined, Set<number>>();
  for (const { gapPerSite, sites } of siteClasses) {
    if (gapPerSite === undefined) continue;
    const counts = sitesOfLabel.get(gapPerSite.sharedAs) ?? new Set();
    sitesOfLabel.set(gapPerSite.sharedAs, counts.add(sites.value));
  }
  let changed = false;
  const divided = siteClasses.map((siteClass) => {
    const { gapPerSite, sites } = siteClass;
    if (gapPerSite === undefined || isZero(gapPerSite) || sites.value === 1) return siteClass;
    changed = true;
    const { sharedAs, ...part } = dividedBy(gapPerSite, sites.value);
    const stillOne = sharedAs !== undefined && sitesOfLabel.get(sharedAs)?.size === 1;
    return { ...siteClass, gapPerSite: stillOne ? { ...part, sharedAs } : part };
  });
  const fits = divided.every(({ gapPerSite }) => gapPerSite === undefined || gapInRange(gapPerSite, kelvin));
  return changed && fits ? withParameters(series, { siteClasses: divided }) : null;
}

function dividedBy(gap: GapStatement, sites: number): GapStatement {
  if (gap.unit !== 'ratio') return { ...gap, value: gap.value / sites, ...scaledU(gap, 1 / sites) };
  const value = gap.value ** (1 / sites);
  return { ...gap, value, ...scaledU(gap, value / gap.value / sites) };
}

/** `u` times a factor, for a spread: left out where it was left out. */
function scaledU(gap: GapStatement, factor: number): { u?: number } {
  return gap.u === undefined ? {} : { u: gap.u * factor };
}

function isZero(gap: GapStatement): boolean {
  return gap.value === (gap.unit === 'ratio' ? 1 : 0);
}

/** The series with every gap changed; null where none is, or where one leaves its range. */
function mapGaps<S extends SeriesInput>(
  dataset: DatasetInput,
  series: S,
  change: (gap: GapStatement) => GapStatement,
): S | null {
  const kelvin = temperatureOf(series.temperature ?? dataset.temperature);
  let changed = false;
  let fits = true;
  const map = (gap: GapStatement): GapStatement => {
    const next = change(gap);
    if (next !== gap) {
      changed = true;
      fits &&= gapInRange(next, kelvin);
    }
    return next;
  };
  const { gap, siteClasses } = series.parameters;
  const mapped = {
    ...(gap === undefined ? {} : { gap: map(gap) }),
    siteClasses: siteClasses.map((siteClass) =>
      siteClass.gapPerSite === undefined
        ? siteClass
        : { ...siteClass, gapPerSite: map(siteClass.gapPerSite) },
    ),
  };
  return changed && fits ? withParameters(series, mapped) : null;
}
