/** Windows on the free-energy axis, in kT: what the plot, the ruler and the strips show. */
import type { AssessedPoint } from '@/lib/engine/assessment';

export interface EnergyWindow {
  /** left edge, kT */
  from: number;
  /** right edge, kT */
  to: number;
}

/** Narrower than this a window shows nothing that the uncertainties could tell apart. */
export const NARROWEST_WINDOW = 0.2;
/** Beyond this the master curve is flat to 5e-5, and points are shown only when asked for. */
const FLAT_BEYOND = 10;
const ALWAYS_SHOWN = 4;

/**
 * The window that a dataset opens with: all energies, but beyond where the curve is flat only as far as a
 * point is flagged. No warning and no miss is ever outside it.
 */
export function openingWindow(points: Iterable<Pick<AssessedPoint, 'energy' | 'flag'>>): EnergyWindow {
  const all = [...points];
  const full = fullWindow(all.map(({ energy }) => energy));
  const flagged = fullWindow(all.filter(({ flag }) => flag !== 'on-curve').map(({ energy }) => energy));
  return {
    from: Math.max(full.from, Math.min(flagged.from, -FLAT_BEYOND)),
    to: Math.min(full.to, Math.max(flagged.to, FLAT_BEYOND)),
  };
}

/** The window that holds every energy, with half a kT of air; never narrower than the bend of the curve. */
export function fullWindow(energies: Iterable<number>): EnergyWindow {
  let low = -ALWAYS_SHOWN;
  let high = ALWAYS_SHOWN;
  for (const energy of energies) {
    low = Math.min(low, energy - 0.5);
    high = Math.max(high, energy + 0.5);
  }
  return { from: Math.floor(low), to: Math.ceil(high) };
}

/** A window with its edges in order and at least the least width, or null where it is none. */
export function orderedWindow(a: number, b: number): EnergyWindow | null {
  if (!Number.isFinite(a) || !Number.isFinite(b)) return null;
  const window = { from: Math.min(a, b), to: Math.max(a, b) };
  // 0.3 − 0.1 is a trifle less than 0.2 in floating point.
  return window.to - window.from >= NARROWEST_WINDOW - 1e-9 ? window : null;
}

export function isInside(energy: number, window: EnergyWindow): boolean {
  return energy >= window.from && energy <= window.to;
}

/** Where an energy stands across a width in pixels. */
export function pixelOf(energy: number, window: EnergyWindow, width: number): number {
  return ((energy - window.from) / (window.to - window.from)) * width;
}

/** The energy at a pixel across a width. */
export function energyAtPixel(pixel: number, window: EnergyWindow, width: number): number {
  return window.from + (pixel / width) * (window.to - window.from);
}

/** A window moved by a share of its width, or made narrower or wider about its middle. */
export function moveWindow(window: EnergyWindow, share: number): EnergyWindow {
  const step = (window.to - window.from) * share;
  return { from: window.from + step, to: window.to + step };
}

/** A window pushed back so that none of it is beyond another one, as far as it fits. */
export function keptWithin(window: EnergyWindow, full: EnergyWindow): EnergyWindow {
  const width = Math.min(window.to - window.from, full.to - full.from);
  const from = Math.max(full.from, Math.min(window.from, full.to - width));
  return { from, to: from + width };
}

export function scaleWindow(window: EnergyWindow, factor: number): EnergyWindow {
  const middle = (window.from + window.to) / 2;
  const half = Math.max(NARROWEST_WINDOW, (window.to - window.from) * factor) / 2;
  return { from: middle - half, to: middle + half };
}

/** An edge as it is written in a field or an address: to a hundredth of a kT. */
export function roundEdge(energy: number): number {
  return Math.round(energy * 100) / 100;
}

export interface Tick {
  energy: number;
  labelled: boolean;
}

/** Ticks of an axis: a label about every 70 pixels, and a smaller tick halfway. */
export function ticksOf(window: EnergyWindow, width: number): Tick[] {
  const span = window.to - window.from;
  const most = Math.max(2, width / 70);
  const fitting = [0.02, 0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50, 100, 200].find((size) => span / size <= most);
  // An address may ask for a window of any width: its ticks stay few.
  const step = fitting ?? 10 ** Math.ceil(Math.log10(span / most));
  const ticks: Tick[] = [];
  const half = step / 2;
  for (let k = Math.ceil(window.from / half); k * half <= window.to; k++) {
    ticks.push({ energy: k * half, labelled: k % 2 === 0 });
  }
  return ticks;
}
