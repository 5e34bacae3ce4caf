import { LARGEST_KT } from '@/lib/engine/stated-ranges';
import { energyToKT } from '@/lib/engine/units';
import type { Modulation, Point } from '@/schemas/dataset-1.generated';
import { kelvinOf } from './check-gaps';
import { unitsOfLigands } from './check-units';
import { type ConcentrationRange, concentrationRange } from './concentration-range';
import { eachSeries, type MeaningCheck, type Report } from './document-report';
import { pointerTo } from './json-pointer';

/** Concentrations that are not 0 are of a believable size, and modulators shift the gap by at most 200 kT. */
export const checkPoints: MeaningCheck = (document, report) => {
  const ranges = new Map<string, ConcentrationRange & { unit: string }>();
  for (const [id, unit] of unitsOfLigands(document.ligands))
    ranges.set(id, { ...concentrationRange(unit), unit });
  eachSeries(document, (series, base) => {
    const slopes = slopesOf(series.parameters.modulation ?? [], kelvinOf(series, document));
    series.points.forEach((point, index) => {
      checkConcentrations(point, ranges, `${base}/points/${index}`, report);
      checkShifts(point, slopes, `${base}/points/${index}`, report);
    });
  });
};

function checkConcentrations(
  point: Point,
  ranges: Map<string, ConcentrationRange & { unit: string }>,
  base: string,
  report: Report,
): void {
  for (const id in point.ligands) {
    const value = point.ligands[id];
    const range = ranges.get(id);
    if (value === undefined || value === 0 || range === undefined) continue;
    if (value >= range.lowest && value <= range.highest) continue;
    const detail = `concentration of ${id} must be 0 or ${range.words}; found ${value} ${range.unit}`;
    report(pointerTo(base, 'ligands', id), detail);
  }
}

interface Slope {
  modulator: string;
  slopeKT: number;
  reference: number;
}

function slopesOf(modulation: Modulation[], kelvin: number): Slope[] {
  const slopes: Slope[] = [];
  modulation.forEach(({ modulator, slope, reference }) => {
    slopes.push({ modulator, slopeKT: energyToKT(slope.value, slope.unit, kelvin), reference });
  });
  return slopes;
}

function checkShifts(point: Point, slopes: Slope[], base: string, report: Report): void {
  const { modulators } = point;
  if (modulators === undefined) return;
  for (const { modulator, slopeKT, reference } of slopes) {
    const value = Object.hasOwn(modulators, modulator) ? modulators[modulator] : undefined;
    if (value === undefined) continue;
    const shiftKT = Math.abs(slopeKT * (value - reference));
    if (shiftKT <= LARGEST_KT) continue;
    const detail = `${modulator} may shift the gap by at most ${LARGEST_KT} kT; ${value} shifts it by ${shiftKT.toPrecision(4)} kT`;
    report(pointerTo(base, 'modulators', modulator), detail);
  }
}
