/**
 * States in a document what was meant: a misreading that the assessment found becomes the statement. Numbers
 * that only move their decimal point or turn into 1 − a keep the digits they were given (`tidy-number.ts`); a
 * reciprocal, a power or a quotient is written in full, so that it still says what was stated.
 */
import type { Misreading } from '@/lib/engine/assessment';
import { rereadSeries } from '@/lib/engine/misreadings';
import {
  baseUnitsPer,
  CONCENTRATION_UNITS,
  type ConcentrationUnit,
  concentrationKind,
} from '@/lib/engine/units';
import type { DatasetDocument, Ligand, Point, Series } from '@/schemas/dataset-1.generated';
import { separateLabels } from './separate-labels';
import { complementOf, shiftDecimalPoint } from './tidy-number';

/**
 * The document with a statement corrected.
 *
 * A concentration scale that holds for every series becomes another unit of the ligands, where there is one;
 * constants keep their units. A label that several series share is given another name where they no longer
 * state the same under it.
 *
 * @param document a valid document; it is not changed
 * @param seriesIds the series concerned; those to which the reading does not apply stay as they are
 */
export function stateReading(
  document: DatasetDocument,
  seriesIds: readonly string[],
  misreading: Misreading,
): DatasetDocument {
  const reread = new Map<string, Series>();
  for (const series of document.series) {
    if (!seriesIds.includes(series.id)) continue;
    const read = rereadSeries(document, series, misreading);
    if (read !== null) reread.set(series.id, tidied(series, read, misreading));
  }
  if (misreading.misreading === 'concentration-scale') return scaled(document, reread, misreading.factor);
  const series = document.series.map((one) => reread.get(one.id) ?? one);
  const inverts = misreading.misreading === 'association-constants';
  return separateLabels(
    { ...document, series },
    new Set(reread.keys()),
    ({ kind }) => inverts && kind === 'dissociation constant',
  );
}

function tidied(stated: Series, read: Series, { misreading }: Misreading): Series {
  if (misreading !== 'inverted-activity') return read;
  return { ...read, points: stated.points.map(invertPoint) };
}

function invertPoint(point: Point): Point {
  return {
    ...point,
    ...(point.activity === undefined ? {} : { activity: complementOf(point.activity) }),
    ...(point.replicates === undefined ? {} : { replicates: point.replicates.map(complementOf) }),
  };
}

function scaled(
  document: DatasetDocument,
  reread: ReadonlyMap<string, Series>,
  factor: number,
): DatasetDocument {
  const everywhere = document.series.every((series) => reread.has(series.id) || !hasLigand(series));
  const units = new Map<string, ConcentrationUnit>();
  if (everywhere && reread.size > 0) {
    for (const { id, unit } of document.ligands) {
      const other = unitOfFactor(unit, factor);
      if (other !== null) units.set(id, other);
    }
  }
  const exponent = Math.round(Math.log10(factor));
  return {
    ...document,
    ligands: document.ligands.map((ligand) => withUnit(ligand, units.get(ligand.id))),
    series: document.series.map((series) =>
      reread.has(series.id) ? scalePoints(series, exponent, (id) => !units.has(id)) : series,
    ),
  };
}

function hasLigand({ points }: Series): boolean {
  return points.some(({ ligands }) => Object.values(ligands).some((value) => value > 0));
}

/** The unit that is `factor` times as large, of the same kind. */
function unitOfFactor(unit: ConcentrationUnit, factor: number): ConcentrationUnit | null {
  const size = baseUnitsPer(unit) * factor;
  const isWanted = (other: ConcentrationUnit) =>
    concentrationKind(other) === concentrationKind(unit) && Math.abs(baseUnitsPer(other) / size - 1) < 1e-9;
  return CONCENTRATION_UNITS.find(isWanted) ?? null;
}

function withUnit(ligand: Ligand, unit: ConcentrationUnit | undefined): Ligand {
  return unit === undefined ? ligand : { ...ligand, unit };
}

function scalePoints(series: Series, exponent: number, isScaled: (ligand: string) => boolean): Series {
  const scale = ([id, value]: [string, number]): [string, number] => [
    id,
    isScaled(id) ? shiftDecimalPoint(value, exponent) : value,
  ];
  const points = series.points.map((point) => ({
    ...point,
    ligands: Object.fromEntries(Object.entries(point.ligands).map(scale)),
  }));
  return { ...series, points };
}
