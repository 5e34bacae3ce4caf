/**
 * Random series that lie on their curve, and the same series stated under a misreading: what a laboratory
 * would have deposited that meant the one and wrote the other. Written independently of the engine's readings.
 */
import type { Misreading } from '@/lib/engine/assessment';
import type {
  BindingInput,
  DatasetInput,
  GapStatement,
  LigandInput,
  ParametersInput,
  PointInput,
  SiteClassInput,
} from '@/lib/engine/inputs';
import type { SeededRandom } from '@/lib/engine/seeded-random';
import { ENERGY_UNITS, type EnergyUnit, energyFromKT } from '@/lib/engine/units';

const KELVIN = 298.15;
const ACTIVITY_U = 0.02;
const GAP_U_KT = 0.1;
const CONSTANT_U = 0.06;
const DISPENSING_U = 0.03;

/** A series before it is written down: energies in kT, constants and concentrations in µM. */
interface TrueSeries {
  /** gap of the whole complex, kT */
  gapKT: number;
  classes: { sites: number; inactive: number; active: number | null }[];
  points: { c: number; activity: number }[];
}

interface GapForm {
  unit: EnergyUnit | 'ratio';
  perSite: boolean;
  reversed: boolean;
}

const pick = <T>(random: SeededRandom, all: readonly T[]): T =>
  all[Math.floor(random.uniform() * all.length)];
const between = (random: SeededRandom, low: number, high: number) => low + (high - low) * random.uniform();
const logBetween = (random: SeededRandom, low: number, high: number) =>
  Math.exp(between(random, Math.log(low), Math.log(high)));

/** Expected activity, straight from the equation of the two states. */
function activityAt(c: number, { gapKT, classes }: Omit<TrueSeries, 'points'>): number {
  let weight = Math.exp(-gapKT);
  for (const { sites, inactive, active } of classes) {
    weight *= ((1 + c / inactive) / (1 + (active === null ? 0 : c / active))) ** sites;
  }
  return 1 / (1 + weight);
}

/**
 * A response that spans at least 0.4 in activity: one or two classes, 1 to 12 sites, constants 10 to 10,000
 * apart (or a state that is not bound), inhibited or activated, eight to sixteen concentrations over the response,
 * one of them mostly 0.
 */
function randomSeries(random: SeededRandom): TrueSeries {
  for (;;) {
    const classes = Array.from({ length: random.uniform() < 0.25 ? 2 : 1 }, () => randomClass(random));
    const inhibited = random.uniform() < 0.6;
    if (!inhibited) for (const one of classes) activate(one);
    const gapKT = (inhibited ? 1 : -1) * between(random, 0.3, 6);
    const truth = { gapKT, classes };
    const count = 8 + Math.floor(random.uniform() * 9);
    const concentrations = spanningConcentrations(random, truth, count);
    if (concentrations === null) continue;
    return { ...truth, points: measure(random, truth, concentrations) };
  }
}

/** What is measured: the protein and the concentrations are not quite what is stated, and there is noise. */
function measure(
  random: SeededRandom,
  { gapKT, classes }: Omit<TrueSeries, 'points'>,
  concentrations: readonly number[],
): TrueSeries['points'] {
  const about = (value: number, relativeU: number) => value * Math.exp(relativeU * random.normal());
  const actual = {
    gapKT: gapKT + GAP_U_KT * random.normal(),
    classes: classes.map(({ sites, inactive, active }) => ({
      sites,
      inactive: about(inactive, CONSTANT_U),
      active: active && about(active, CONSTANT_U),
    })),
  };
  return concentrations.map((c) => {
    const p = activityAt(about(c, DISPENSING_U), actual);
    return { c, activity: Number((p + ACTIVITY_U * random.normal()).toFixed(4)) };
  });
}

function randomClass(random: SeededRandom): TrueSeries['classes'][number] {
  const sites = random.uniform() < 0.7 ? 1 + Math.floor(random.uniform() * 12) : between(random, 1, 12);
  const inactive = logBetween(random, 1e-2, 1e3);
  const active = random.uniform() < 0.2 ? null : inactive * logBetween(random, 10, 1e4);
  return { sites, inactive, active };
}

/** Ligand favours the active state: the tighter constant becomes that of the active state. */
function activate(one: TrueSeries['classes'][number]): void {
  const tight = one.inactive;
  one.inactive = one.active ?? tight * 1e4;
  one.active = tight;
}

