/** Which cell of the density grid a value lies in, and which cells a window touches. */
import { ACTIVITY_CELL, ENERGY_CELL_KT } from '@/schemas/density-grid';

/** Rounding of a window's edge that is meant to lie on the edge of a cell. */
const EDGE = 1e-6;

/** Number of the cell in which an energy (kT) lies: cell i holds i · 0.1 kT up to but without (i + 1) · 0.1 kT. */
export function energyCellOf(energy: number): number {
  return Math.floor(energy / ENERGY_CELL_KT);
}

/** Number of the cell in which an activity lies. */
export function activityCellOf(activity: number): number {
  return Math.floor(activity / ACTIVITY_CELL);
}

/** A window of energies as whole cells, the edges moved outwards: from the first cell up to but without the last. */
export interface CellWindow {
  firstCell: number;
  endCell: number;
}

/**
 * The cells that a window touches.
 *
 * @param from, to edges, kT; null where the window is open on that side
 * @returns null where it is open on both
 */
export function cellWindow(from: number | null, to: number | null): CellWindow | null {
  if (from === null && to === null) return null;
  return {
    firstCell: from === null ? -FAR : Math.floor(from / ENERGY_CELL_KT + EDGE),
    endCell: to === null ? FAR : Math.ceil(to / ENERGY_CELL_KT - EDGE),
  };
}

/** Beyond every energy that a valid document can reach: some 1e6 kT. */
const FAR = 1e9;
