'use client';

import { formatCount } from '@/components/ui/format-quantity';
import { BrowseWorkspace } from './browse-workspace';

/** Everything that is published. */
export function BrowseAll() {
  return (
    <BrowseWorkspace
      head={(datasets) => (
        <>
          <h1 className="head text-3xl">{titleOf(datasets)}</h1>
          <p className="mt-2 text-lg text-soft leading-snug">
            Activity against the free-energy coordinate that each laboratory’s own parameters predict.
          </p>
        </>
      )}
    />
  );
}

function titleOf(datasets: number | null): string {
  if (datasets === null) return 'Datasets on one curve';
  if (datasets === 0) return 'No dataset fits';
  return `${formatCount(datasets)} ${datasets === 1 ? 'dataset' : 'datasets'}, one curve`;
}
