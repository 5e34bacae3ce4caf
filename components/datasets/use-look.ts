'use client';

import { useSearchParams } from 'next/navigation';
import type { Look } from '@/components/assessed/assessed-view';
import { type EnergyWindow, orderedWindow } from '@/components/plots/energy-window';
import { readBrowseAddress } from './browse-address';

/**
 * How a dataset is looked at, as the address has it; each change replaces the address, and is no step of the history.
 *
 * @param opening the window that the address need not name
 * @param ligands ids of those whose concentrations points can stand by
 */
export function useLook(opening: EnergyWindow, ligands: readonly string[]): [Look, (look: Look) => void] {
  const parameters = useSearchParams();
  const { from, to } = readBrowseAddress(parameters);
  const asked = from === null || to === null ? null : orderedWindow(from, to);
  const by = parameters.get('by');
  const look = { window: asked ?? opening, byLigand: by !== null && ligands.includes(by) ? by : null };
  const setLook = (next: Look) => {
    const query = lookParameters(next, opening, parameters.get('point'));
    window.history.replaceState(null, '', query === '' ? window.location.pathname : `?${query}`);
  };
  return [look, setLook];
}

/** The parameters that say so; none for what a dataset opens with. */
export function lookParameters(
  { window: { from, to }, byLigand }: Look,
  opening: EnergyWindow,
  point: string | null = null,
): string {
  const query = new URLSearchParams();
  if (from !== opening.from || to !== opening.to) {
    query.set('from', String(from));
    query.set('to', String(to));
  }
  if (byLigand !== null) query.set('by', byLigand);
  if (point !== null) query.set('point', point);
  return String(query);
}
