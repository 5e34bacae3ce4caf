'use client';

import { type RefObject, useEffect, useRef } from 'react';
import type { PlotData } from '@/components/plots/plot-data';
import { Button } from '@/components/ui/button';
import { formatCount, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import { STILL } from '@/components/ui/use-media';
import type { Trials } from './use-trial';

interface TrialBandProps {
  stated: PlotData;
  trials: Trials;
}

/** Above the plot while a reading is tried: what it is, what it brings, and the way back. Says so to those who listen. */
export function TrialBand({ stated, trials: { trial, hasReturned, stop } }: TrialBandProps) {
  const band = useRef<HTMLDivElement>(null);
  const key = trial?.subject.key ?? null;
  useBroughtIntoView(band, key);
  useReturnedFocus(key !== null);
  const change = trial && changeOf(stated, trial.data, trial.subject.index);
  return (
    <>
      <p role="status" className="sr-only">
        {trial && change
          ? spoken(titleOf(trial.subject), change)
          : hasReturned
            ? 'Back to what was stated.'
            : ''}
      </p>
      {trial && change ? (
        <section
          ref={band}
          aria-label="Trial"
          className="scroll-mt-4 border-act border-b-2 border-dashed bg-wash px-2 py-2 max-lg:-mx-4 max-lg:px-4"
        >
          <p className="text-pretty">
            <span className="font-semibold">Trial:</span> {titleOf(trial.subject)}.
          </p>
          <p className="figures mt-0.5 flex flex-wrap items-baseline gap-x-5 text-sm">
            <span>
              RMS <MathSymbol>z</MathSymbol> {formatScore(change.before.rmsZ)} <Arrow />{' '}
              <span className="font-semibold">{formatScore(change.after.rmsZ)}</span>
            </span>
            <span>
              points on the curve {formatCount(change.before.onCurve)} <Arrow />{' '}
              <span className="font-semibold">{formatCount(change.after.onCurve)}</span> of{' '}
              {formatCount(change.points)}
            </span>
            <span className="text-soft">Nothing is saved.</span>
            <Button className="ml-auto text-sm" onClick={stop}>
              Back to what was stated
            </Button>
          </p>
        </section>
      ) : null}
    </>
  );
}

function Arrow() {
  return <span className="text-soft">→</span>;
}

function titleOf({ noun, label }: { noun: string; label: string | null }): string {
  return `${label ?? 'all series'}, with ${noun}`;
}

interface Standing {
  rmsZ: number;
  onCurve: number;
}

interface Change {
  before: Standing;
  after: Standing;
  points: number;
}

/** How one series, or the whole, stands before and after. */
function changeOf(stated: PlotData, tried: PlotData, index: number | null): Change {
  const { series, summary } = stated.assessment;
  const points = index === null ? summary.points : series[index].points.length;
  return { before: standingOf(stated, index), after: standingOf(tried, index), points };
}

function standingOf({ assessment, series }: PlotData, index: number | null): Standing {
  if (index === null) return assessment.summary;
  const { rmsZ, points } = series[index].assessed;
  return { rmsZ, onCurve: points.filter(({ flag }) => flag === 'on-curve').length };
}

function spoken(title: string, { before, after, points }: Change): string {
  return `Trial: ${title}. RMS z from ${formatScore(before.rmsZ)} to ${formatScore(after.rmsZ)}, points on the curve from ${before.onCurve} to ${after.onCurve} of ${points}. Nothing is saved. Escape goes back to what was stated.`;
}

/** A trial may begin far from the plot, on a narrow screen or beside a long list of series. */
function useBroughtIntoView(band: RefObject<HTMLElement | null>, key: string | null): void {
  useEffect(() => {
    if (key === null || band.current === null) return;
    const { top } = band.current.getBoundingClientRect();
    if (top >= 0 && top < innerHeight * 0.7) return;
    const behavior = matchMedia(STILL).matches ? 'instant' : 'smooth';
    scrollTo({ top: scrollY + top - 64, behavior });
  }, [band, key]);
}

/** Gives the focus back to what began the trial, where the trial's own button, which goes with it, had it. */
function useReturnedFocus(active: boolean): void {
  useEffect(() => {
    if (!active) return;
    const begun = document.activeElement;
    return () => {
      const isLost = document.activeElement === document.body || document.activeElement === null;
      if (isLost && begun instanceof HTMLElement && begun.isConnected) begun.focus();
    };
  }, [active]);
}
