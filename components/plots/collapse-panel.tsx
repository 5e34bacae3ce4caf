'use client';

import dynamic from 'next/dynamic';
import { useEffect, useMemo, useRef, useState } from 'react';
import { STILL, useMedia } from '@/components/ui/use-media';
import { TRAVEL_MILLISECONDS } from './collapse-option';
import { concentrationAxisOf } from './concentration-axis';
import type { EnergyWindow } from './energy-window';
import { heightsIn } from './panel-heights';
import { PanelWords } from './panel-words';
import type { PlotData, PointPlace } from './plot-data';
import { responseCurves } from './response-curves';
import { useSize } from './use-size';

const CollapseChart = dynamic(() => import('./collapse-chart'), { ssr: false, loading: () => null });

export interface CollapsePanelProps {
  data: PlotData;
  window: EnergyWindow;
  /** the ligand that points stand by; null: by energy */
  byLigand: string | null;
  /** the ligand whose responses the curves are, even while they lie on the master curve */
  ligand: string | null;
  lit: number | null;
  /** the point that the page was opened at */
  marked?: PointPlace | null;
  sentence: string;
  onPoint?: (place: PointPlace | null) => void;
  onChoose?: (place: PointPlace) => void;
}

/** The collapse, the residual panel under it, and the words that stand in them. */
export function CollapsePanel(props: CollapsePanelProps) {
  const { data, window, byLigand, ligand, lit, marked = null, sentence, onPoint, onChoose } = props;
  const still = useMedia(STILL);
  const box = useRef<HTMLDivElement>(null);
  const { height } = useSize(box);
  const heights = useMemo(() => heightsIn(height), [height]);
  const axis = useMemo(() => (ligand === null ? null : concentrationAxisOf(data, ligand)), [data, ligand]);
  const curves = useMemo(() => (axis === null ? [] : responseCurves(data, axis)), [data, axis]);
  const by = byLigand === null ? ('energy' as const) : ('concentration' as const);
  const travelling = useJustChanged(byLigand, TRAVEL_MILLISECONDS + 150);
  return (
    <div ref={box} className="flex min-h-[400px] grow flex-col lg:min-h-[clamp(30rem,100dvh_-_14rem,52rem)]">
      {height === 0 ? null : (
        <CollapseChart
          view={{ data, window, axis, curves, by, lit, marked, animate: travelling && !still, heights }}
          sentence={sentence}
          onPoint={onPoint}
          onChoose={onChoose}
        >
          <PanelWords data={data} byLigand={byLigand} />
        </CollapseChart>
      )}
    </div>
  );
}

/** Whether a value changed within the last so many milliseconds: points travel then, and at no other time. */
function useJustChanged(value: unknown, milliseconds: number): boolean {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), milliseconds);
    return () => clearTimeout(timer);
  }, [value, milliseconds]);
  return settled !== value;
}
