'use client';

import { signedLabel } from '@/components/plots/axis-ruler';
import type { EnergyWindow } from '@/components/plots/energy-window';
import { formatCount } from '@/components/ui/format-quantity';
import { BrowseWorkspace } from './browse-workspace';

/** Everything that is published. */
export function BrowseAll() {
  return (
    <BrowseWorkspace
      head={(datasets, window) => (
        <>
          <h1 className="head text-3xl">{titleOf(datasets, window)}</h1>
          <p className="mt-2 text-lg text-soft leading-snug">
            Activity against the free-energy coordinate that each laboratory’s own parameters predict.
          </p>
        </>
      )}
    />
  );
}

function titleOf(datasets: number | null, window: EnergyWindow | null): string {
  if (datasets === null) return 'Datasets on one curve';
  if (datasets === 0) return 'No dataset fits';
  const counted = `${formatCount(datasets)} ${datasets === 1 ? 'dataset' : 'datasets'}`;
  if (window === null) return `${counted}, one curve`;
  return `${counted} from ${signedLabel(window.from)} to ${signedLabel(window.to)}\u00a0kT`;
}
