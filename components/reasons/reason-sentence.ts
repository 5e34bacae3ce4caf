/**
 * Why series miss the curve, in sentences, each with the reading that can be tried. Pure: an assessed dataset
 * in, words out.
 */
import type { Reading } from '@/components/engine/reading';
import type { PlotData, PlotSeries } from '@/components/plots/plot-data';
import { formatFixed, formatScore } from '@/components/ui/format-quantity';
import type { ConventionFinding, QStatistic } from '@/lib/engine/assessment';
import { readingWords } from './reading-words';
import { namedAlternative, shapeWords } from './shape-words';

export interface Reason {
  key: string;
  text: string;
  /** the words in `text` that matter most */
  strong: string | null;
  /** what can be tried, null where nothing can */
  trial: { reading: Reading; noun: string } | null;
  /** a few words for the row of the series */
  short: string | null;
}

export interface MissingSeries {
  /** place in the dataset */
  index: number;
  label: string;
  colour: number | null;
  rmsZ: number;
  reasons: Reason[];
}

export interface WhyItMisses {
  /** what every series shows, said once */
  dataset: Reason[];
  /** the series that miss for reasons of their own, in the order of the dataset */
  series: MissingSeries[];
}

const NOTHING_EXPLAINS = 'No single misreading and no offset, slope, ceiling, floor or stock explains it.';
/** AIC by which an alternative is clearly better than what was stated. */
const CLEARLY_BETTER = -8;
/** RMS z beyond which a reading improves a series without explaining it. */
const STILL_MISSES = 1.5;
const NO_TEST = 'Its parameters were fitted to these very points, so it is no test of the curve.';

/** The reasons of a dataset: none where nothing misses. */
export function whyItMisses(data: PlotData): WhyItMisses {
  const shared = data.series.length > 1 ? (data.assessment.summary.conventions ?? []) : [];
  const ids = data.series.map(({ stated }) => stated.id);
  return {
    dataset: [
      ...shared.map((finding) => conventionReason(data, data.series, finding, data.assessment.summary, ids)),
      ...(shared.length === 0 ? commonOffset(data) : []),
    ],
    series: data.series.flatMap((series, index) => {
      const reasons = reasonsOf(data, series, shared);
      if (reasons.length === 0) return [];
      const { label, colour, assessed } = series;
      return [{ index, label, colour, rmsZ: assessed.rmsZ, reasons }];
    }),
  };
}

/** The same offset in every series that is a test points to a cause that they share. */
function commonOffset({ series }: PlotData): Reason[] {
  const tests = series.filter(({ assessed }) => assessed.origin !== 'fitted-here');
  const offsets = tests.flatMap(({ assessed: { shape } }) => {
    const offset = shape?.alternatives.find(({ kind }) => kind === 'offset');
    return offset && offset.deltaAIC <= CLEARLY_BETTER ? [offset.estimates[0].value] : [];
  });
  const [low, high] = [Math.min(...offsets), Math.max(...offsets)];
  // Alike: of one sign, and none more than twice another.
  const isAlike = low * high > 0 && Math.max(low / high, high / low) <= 2;
  if (tests.length < 2 || offsets.length < tests.length || !isAlike) return [];
  const range = `${formatFixed(low, 2)} to ${formatFixed(high, 2)}\u00a0kT`;
  return [
    {
      key: 'common offset',
      text: `Each is brought nearer to the curve by an offset of ${range}: look for a cause that they share.`,
      strong: range,
      trial: null,
      short: null,
    },
  ];
}

/** Why each series misses, in a few words for its row; null where it does not, or nothing explains it. */
export function shortWhys(data: PlotData): (string | null)[] {
  const why = whyItMisses(data);
  const own = new Map(why.series.map(({ index, reasons }) => [index, reasons]));
  return data.series.map((_, i) => {
    const reasons = [...(own.get(i) ?? []), ...why.dataset];
    return reasons.find(({ short }) => short !== null)?.short ?? null;
  });
}

