'use client';

import { useState } from 'react';
import type { Look } from '@/components/assessed/assessed-view';
import { CollapseSwitch } from '@/components/assessed/collapse-switch';
import { sentenceOn } from '@/components/assessed/summary-sentence';
import { CollapsePanel } from '@/components/plots/collapse-panel';
import { type EnergyWindow, fullWindow, openingWindow } from '@/components/plots/energy-window';
import { energiesOf, type PlotData, pointsOf } from '@/components/plots/plot-data';
import { WindowRuler } from '@/components/plots/window-ruler';

interface DraftCollapseProps {
  data: PlotData;
  /** the series that is being edited: its points are lit */
  series: number;
  onSeries: (series: number) => void;
  /** the window while none is chosen */
  opening?: EnergyWindow;
}

/** The collapse of the draft as it was last saved, with its ruler. */
export function DraftCollapse({ data, series, onSeries, opening }: DraftCollapseProps) {
  const [chosen, setLook] = useState<Partial<Look>>({});
  const known = data.document.ligands.some(({ id }) => id === chosen.byLigand);
  const look: Look = {
    window: chosen.window ?? opening ?? openingWindow(pointsOf(data)),
    byLigand: known ? (chosen.byLigand ?? null) : null,
  };
  const several = data.series.length > 1;
  return (
    <>
      <CollapseSwitch
        data={data}
        byLigand={look.byLigand}
        onChange={(byLigand) => setLook({ ...chosen, byLigand })}
      />
      <div className="flex flex-col lg:[&>div]:min-h-[27rem]">
        <CollapsePanel
          data={data}
          window={look.window}
          byLigand={look.byLigand}
          ligand={look.byLigand ?? data.document.ligands[0]?.id ?? null}
          lit={several && series < data.series.length ? series : null}
          sentence={sentenceOn(data, look)}
          onChoose={(place) => onSeries(place.series)}
        />
      </div>
      <div className="border-ink border-y">
        <WindowRuler
          window={look.window}
          full={fullWindow(energiesOf(data))}
          onChange={(window) => setLook({ ...chosen, window })}
        />
      </div>
    </>
  );
}
