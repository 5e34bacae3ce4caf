'use client';

import { useRef } from 'react';
import type { PlotData } from '@/components/plots/plot-data';

/** Leads to the points off the curve one after the other, the furthest first, and round again. */
export function useOffCurveSteps(data: PlotData | null, go: (pointer: string) => void): () => void {
  const step = useRef(0);
  return () => {
    const places = offCurvePlaces(data);
    if (places.length === 0) return;
    go(places[step.current % places.length]);
    step.current += 1;
  };
}

/** Pointers of the points off the curve, the furthest first. */
export function offCurvePlaces(data: PlotData | null): string[] {
  const found = (data?.series ?? []).flatMap(({ assessed }, s) =>
    assessed.points
      .filter(({ flag }) => flag === 'off-curve')
      .map(({ index, z }) => ({ pointer: `/series/${s}/points/${index}`, miss: Math.abs(z) })),
  );
  return found.sort((a, b) => b.miss - a.miss).map(({ pointer }) => pointer);
}
