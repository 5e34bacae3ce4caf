import type { ReactNode } from 'react';
import { type EnergyWindow, isInside } from '@/components/plots/energy-window';
import { countFlags, type PlotData } from '@/components/plots/plot-data';
import { whyItMisses } from '@/components/reasons/reason-sentence';
import { formatCount, formatPValue, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import type { Note } from '@/lib/engine/assessment';
import { FlagCounts } from './flag-counts';
import { WindowFields } from './window-fields';

interface VerdictProps {
  data: PlotData;
  window: EnergyWindow;
  full: EnergyWindow;
  onWindow: (window: EnergyWindow) => void;
  /** the figures are those of a trial */
  isTrial?: boolean;
  /** under the figures: why series miss */
  children?: ReactNode;
}

/** What follows: points on the curve, whether chance explains the rest, the whole's Q, notes, the window. */
export function Verdict({ data, window, full, onWindow, isTrial = false, children }: VerdictProps) {
  const { summary } = data.assessment;
  return (
    <>
      <p className="font-serif">
        <span className="font-semibold text-4xl">{formatCount(summary.onCurve)}</span>{' '}
        <span className="text-soft text-xl">/ {formatCount(summary.points)}</span>
      </p>
      <p className="text-sm text-soft">points on the master curve{isTrial ? ', in the trial' : ''}</p>
      <FlagCounts counts={summary} />
      <dl className="mt-4 border-hairline border-t pt-3">
        <Figure
          label={
            <>
              RMS <MathSymbol>z</MathSymbol>
            </>
          }
          value={formatScore(summary.rmsZ)}
          strong={summary.rmsZ > 2}
        />
        <Figure
          label={
            <>
              <MathSymbol>p</MathSymbol> of all together
            </>
          }
          value={formatPValue(summary.pValue)}
          strong={summary.pValue !== null && summary.pValue < 0.001}
        />
      </dl>
      <p className="mt-1 text-sm text-soft">{sentenceOnQ(data)}</p>
      {children}
      <p className="mt-3 text-sm text-soft [section+&]:border-hairline [section+&]:border-t [section+&]:pt-3">
        A point is off the curve beyond three standard uncertainties of the measurement and the stated
        parameters together. Chance alone would put about {chance(summary.expectedByChance.offCurve)} there,
        and {chance(summary.expectedByChance.warning)} among the warnings.
      </p>
      <WindowSection data={data} window={window} full={full} onWindow={onWindow} />
      <Notes data={data} />
    </>
  );
}

function Figure({ label, value, strong }: { label: ReactNode; value: string; strong: boolean }) {
  return (
    <div className="flex justify-between gap-3">
      <dt>{label}</dt>
      <dd className={`figures ${strong ? 'font-semibold text-off' : ''}`}>{value}</dd>
    </div>
  );
}

function chance(expected: number): string {
  return expected < 0.95 ? expected.toPrecision(1) : String(Math.round(expected));
}

/** What p of Q rests on, or why there is none. */
function sentenceOnQ({ assessment }: PlotData): string {
  const { chiSquared, degreesOfFreedom, pValue } = assessment.summary;
  const figures = `Weighted squares sum to ${formatScore(chiSquared)} for ${formatCount(degreesOfFreedom)} degrees of freedom`;
  if (pValue !== null) return `${figures}, shared parameters counted once.`;
  if (degreesOfFreedom === 0)
    return 'No p: as many parameters were fitted to these points as there are points.';
  return `${figures}; no p, since some uncertainties are assumed.`;
}

function Notes({ data }: { data: PlotData }) {
  const notes = groupNotes(data);
  if (notes.length === 0) return null;
  return (
    <div className="mt-5 border-ink border-t pt-3">
      <h2 className="font-semibold">Notes</h2>
      <ul className="mt-1.5 space-y-2.5 text-sm">
        {notes.map(({ note, series }) => (
          <li key={`${note.code} ${note.detail}`}>
            <span className="font-semibold">
              {series.length === data.series.length && series.length > 1 ? 'All series' : series.join(', ')}:{' '}
            </span>
            {note.detail}
          </li>
        ))}
      </ul>
    </div>
  );
}

/** Each sentence once, with the series that it holds for. */
function groupNotes(data: PlotData): { note: Note; series: string[] }[] {
  const groups = new Map<string, { note: Note; series: string[] }>();
  const reasoned = new Set(whyItMisses(data).series.map(({ index }) => index));
  for (const [i, { assessed, label }] of data.series.entries()) {
    for (const note of assessed.notes) {
      // Said with the derived quantities, or with the reasons why the series misses.
      if (note.code === 'derived-not-defined') continue;
      if (reasoned.has(i) && (note.code === 'normalisation' || note.code === 'circular')) continue;
      const group = groups.get(note.detail) ?? { note, series: [] };
      group.series.push(label);
      groups.set(note.detail, group);
    }
  }
  return [...groups.values()];
}

function WindowSection({ data, window, full, onWindow }: Omit<VerdictProps, 'isTrial' | 'children'>) {
  const points = data.series.flatMap(({ assessed }) => assessed.points);
  const inside = points.filter(({ energy }) => isInside(energy, window));
  const below = points.filter(({ energy }) => energy < window.from).length;
  const above = points.length - inside.length - below;
  return (
    <div className="mt-5 border-hairline border-t pt-3">
      <h2 className="font-semibold">Window of energies</h2>
      <WindowFields window={window} full={full} onWindow={onWindow} />
      {inside.length === points.length ? (
        <p className="mt-2 text-sm text-soft">
          Holds all points. Drag along the axis, or type, to narrow it.
        </p>
      ) : (
        <p className="mt-2 text-sm text-soft">
          {formatCount(countFlags(inside)['on-curve'])} / {formatCount(inside.length)} points in it are on the
          curve; {formatCount(below)} more at lower energies, {formatCount(above)} at higher.
        </p>
      )}
    </div>
  );
}
