import { useState } from 'react';
import type { OverlayPoint } from '@/components/plots/overlay-view';
import type { Overlay } from '@/schemas/overlay';
import { useLitPoints } from './use-collection';

export interface Lighting {
  /** the points of the dataset whose row is pointed at */
  points: OverlayPoint[] | null;
  /** whether a dataset's row is lit: it or one of its points is pointed at */
  isLit: (accession: string) => boolean;
  /** its row is pointed at, or no longer */
  light: (accession: string, on: boolean) => void;
  /** one of its points is pointed at; null: none */
  point: (accession: string | null) => void;
}

/** Lighting both ways: a row lights its points in the plot, a point lights its row. */
export function useLighting(overlay: Overlay | null): Lighting {
  const [lit, setLit] = useState<string | null>(null);
  const [pointed, setPointed] = useState<string | null>(null);
  return {
    points: useLitPoints(lit, overlay),
    isLit: (accession) => lit === accession || pointed === accession,
    light: (accession, on) => setLit(on ? accession : null),
    point: setPointed,
  };
}
