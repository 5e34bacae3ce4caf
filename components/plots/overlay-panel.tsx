'use client';

import dynamic from 'next/dynamic';
import { useMemo, useRef, useState } from 'react';
import type { Overlay } from '@/schemas/overlay';
import { CurveOutline } from './curve-outline';
import type { EnergyWindow } from './energy-window';
import { exceedsOverlayResiduals, type OverlayPoint } from './overlay-view';
import { PanelCaptions } from './panel-captions';
import { heightsIn } from './panel-heights';
import type { PointPlace } from './plot-data';
import { useSize } from './use-size';

const OverlayChart = dynamic(() => import('./overlay-chart'), { ssr: false, loading: () => null });

export interface OverlayPanelProps {
  /** null while it is on its way */
  overlay: Overlay | null;
  window: EnergyWindow;
  /** points to be lit, the rest dimmed */
  lit: readonly OverlayPoint[] | null;
  sentence: string;
  /** accession of the dataset whose point is pointed at; null when none is */
  onPoint: (accession: string | null) => void;
  onChoose: (accession: string, place: PointPlace) => void;
}

/** The overlay, the residual panel under it, and the words that stand in them; first the shape of what comes. */
export function OverlayPanel({ overlay, window, lit, sentence, onPoint, onChoose }: OverlayPanelProps) {
  const box = useRef<HTMLDivElement>(null);
  const { height } = useSize(box);
  const heights = useMemo(() => heightsIn(height), [height]);
  const [drawn, setDrawn] = useState(false);
  const view = useMemo(
    () => (overlay === null ? null : { overlay, window, heights }),
    [overlay, window, heights],
  );
  const accessionAt = (dataset: number) => overlay?.datasets[dataset]?.accession ?? null;
  return (
    <div
      ref={box}
      className="relative flex min-h-[400px] grow flex-col lg:min-h-[clamp(26rem,100dvh_-_29rem,44rem)]"
    >
      {drawn ? null : <CurveOutline window={window} />}
      {height === 0 || view === null ? null : (
        <OverlayChart
          view={view}
          lit={lit}
          sentence={sentence}
          onPoint={(dataset) => onPoint(dataset === null ? null : accessionAt(dataset))}
          onChoose={(dataset, place) => {
            const accession = accessionAt(dataset);
            if (accession !== null) onChoose(accession, place);
          }}
          onDrawn={() => setDrawn(true)}
        >
          <PanelCaptions by="energy" residualNote={residualNote(view.overlay)} />
        </OverlayChart>
      )}
    </div>
  );
}

function residualNote(overlay: Overlay): string | undefined {
  if (overlay.points === null) return 'off-curve points only: the others are too many to draw each';
  return exceedsOverlayResiduals(overlay) ? 'beyond ±9 at the edge' : undefined;
}
