'use client';

import { useEffect } from 'react';
import type { EnergyWindow } from '@/components/plots/energy-window';
import { orderedWindow } from '@/components/plots/energy-window';
import { type ExampleSlug, isExampleSlug } from './example-words';
import { readNumber } from './read-number';

/** What an address can say of this page: which example, seen how. Data that somebody pasted are in no address. */
export interface CheckAddress {
  example: ExampleSlug | null;
  window: EnergyWindow | null;
  byLigand: string | null;
}

export function readAddress(search: string): CheckAddress {
  const query = new URLSearchParams(search);
  const example = query.get('example');
  return {
    example: isExampleSlug(example) ? example : null,
    window:
      query.has('from') && query.has('to')
        ? orderedWindow(numberIn(query, 'from'), numberIn(query, 'to'))
        : null,
    byLigand: query.get('by'),
  };
}

function numberIn(query: URLSearchParams, name: string): number {
  return readNumber(query.get(name) ?? '') ?? Number.NaN;
}

export function writeAddress({ example, window, byLigand }: CheckAddress): string {
  const query = new URLSearchParams();
  if (example) query.set('example', example);
  if (window) {
    query.set('from', String(window.from));
    query.set('to', String(window.to));
  }
  if (byLigand) query.set('by', byLigand);
  const text = query.toString();
  return text === '' ? '' : `?${text}`;
}

/**
 * Keeps the browser's address what the page shows, without a step in its history for every drag.
 *
 * @param address null while the page shows nothing yet: the address is then what is asked for, and is left alone
 */
export function useAddress(address: CheckAddress | null): void {
  const search = address === null ? null : writeAddress(address);
  useEffect(() => {
    if (search !== null && window.location.search !== search) {
      window.history.replaceState(
        window.history.state,
        '',
        `${window.location.pathname}${search}${window.location.hash}`,
      );
    }
  }, [search]);
}
