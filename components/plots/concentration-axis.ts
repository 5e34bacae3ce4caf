/**
 * The concentration axis of one ligand: log10 of the concentration in the ligand's unit, with a place of
 * its own for 0 at the left (common practice for dose series that include a blank).
 */
import { concentrationAt, type PlotData } from './plot-data';

export interface ConcentrationAxis {
  ligand: string;
  /** left and right edge, in log10 of the ligand's unit */
  from: number;
  to: number;
  /** where 0 stands; null where no point has it */
  zeroAt: number | null;
}

const AIR = 0.25;
const ZERO_GAP = 0.75;

/** The axis that holds every concentration of a ligand in a dataset. */
export function concentrationAxisOf(data: PlotData, ligand: string): ConcentrationAxis {
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  let hasZero = false;
  for (const series of data.series) {
    for (let i = 0; i < series.stated.points.length; i++) {
      const c = concentrationAt(series, i, ligand);
      if (c === 0) hasZero = true;
      else {
        low = Math.min(low, Math.log10(c));
        high = Math.max(high, Math.log10(c));
      }
    }
  }
  if (low > high) [low, high] = [-1, 1];
  const zeroAt = hasZero ? low - ZERO_GAP : null;
  return { ligand, from: (zeroAt ?? low) - AIR, to: high + AIR, zeroAt };
}

/** Where a concentration stands on the axis. */
export function placeOf(axis: ConcentrationAxis, c: number): number {
  return c === 0 ? (axis.zeroAt ?? axis.from) : Math.log10(c);
}

/** Ticks: whole powers of ten, thinned to at most eight, and the place of 0. */
export function concentrationTicks(axis: ConcentrationAxis): { at: number; label: string }[] {
  const lowest = axis.zeroAt === null ? axis.from : axis.zeroAt + ZERO_GAP / 2;
  const step = Math.max(1, Math.ceil((axis.to - lowest) / 8));
  const ticks = axis.zeroAt === null ? [] : [{ at: axis.zeroAt, label: '0' }];
  for (let power = Math.ceil(lowest); power <= axis.to; power += step) {
    ticks.push({ at: power, label: powerLabel(power) });
  }
  return ticks;
}

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

function powerLabel(power: number): string {
  if (power >= -3 && power <= 3) return String(Number(`1e${power}`));
  const digits = [...String(Math.abs(power))].map((digit) => SUPERSCRIPTS[Number(digit)]).join('');
  return `10${power < 0 ? '⁻' : ''}${digits}`;
}
