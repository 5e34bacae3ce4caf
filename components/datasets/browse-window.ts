/** Which energies a selection is seen in. Pure. */
import { type EnergyWindow, fullWindow, isInside, openingWindow } from '@/components/plots/energy-window';
import { energiesOfOverlay } from '@/components/plots/overlay-view';
import type { DatasetItem } from '@/schemas/dataset-answers';
import type { DatasetFilters } from '@/schemas/dataset-query';
import type { Overlay } from '@/schemas/overlay';

export interface BrowseWindows {
  /** what is shown */
  window: EnergyWindow;
  /** what is shown where the address names no window */
  opening: EnergyWindow;
  /** every energy */
  full: EnergyWindow;
}

/**
 * @param overlay of all energies; null while it is on its way: the strips of the list stand in for it
 */
export function browseWindows(
  { from, to }: Pick<DatasetFilters, 'from' | 'to'>,
  overlay: Overlay | null,
  datasets: readonly DatasetItem[],
): BrowseWindows {
  const points = overlay ? energiesOfOverlay(overlay) : datasets.flatMap(pointsOfStrip);
  const opening = openingWindow(points);
  const full = fullWindow(points.map(({ energy }) => energy));
  const asked = { from: from ?? full.from, to: to ?? full.to };
  const isAsked = (from !== null || to !== null) && asked.from < asked.to;
  return { window: isAsked ? asked : opening, opening, full };
}

/** Ticks of a row as points. */
export function pointsOfStrip({ strip }: DatasetItem) {
  return strip.energy.map((energy, i) => ({ energy, z: strip.z[i], flag: strip.flag[i] }));
}

/**
 * The window as the address holds it: on tenths of a kT, in which points are counted; none where it is the one that
 * is shown without.
 */
export function windowForAddress(
  window: EnergyWindow,
  opening: EnergyWindow,
): Pick<DatasetFilters, 'from' | 'to'> {
  const [from, to] = [tenth(window.from), tenth(window.to)];
  return from === opening.from && to === opening.to ? { from: null, to: null } : { from, to };
}

/** How many points lie outside of what is shown. */
export function pointsOutside(overlay: Overlay, window: EnergyWindow): number {
  return energiesOfOverlay(overlay)
    .filter(({ energy }) => !isInside(energy, window))
    .reduce((sum, { points }) => sum + points, 0);
}

function tenth(energy: number): number {
  return Math.round(energy * 10) / 10;
}
