/** The ticks of a dataset's strip: few enough to draw, and nothing that misses the curve left out. */
import type { Flag } from '@/lib/engine/assessment';
import type { Strip } from '@/schemas/dataset-answers';
import { decodeFlags, decodeNumbers } from './decode-columns';
import { type CellWindow, energyCellOf } from './density-grid';

export const MOST_TICKS = 300;

interface Tick {
  energy: number;
  z: number;
  flag: Flag;
}

/** Columns of one series as they are stored. */
export interface StripColumns {
  energy: Uint8Array;
  z: Uint8Array;
  flags: Uint8Array;
}

/**
 * The strip of a dataset within a window: all warnings and off-curve points, thinned only where they alone are too
 * many, and points on the curve thinned evenly in the order of their energies.
 */
export function drawStrip(series: StripColumns[], window: CellWindow | null): Strip {
  const ticks = series.flatMap(ticksOf).filter(({ energy }) => isInside(energy, window));
  ticks.sort((a, b) => a.energy - b.energy);
  const missing = thinned(
    ticks.filter(({ flag }) => flag !== 'on-curve'),
    MOST_TICKS,
  );
  const fitting = thinned(
    ticks.filter(({ flag }) => flag === 'on-curve'),
    MOST_TICKS - missing.length,
  );
  const drawn = [...missing, ...fitting].sort((a, b) => a.energy - b.energy);
  return {
    energy: drawn.map(({ energy }) => Number(energy.toFixed(4))),
    z: drawn.map(({ z }) => Number(z.toFixed(3))),
    flag: drawn.map(({ flag }) => flag),
  };
}

function ticksOf({ energy, z, flags }: StripColumns): Tick[] {
  const [energies, scores, names] = [decodeNumbers(energy), decodeNumbers(z), decodeFlags(flags)];
  return names.map((flag, i) => ({ energy: energies[i], z: scores[i], flag }));
}

function isInside(energy: number, window: CellWindow | null): boolean {
  const cell = energyCellOf(energy);
  return window === null || (cell >= window.firstCell && cell < window.endCell);
}

/** At most `most` of a list, evenly spread over it. */
function thinned<T>(list: T[], most: number): T[] {
  if (list.length <= most) return list;
  return Array.from({ length: most }, (_, i) => list[Math.floor(((i + 0.5) * list.length) / most)]);
}
