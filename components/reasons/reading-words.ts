/** Misreadings as a person would say them, with what was stated in them. Pure. */
import { formatNumber, MINUS } from '@/components/ui/format-quantity';
import { unitLabel } from '@/components/ui/unit-label';
import type { Misreading } from '@/lib/engine/assessment';
import type { ConcentrationUnit, EnergyUnit } from '@/lib/engine/units';
import type { DatasetDocument, Gap, Series } from '@/schemas/dataset-1.generated';

export interface ReadingWords {
  /** what is done, as the beginning of a sentence: “Reading the gap as active − inactive” */
  doing: string;
  /** the words in `doing` that matter most */
  strong: string;
  /** the reading as a thing that is tried or stated: “the gap read as active − inactive” */
  noun: string;
  /** a few words for a row: “gap reversed?” */
  short: string;
}

const OPPOSITE_WORDS: Record<Gap['orientation'], string> = {
  'inactive-minus-active': `active\u00a0${MINUS}\u00a0inactive`,
  'active-minus-inactive': `inactive\u00a0${MINUS}\u00a0active`,
  'inactive-over-active': 'active / inactive',
  'active-over-inactive': 'inactive / active',
};

/**
 * A misreading in words.
 *
 * @param series those that are read so, of `document`
 */
export function readingWords(
  misreading: Misreading,
  document: DatasetDocument,
  series: readonly Series[],
): ReadingWords {
  switch (misreading.misreading) {
    case 'gap-orientation':
      return orientationWords(series);
    case 'gap-scope':
      return scopeWords(series);
    case 'gap-unit':
      return unitWords(misreading.unit, series);
    case 'log-ratio':
      return logarithmWords(misreading.base, series);
    case 'concentration-scale':
      return scaleWords(misreading.factor, unitsIn(document, series));
    case 'swapped-constants':
      return {
        doing: 'Exchanging the two constants, inactive for active,',
        strong: 'two constants',
        noun: 'the two constants exchanged',
        short: 'constants exchanged?',
      };
    case 'inverted-activity':
      return {
        doing: `Reading 1 ${MINUS} activity in place of activity`,
        strong: `1 ${MINUS} activity`,
        noun: `1 ${MINUS} activity in place of activity`,
        short: `1 ${MINUS} activity?`,
      };
    case 'association-constants':
      return {
        doing: 'Reading each constant as an association constant, 1/K,',
        strong: 'association constant',
        noun: 'each constant read as an association constant, 1/K',
        short: 'association constants?',
      };
  }
}

/** All gaps that these series state. */
function gapsOf(series: readonly Series[]): Gap[] {
  return series.flatMap(({ parameters: { gap, siteClasses } }) =>
    [gap, ...siteClasses.map(({ gapPerSite }) => gapPerSite)].filter((one) => one !== undefined),
  );
}

/** The one thing that all of a list are; null where they differ or there are none. */
function onlyOne<T>(all: readonly T[]): T | null {
  const [first, ...others] = all;
  return first !== undefined && others.every((other) => other === first) ? first : null;
}

function orientationWords(series: readonly Series[]): ReadingWords {
  const gaps = gapsOf(series);
  const what = gaps.length > 0 && gaps.every(({ unit }) => unit === 'ratio') ? 'ratio' : 'gap';
  const stated = onlyOne(gaps.map(({ orientation }) => orientation));
  const opposite = stated === null ? 'the other way round' : OPPOSITE_WORDS[stated];
  const as = stated === null ? opposite : `as ${opposite}`;
  return {
    doing: `Reading the ${what} ${as}`,
    strong: opposite,
    noun: `the ${what} read ${as}`,
    short: `${what} reversed?`,
  };
}

function scopeWords(series: readonly Series[]): ReadingWords {
  const isWhole = series.some(({ parameters }) => parameters.gap !== undefined);
  const meant = isWhole ? 'per site' : 'of the whole complex';
  const stated = isWhole ? 'of the whole complex' : 'per site';
  return {
    doing: `Reading the gap as ${meant}, not ${stated},`,
    strong: meant,
    noun: `the gap read as ${meant}`,
    short: isWhole ? 'gap per site?' : 'gap of the whole?',
  };
}

function unitWords(unit: EnergyUnit, series: readonly Series[]): ReadingWords {
  const gaps = gapsOf(series).filter((gap) => gap.unit !== 'ratio' && gap.unit !== unit);
  const value = onlyOne(gaps.map((gap) => gap.value));
  const stated = onlyOne(gaps.map((gap) => gap.unit));
  const number = value === null ? 'the number of the gap' : formatNumber(value);
  return {
    doing: `Reading ${number} as ${unit}${stated === null ? '' : `, not ${stated},`}`,
    strong: unit,
    noun: `${number} read as ${unit}`,
    short: `gap in ${unit}?`,
  };
}

function logarithmWords(base: '10' | 'e', series: readonly Series[]): ReadingWords {
  const value = onlyOne(
    gapsOf(series)
      .filter(({ unit }) => unit === 'ratio')
      .map((gap) => gap.value),
  );
  const number = value === null ? 'the number of the ratio' : `the ratio’s ${formatNumber(value)}`;
  const as = base === '10' ? 'its common logarithm, log10 L,' : 'its natural logarithm, ln L,';
  const strong = base === '10' ? 'common logarithm' : 'natural logarithm';
  return {
    doing: `Reading ${number} as ${as}`,
    strong,
    noun: `${number} read as its ${strong}`,
    short: base === '10' ? 'log10 of the ratio?' : 'ln of the ratio?',
  };
}

function scaleWords(factor: number, unit: ConcentrationUnit | null): ReadingWords {
  const isUp = factor > 1;
  const times = formatTimes(isUp ? factor : 1 / factor);
  const meant = unit === null ? null : unitTimes(unit, factor);
  const as =
    unit === null || meant === null
      ? ''
      : ` (as if they were in ${unitLabel(meant)}, not ${unitLabel(unit)})`;
  return {
    doing: `${isUp ? 'Multiplying' : 'Dividing'} the stated concentrations by ${times}${as}`,
    strong: times,
    noun: `the concentrations ${isUp ? 'multiplied' : 'divided'} by ${times}`,
    short: `concentrations ${isUp ? '×' : '÷'} ${times}?`,
  };
}

function formatTimes(times: number): string {
  return times > 1e5 ? 'a million' : '1000';
}

/** Units in steps of a thousand, the largest first; torr-like units have no neighbours. */
const LADDERS: readonly (readonly ConcentrationUnit[])[] = [
  ['M', 'mM', 'uM', 'nM', 'pM'],
  ['kPa', 'Pa'],
];

/** The unit that is `factor` times as large; null where it has no name. */
function unitTimes(unit: ConcentrationUnit, factor: number): ConcentrationUnit | null {
  const ladder = LADDERS.find((units) => units.includes(unit)) ?? [];
  return ladder[ladder.indexOf(unit) - Math.round(Math.log10(factor) / 3)] ?? null;
}

/** The unit of the ligands that these series titrate, where it is one. */
function unitsIn({ ligands }: DatasetDocument, series: readonly Series[]): ConcentrationUnit | null {
  const bound = new Set(
    series.flatMap(({ parameters }) =>
      parameters.siteClasses.flatMap(({ binding }) => binding.map(({ ligand }) => ligand)),
    ),
  );
  return onlyOne(ligands.filter(({ id }) => bound.has(id)).map(({ unit }) => unit));
}
