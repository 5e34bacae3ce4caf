'use client';

import { useEffect, useRef } from 'react';
import type { EnergyWindow } from '@/components/plots/energy-window';
import { orderedWindow } from '@/components/plots/energy-window';
import { readNumber } from '@/components/ui/read-number';
import { type ExampleSlug, isExampleSlug } from './example-words';

/** What an address can say of this page: which example, seen how. Data that somebody pasted are in no address. */
export interface CheckAddress {
  example: ExampleSlug | null;
  window: EnergyWindow | null;
  byLigand: string | null;
}

/** Reads the part of an address behind the path; what it does not understand is null. */
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

/** The part of an address behind the path for a result that is shown. */
export function writeAddress({ example, window, byLigand }: CheckAddress): string {
  const query = new URLSearchParams();
  if (example) query.set('example', example);
  if (window) {
    query.set('from', String(window.from));
    query.set('to', String(window.to));
  }
  if (byLigand) query.set('by', byLigand);
  if (!example) query.set('result', 'own');
  return `?${query}`;
}

/** Whether an address is that of a result, not of the source. */
function isResult(search: string): boolean {
  const query = new URLSearchParams(search);
  return query.has('result') || isExampleSlug(query.get('example'));
}

function step(search: string, kind: 'pushState' | 'replaceState'): void {
  window.history[kind](
    window.history.state,
    '',
    `${window.location.pathname}${search}${window.location.hash}`,
  );
}

/**
 * Keeps the browser's address what the page shows. A result is a step of its own in the history, so that Back
 * leads to the source again; a drag on the axis is none.
 *
 * @param result how the result is seen; null while the source is shown
 * @param onStep told which of the two the reader went to by Back or Forward
 */
export function useAddress(result: CheckAddress | null, onStep: (toResult: boolean) => void): void {
  const search = result === null ? '' : writeAddress(result);
  const shown = useRef<boolean | null>(null);
  useEffect(() => {
    const isFirst = shown.current === null;
    const turned = shown.current !== (result !== null);
    shown.current = result !== null;
    // At first the address is what is asked for, and is left alone.
    if (isFirst || window.location.search === search) return;
    const here = isResult(window.location.search) === (result !== null);
    step(search, turned && !here ? 'pushState' : 'replaceState');
  }, [search, result]);
  useEffect(() => {
    const follow = () => onStep(isResult(window.location.search));
    window.addEventListener('popstate', follow);
    return () => window.removeEventListener('popstate', follow);
  }, [onStep]);
}