/** Whether a series as stated is beyond chance: by p of Q, or by RMS z where there is no p. */
export function isRejected({ pValue, rmsZ }: Pick<QStatistic, 'pValue' | 'rmsZ'>): boolean {
  return pValue === null ? rmsZ > 3 : pValue < 0.001;
}

function reasonsOf(data: PlotData, series: PlotSeries, shared: readonly ConventionFinding[]): Reason[] {
  const { assessed, stated } = series;
  // An assessment that an older engine recorded holds no reasons.
  const found = assessed.conventions ?? [];
  const isShared = (finding: ConventionFinding) => shared.some((one) => keyOf(one) === keyOf(finding));
  const own = found.filter((finding) => !isShared(finding));
  const isSaid = own.length < found.length;
  const reasons = own.map((finding) => conventionReason(data, [series], finding, assessed, [stated.id]));
  if (!isSaid) reasons.push(...shapeReasons(series, own.length > 0));
  if (reasons.length === 0 && !isSaid && assessed.conventions && isRejected(assessed)) {
    reasons.push({
      key: `${stated.id} nothing`,
      text: NOTHING_EXPLAINS,
      strong: null,
      trial: null,
      short: null,
    });
  }
  if (reasons.length === 0) return [];
  // A scaling that the laboratory states itself is likelier than whatever else happens to fit.
  return [...normalisationReasons(series), ...reasons, ...circularityReasons(series)];
}

function keyOf({ rmsZ: _, deltaSumZ2: __, ...misreading }: ConventionFinding): string {
  return JSON.stringify(misreading);
}

function conventionReason(
  { document }: PlotData,
  series: readonly PlotSeries[],
  finding: ConventionFinding,
  asStated: Pick<QStatistic, 'rmsZ'>,
  ids: readonly string[],
): Reason {
  const { rmsZ: after, deltaSumZ2: _, ...misreading } = finding;
  const words = readingWords(
    misreading,
    document,
    series.map(({ stated }) => stated),
  );
  return {
    key: `${ids.join(' ')} ${keyOf(finding)}`,
    text: `${words.doing} brings RMS z from ${formatScore(asStated.rmsZ)} to ${formatScore(after)}${after > STILL_MISSES ? ': nearer, but not onto the curve' : ''}.`,
    strong: words.strong,
    trial: { reading: { kind: 'convention', series: ids, misreading }, noun: words.noun },
    short: words.short,
  };
}

/** @param second whether a misreading was said before: the shape is the other answer then */
function shapeReasons({ stated, assessed }: PlotSeries, second: boolean): Reason[] {
  if (!assessed.shape) return [];
  const words = shapeWords(assessed.shape);
  const best = namedAlternative(assessed.shape);
  if (words === null || best === null) return [];
  const sentence = `${words.doing} would bring it nearest to the curve${words.more ? `; ${words.more}` : ''}.`;
  return [
    {
      key: `${stated.id} ${best.kind}`,
      text: second ? `Or: ${lowerFirst(sentence)}` : sentence,
      strong: words.strong,
      trial: { reading: { kind: 'shape', series: stated.id, estimates: best.estimates }, noun: words.noun },
      short: words.short,
    },
  ];
}

function normalisationReasons({ stated, assessed }: PlotSeries): Reason[] {
  return assessed.notes
    .filter(({ code }) => code === 'normalisation')
    .map(({ detail }) => {
      const expected = assessed.points.map((point) => point.expected);
      const [low, high] = [Math.min(...expected), Math.max(...expected)];
      const reading: Reading = { kind: 'range', series: stated.id, low, high };
      const noun = `activities put back between ${low.toFixed(2)} and ${high.toFixed(2)}`;
      // Without its points, which are on their way, a series has no range to be put back to.
      const trial = high > low ? { reading, noun } : null;
      return {
        key: `${stated.id} normalisation`,
        text: detail,
        strong: null,
        trial,
        short: 'scaled to itself',
      };
    });
}

function circularityReasons({ stated, assessed }: PlotSeries): Reason[] {
  if (assessed.origin !== 'fitted-here') return [];
  return [{ key: `${stated.id} circular`, text: NO_TEST, strong: null, trial: null, short: null }];
}

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}
