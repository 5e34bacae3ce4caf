/** Estimates of a refit beside what was stated, as rows of a table. Pure. */
import { energyStatementToKT, gapToKT, temperatureOf } from '@/lib/engine/convert-statements';
import type { RefitEstimate, RefitResult } from '@/lib/engine/refit';
import type { DatasetDocument, Series } from '@/schemas/dataset-1.generated';
import { type ParameterPlace, placeWords, statementAt } from './freeable';

export interface EstimateRow {
  key: string;
  /** place in the list, from 1: what the correlations are numbered by */
  number: number;
  /** “Energy gap”; with the ligand and the class where there are several */
  parameter: string;
  /** the series that it is of; null where it is shared */
  series: string | null;
  estimate: RefitEstimate;
  /** standard uncertainty of the stated value, in the unit of the estimate; null where several were stated */
  statedU: number | null;
  /** (refitted − stated) in units of the combined standard uncertainty; null where it has none */
  difference: number | null;
}

/** The rows of a result, in the order of its estimates. */
export function estimateRows(document: DatasetDocument, { estimates }: RefitResult): EstimateRow[] {
  return estimates.map((estimate, i) => {
    const statedU = uOfStatement(document, estimate);
    return {
      key: `${i}`,
      number: i + 1,
      parameter: placeWords(placeOf(estimate), document),
      series: document.series.find(({ id }) => id === estimate.series)?.label ?? null,
      estimate,
      statedU,
      difference: differenceOf(estimate, statedU),
    };
  });
}

function placeOf({ parameter, siteClass, ligand, modulator }: RefitEstimate): ParameterPlace {
  return {
    parameter,
    siteClass: siteClass ?? undefined,
    ligand: ligand ?? undefined,
    modulator: modulator ?? undefined,
  };
}

/** Of a shared value only where all series state the same: the mean of different statements has none. */
function uOfStatement(document: DatasetDocument, estimate: RefitEstimate): number | null {
  const concerned = document.series.filter(({ id }) => estimate.series === null || id === estimate.series);
  const all = concerned.flatMap((series) => statedIn(document, series, placeOf(estimate)) ?? []);
  const [first, ...others] = all;
  const isOne = first && others.every(({ value, u }) => value === first.value && u === first.u);
  return isOne ? first.u : null;
}

/** Value and u of a statement: energies in kT, the rest as stated. */
function statedIn(document: DatasetDocument, series: Series, place: ParameterPlace) {
  const kelvin = temperatureOf(series.temperature ?? document.temperature);
  const { gap, siteClasses, modulation } = series.parameters;
  const siteClass = siteClasses.find(({ id }) => id === place.siteClass);
  const slope = modulation?.find(({ modulator }) => modulator === place.modulator)?.slope;
  const energy =
    place.parameter === 'gap' && gap
      ? gapToKT(gap, kelvin)
      : place.parameter === 'gapPerSite' && siteClass?.gapPerSite
        ? gapToKT(siteClass.gapPerSite, kelvin)
        : place.parameter === 'slope' && slope
          ? energyStatementToKT(slope, kelvin)
          : null;
  if (energy) return { value: energy.valueKT, u: energy.uKT };
  const statement = statementAt(series.parameters, place);
  return statement && { value: statement.value, u: statement.u ?? 0 };
}

function differenceOf(
  { value, u, stated, determined }: RefitEstimate,
  statedU: number | null,
): number | null {
  if (!determined || u === null || statedU === null) return null;
  const combined = Math.hypot(u, statedU);
  return combined > 0 ? (value - stated) / combined : null;
}