/** Concentrations from a tenth below the response to ten times above it, evenly in the logarithm. */
function spanningConcentrations(
  random: SeededRandom,
  truth: Omit<TrueSeries, 'points'>,
  count: number,
): number[] | null {
  const grid = Array.from({ length: 241 }, (_, i) => 10 ** (-6 + i / 20));
  const p0 = activityAt(0, truth);
  const values = grid.map((c) => activityAt(c, truth));
  const furthest = values.reduce((far, p) => (Math.abs(p - p0) > Math.abs(far - p0) ? p : far), p0);
  const range = Math.abs(furthest - p0);
  if (range < 0.4) return null;
  const reach = (share: number) => values.findIndex((p) => Math.abs(p - p0) >= share * range);
  const low = grid[reach(0.1)] / logBetween(random, 2, 30);
  const high = grid[reach(0.9)] * logBetween(random, 2, 30);
  const withZero = random.uniform() < 0.7;
  const steps = withZero ? count - 1 : count;
  const rest = Array.from({ length: steps }, (_, i) => low * (high / low) ** (i / (steps - 1)));
  return (withZero ? [0, ...rest] : rest).map((c) => Number(c.toPrecision(4)));
}

/** How the gap of a series is written: any unit, either orientation, whole or (one class) per site. */
function randomForm(random: SeededRandom, truth: TrueSeries): GapForm {
  return {
    unit: pick(random, [...ENERGY_UNITS, 'ratio'] as const),
    perSite: truth.classes.length === 1 && random.uniform() < 0.3,
    reversed: random.uniform() < 0.5,
  };
}

function gapStatement(kT: number, uKT: number, { unit, reversed }: GapForm): GapStatement {
  const value = reversed ? -kT : kT;
  if (unit === 'ratio') {
    const ratio = Math.exp(value);
    const orientation = reversed ? 'inactive-over-active' : 'active-over-inactive';
    return { value: ratio, unit, orientation, u: ratio * uKT };
  }
  const [size, u] = [value, uKT].map((energy) => energyFromKT(energy, unit, KELVIN));
  const orientation = reversed ? 'active-minus-inactive' : 'inactive-minus-active';
  return { value: size, unit, orientation, u };
}

const constant = (value: number | null) =>
  value === null ? null : { value, unit: 'uM' as const, u: CONSTANT_U * value };

/** The dataset as it ought to be stated. */
function stateRightly(truth: TrueSeries, form: GapForm): DatasetInput {
  const sites = truth.classes.reduce((sum, one) => sum + one.sites, 0);
  const divisor = form.perSite ? sites : 1;
  const gap = gapStatement(truth.gapKT / divisor, GAP_U_KT / divisor, form);
  const siteClasses: SiteClassInput[] = truth.classes.map(({ sites: value, inactive, active }, i) => ({
    id: `class-${i}`,
    sites: { value },
    ...(form.perSite ? { gapPerSite: gap } : {}),
    binding: [{ ligand: 'velline', inactive: constant(inactive), active: constant(active) }],
  }));
  return datasetOf(
    { origin: 'independent', ...(form.perSite ? {} : { gap }), siteClasses },
    truth.points.map(({ c, activity }) => ({ ligands: { velline: c }, activity, u: ACTIVITY_U })),
  );
}

function datasetOf(parameters: ParametersInput, points: PointInput[]): DatasetInput {
  const ligand: LigandInput = { id: 'velline', unit: 'uM', concentration: 'free', relativeU: DISPENSING_U };
  return {
    temperature: { value: KELVIN, unit: 'K' },
    ligands: [ligand],
    normalisation: { method: 'absolute' },
    series: [{ id: 'wt', parameters, points }],
  };
}

/** A form under which this misreading can be made at all. */
function formFor(random: SeededRandom, truth: TrueSeries, { misreading }: Misreading): GapForm | null {
  const form = randomForm(random, truth);
  if (misreading === 'gap-unit') return { ...form, unit: pick(random, ENERGY_UNITS) };
  if (misreading === 'gap-scope') return truth.classes.length === 1 ? form : { ...form, perSite: true };
  if (misreading !== 'log-ratio') return form;
  const perSite = form.perSite && truth.classes.length === 1;
  const sites = truth.classes.reduce((sum, one) => sum + one.sites, 0);
  // The logarithm of a ratio below 1 is negative, and a ratio is not.
  if (Math.abs(truth.gapKT / (perSite ? sites : 1)) < 0.05) return null;
  return { unit: 'ratio', perSite, reversed: truth.gapKT < 0 };
}

/** A random series, rightly stated. */
export function randomDataset(random: SeededRandom): DatasetInput {
  const truth = randomSeries(random);
  return stateRightly(truth, randomForm(random, truth));
}

