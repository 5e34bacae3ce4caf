'use client';

import { useSearchParams } from 'next/navigation';
import { useMemo } from 'react';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { readBrowseAddress, windowSlip, writeBrowseAddress } from './browse-address';

/** The address of a selection on this page. */
export function browseHref(filters: DatasetFilters): string {
  return `?${writeBrowseAddress(filters)}`;
}

/**
 * The filters of the browser's address, and the way to other ones. A step is a step of the history, so that Back and
 * Forward work; a window that is moved further is none.
 */
export function useBrowseAddress(): {
  filters: DatasetFilters;
  /** what the address asks for and cannot mean; null where there is nothing */
  slip: string | null;
  go: (next: DatasetFilters) => void;
} {
  const parameters = useSearchParams();
  const filters = useMemo(() => readBrowseAddress(parameters), [parameters]);
  const go = (next: DatasetFilters) => {
    const address = browseHref(next);
    if (address === browseHref(filters)) return;
    if (movesWindow(filters, next)) window.history.replaceState(null, '', address);
    else window.history.pushState(null, '', address);
  };
  return { filters, slip: windowSlip(parameters), go };
}

function movesWindow(before: DatasetFilters, next: DatasetFilters): boolean {
  const hadWindow = before.from !== null || before.to !== null;
  const same = { from: null, to: null };
  return hadWindow && browseHref({ ...before, ...same }) === browseHref({ ...next, ...same });
}
