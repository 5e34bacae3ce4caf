'use client';

import { type ReactNode, useRef, useState } from 'react';
import { AxisFrame } from '@/components/layout/axis-frame';
import { RowFrame } from '@/components/layout/row-frame';
import { ScrollingCell } from '@/components/layout/scrolling-cell';
import { CollapsePanel } from '@/components/plots/collapse-panel';
import { type EnergyWindow, fullWindow } from '@/components/plots/energy-window';
import { energiesOf, type PlotData, type PointPlace } from '@/components/plots/plot-data';
import { RowHeads } from '@/components/plots/row-figures';
import { useSize } from '@/components/plots/use-size';
import { WindowRuler } from '@/components/plots/window-ruler';
import { DerivedTable } from '@/components/reasons/derived-table';
import { shortWhys } from '@/components/reasons/reason-sentence';
import { TrialBand } from '@/components/reasons/trial-band';
import { useTrial } from '@/components/reasons/use-trial';
import { type StatedReading, WhyItMisses } from '@/components/reasons/why-it-misses';
import { RefitSection } from '@/components/refit/refit-section';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { CollapseSwitch } from './collapse-switch';
import { PointTable } from './point-table';
import { SeriesRow } from './series-row';
import { Statements } from './statements';
import { sentenceOn } from './summary-sentence';
import { Verdict } from './verdict';

/** How an assessed dataset is being looked at: what the address holds. */
export interface Look {
  window: EnergyWindow;
  byLigand: string | null;
}

interface AssessedViewProps {
  data: PlotData;
  look: Look;
  onLook: (look: Look) => void;
  /** above the statements: the dataset's title and what can be done with it */
  head: ReactNode;
  /** above the verdict: where the dataset is on its way, and what can be decided about it */
  aside?: ReactNode;
  /** in place of the plot and the table while the points are on their way */
  pending?: ReactNode;
  /** whether the table begins with the flagged points */
  flaggedFirst?: boolean;
  /** the point that the page was opened at */
  marked?: PointPlace | null;
  /** fetches the document where the points at hand are not all of it */
  wholeDocument?: (signal: AbortSignal) => Promise<DatasetDocument>;
  /** for those who may change what is stated */
  onState?: (reading: StatedReading) => void;
  /** above the plot: what was just stated otherwise */
  stated?: ReactNode;
}

/** An assessed dataset in the three columns: statements, collapse on the axis, verdict; a strip a series below. */
export function AssessedView({
  data,
  look,
  onLook,
  head,
  aside,
  pending = null,
  flaggedFirst = false,
  marked = null,
  wholeDocument,
  onState,
  stated,
}: AssessedViewProps) {
  const column = useRef<HTMLDivElement>(null);
  const { width } = useSize(column);
  const [chosen, setChosen] = useState(marked?.series ?? 0);
  /** the series whose row is pointed at: its points are lit */
  const [lit, setLit] = useState<number | null>(null);
  /** the series of the point that is pointed at: its row is lit */
  const [pointed, setPointed] = useState<number | null>(null);
  const [lastLigand, setLastLigand] = useState<string | null>(null);
  const trials = useTrial({
    stated: data,
    window: look.window,
    onWindow: (window) => onLook({ ...look, window }),
    wholeDocument,
  });
  const setWindow = trials.onWindow;
  // What is tried, or what was stated; and the same while its points travel.
  const shown = trials.scene?.data ?? data;
  const { data: drawn, window } = trials.drawn ?? { data, window: look.window };
  const full = fullWindow(energiesOf(shown));
  const whys = shortWhys(shown);
  const turn = (byLigand: string | null) => {
    if (byLigand !== null) setLastLigand(byLigand);
    onLook({ ...look, byLigand });
  };
  return (
    <>
      <AxisFrame
        who={
          <ScrollingCell label="Dataset and its statements">
            {head}
            <Statements data={data} chosen={Math.min(chosen, data.series.length - 1)} onChoose={setChosen} />
          </ScrollingCell>
        }
        axis={
          <div ref={column} className="flex h-full flex-col">
            {trials.trial ? null : stated}
            <TrialBand stated={data} trials={trials} />
            <CollapseSwitch data={data} byLigand={look.byLigand} onChange={turn} />
            {pending ?? (
              <CollapsePanel
                data={drawn}
                window={window}
                byLigand={look.byLigand}
                ligand={look.byLigand ?? lastLigand ?? data.document.ligands[0]?.id ?? null}
                lit={lit}
                marked={marked}
                sentence={sentenceOn(shown, { ...look, window })}
                onPoint={(place) => setPointed(place?.series ?? null)}
                onChoose={(place) => setChosen(place.series)}
              />
            )}
            <div className="border-ink border-y lg:hidden">
              <WindowRuler window={window} full={full} onChange={setWindow} />
            </div>
          </div>
        }
        verdict={
          <ScrollingCell label="Verdict">
            {aside}
            <Verdict
              data={shown}
              window={trials.scene?.window ?? look.window}
              full={full}
              onWindow={setWindow}
              isTrial={trials.trial !== null}
            >
              <WhyItMisses stated={data} trials={trials} disabled={pending !== null} onState={onState} />
            </Verdict>
          </ScrollingCell>
        }
      >
        <RowFrame
          tone="ruler"
          className="max-lg:[&>:first-child]:hidden max-lg:[&>:last-child]:hidden"
          who={<p className="py-1.5 text-sm text-soft">Series</p>}
          axis={<WindowRuler window={window} full={full} onChange={setWindow} />}
          verdict={<RowHeads />}
        />
        <ul>
          {drawn.series.map((series, i) => (
            <SeriesRow
              key={series.stated.id}
              series={series}
              window={window}
              width={width}
              lit={lit === i || pointed === i}
              chosen={chosen === i}
              onLight={(on) => setLit(on ? i : null)}
              onChoose={() => setChosen(i)}
              why={whys[i]}
            />
          ))}
        </ul>
      </AxisFrame>
      <div className="page-width">
        <DerivedTable data={shown} isTrial={trials.trial !== null} />
        {pending ? null : (
          <>
            <RefitSection data={data} trials={trials} wholeDocument={wholeDocument} />
            <PointTable
              data={shown}
              window={trials.scene?.window ?? look.window}
              onAll={() => setWindow(full)}
              flaggedFirst={flaggedFirst}
              marked={marked}
            />
          </>
        )}
      </div>
    </>
  );
}