/** A random series stated under a misreading; null where these numbers cannot be stated so. */
export function plantMisreading(random: SeededRandom, planted: Misreading): DatasetInput | null {
  const truth = randomSeries(random);
  const form = formFor(random, truth, planted);
  if (form === null) return null;
  const dataset = stateRightly(truth, form);
  switch (planted.misreading) {
    case 'gap-orientation':
      return changeGaps(
        dataset,
        (gap) => ({ ...gap, orientation: opposite(gap.orientation) }) as GapStatement,
      );
    case 'gap-unit':
      return plantUnit(random, truth, form, planted.unit);
    case 'gap-scope':
      return plantScope(dataset, truth, form);
    case 'swapped-constants':
      return changeBindings(dataset, (one) => ({ ...one, inactive: one.active, active: one.inactive }));
    case 'association-constants':
      return changeBindings(dataset, (one) => ({
        ...one,
        inactive: one.inactive && associated(one.inactive),
        active: one.active && associated(one.active),
      }));
    case 'inverted-activity':
      return changePoints(dataset, (point) => ({ ...point, activity: 1 - (point.activity ?? 0) }));
    case 'concentration-scale':
      return changePoints(dataset, (point) => ({
        ...point,
        ligands: { velline: Number(((point.ligands.velline ?? 0) / planted.factor).toPrecision(4)) },
      }));
    case 'log-ratio':
      return changeGaps(dataset, (gap) => {
        const toLog = planted.base === '10' ? Math.LN10 : 1;
        return {
          ...gap,
          value: Math.log(gap.value) / toLog,
          u: (gap.u ?? 0) / gap.value / toLog,
        } as GapStatement;
      });
  }
}

/** The number in the unit that was meant, beside another unit. */
function plantUnit(random: SeededRandom, truth: TrueSeries, form: GapForm, meant: EnergyUnit): DatasetInput {
  const unit = pick(
    random,
    ENERGY_UNITS.filter((other) => other !== meant),
  );
  return changeGaps(
    stateRightly(truth, { ...form, unit: meant }),
    (gap) => ({ ...gap, unit }) as GapStatement,
  );
}

function changeGaps(dataset: DatasetInput, change: (gap: GapStatement) => GapStatement): DatasetInput {
  return changeParameters(dataset, ({ gap, siteClasses }) => ({
    ...(gap ? { gap: change(gap) } : {}),
    siteClasses: siteClasses.map((one) =>
      one.gapPerSite ? { ...one, gapPerSite: change(one.gapPerSite) } : one,
    ),
  }));
}

function changeBindings(
  dataset: DatasetInput,
  change: (binding: BindingInput) => BindingInput,
): DatasetInput {
  return changeParameters(dataset, ({ siteClasses }) => ({
    siteClasses: siteClasses.map((one) => ({ ...one, binding: one.binding.map(change) })),
  }));
}

function changeParameters(
  dataset: DatasetInput,
  change: (parameters: ParametersInput) => Partial<ParametersInput>,
): DatasetInput {
  const [series] = dataset.series;
  const parameters = { ...series.parameters, ...change(series.parameters) };
  return { ...dataset, series: [{ ...series, parameters }] };
}

function changePoints(dataset: DatasetInput, change: (point: PointInput) => PointInput): DatasetInput {
  const [series] = dataset.series;
  return { ...dataset, series: [{ ...series, points: series.points.map(change) }] };
}

/** Per site written as of the whole complex; or, the form saying per site, the whole complex written as per site. */
function plantScope(dataset: DatasetInput, truth: TrueSeries, form: GapForm): DatasetInput {
  const [series] = dataset.series;
  const sites = truth.classes.reduce((sum, one) => sum + one.sites, 0);
  const whole = gapStatement(truth.gapKT, GAP_U_KT, form);
  const perSite = gapStatement(truth.gapKT / sites, GAP_U_KT / sites, form);
  const bare = series.parameters.siteClasses.map(({ gapPerSite: _, ...one }) => one);
  const parameters: ParametersInput =
    form.perSite && truth.classes.length === 1
      ? { origin: 'independent', siteClasses: bare.map((one) => ({ ...one, gapPerSite: whole })) }
      : { origin: 'independent', gap: perSite, siteClasses: bare };
  return { ...dataset, series: [{ ...series, parameters }] };
}

const associated = <T extends { value: number; u?: number }>(one: T): T => ({
  ...one,
  value: 1 / one.value,
  u: (one.u ?? 0) / one.value ** 2,
});

function opposite(orientation: GapStatement['orientation']): string {
  const pairs = [
    ['inactive-minus-active', 'active-minus-inactive'],
    ['inactive-over-active', 'active-over-inactive'],
  ];
  const pair = pairs.find((one) => (one as string[]).includes(orientation)) ?? pairs[0];
  return pair[0] === orientation ? pair[1] : pair[0];
}
