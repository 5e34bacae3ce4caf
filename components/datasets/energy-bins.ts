/** The overlay as a table: how many points of which flag lie where on the energy axis, and how high. Pure. */
import type { EnergyWindow } from '@/components/plots/energy-window';
import { logistic } from '@/lib/engine/logistic';
import type { Overlay } from '@/schemas/overlay';

export interface EnergyBin {
  /** edges, kT */
  from: number;
  to: number;
  points: number;
  onCurve: number;
  warning: number;
  offCurve: number;
  /** mean of the activities, to the height of a cell */
  meanActivity: number;
  /** of the master curve in the middle of the bin */
  expected: number;
}

const MOST_BINS = 25;
const WIDTHS = [0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50, 100];

/** The bins of a window that hold points, by energy; as wide as makes at most 25 of them. */
export function energyBins({ cells, grid }: Overlay, window: EnergyWindow): EnergyBin[] {
  const span = window.to - window.from;
  const width = WIDTHS.find((one) => span / one <= MOST_BINS) ?? span / MOST_BINS;
  const bins = new Map<number, EnergyBin & { sum: number }>();
  cells.energyCell.forEach((cell, i) => {
    const energy = (cell + 0.5) * grid.energy;
    if (energy < window.from || energy > window.to) return;
    const place = Math.floor(energy / width);
    const bin = bins.get(place) ?? emptyBin(place * width, width);
    bins.set(place, bin);
    const points = cells.points[i];
    bin.points += points;
    if (cells.flag[i] === 'on-curve') bin.onCurve += points;
    else if (cells.flag[i] === 'warning') bin.warning += points;
    else bin.offCurve += points;
    bin.sum += points * (cells.activityCell[i] + 0.5) * grid.activity;
  });
  return [...bins.values()]
    .sort((a, b) => a.from - b.from)
    .map(({ sum, ...bin }) => ({ ...bin, meanActivity: sum / bin.points }));
}

function emptyBin(from: number, width: number): EnergyBin & { sum: number } {
  const edges = { from: Number(from.toFixed(6)), to: Number((from + width).toFixed(6)) };
  const counts = { points: 0, onCurve: 0, warning: 0, offCurve: 0 };
  return { ...edges, ...counts, meanActivity: 0, expected: logistic(from + width / 2), sum: 0 };
}
