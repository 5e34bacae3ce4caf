'use client';

import { type ReactNode, useState } from 'react';
import { SeriesDot } from '@/components/assessed/series-dot';
import type { PlotData } from '@/components/plots/plot-data';
import { Button } from '@/components/ui/button';
import { formatCount, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import type { Misreading } from '@/lib/engine/assessment';
import { type MissingSeries, type Reason, whyItMisses } from './reason-sentence';
import type { Trials } from './use-trial';

/** Up to so many series are shown at once; one more would hide what comes below. */
const SHOWN_AT_FIRST = 5;

/** A reading that a depositor may put in the place of what was stated. */
export interface StatedReading {
  /** ids of series */
  series: readonly string[];
  misreading: Misreading;
  noun: string;
  /** label of the one series; null for all */
  label: string | null;
}

interface WhyItMissesProps {
  /** as stated, not as tried */
  stated: PlotData;
  trials: Trials;
  /** nothing can be tried yet */
  disabled?: boolean;
  /** for those who may change what is stated */
  onState?: (reading: StatedReading) => void;
  /** a word on which state of the data the reasons are of */
  children?: ReactNode;
}

/** Each series that misses the curve with its reasons, each reason with what can be done. Nothing where none misses. */
export function WhyItMisses({ stated, trials, disabled = false, onState, children }: WhyItMissesProps) {
  const [isWhole, setWhole] = useState(false);
  const why = whyItMisses(stated);
  if (why.dataset.length === 0 && why.series.length === 0) return <LonePoints stated={stated} />;
  const fold = why.series.length > SHOWN_AT_FIRST + 1 && !isWhole;
  const shown = fold ? why.series.slice(0, SHOWN_AT_FIRST) : why.series;
  const more = why.series.length - shown.length;
  const actions = { trials, disabled, onState };
  return (
    <section aria-labelledby="why-it-misses" className="mt-5 border-ink border-t pt-3">
      <h2 id="why-it-misses" className="font-semibold">
        Why it misses
      </h2>
      {children}
      <ul>
        {why.dataset.length > 0 ? (
          <li className="border-hairline border-b py-2.5 last:border-0">
            <h3 className="font-semibold text-sm">All series</h3>
            <Reasons reasons={why.dataset} label={null} index={null} {...actions} />
          </li>
        ) : null}
        {shown.map((series) => (
          <li key={series.index} className="border-hairline border-b py-2.5 last:border-0">
            <SeriesHead series={series} />
            <Reasons reasons={series.reasons} label={series.label} index={series.index} {...actions} />
          </li>
        ))}
      </ul>
      {more > 0 ? (
        <Button className="mt-1 text-sm" onClick={() => setWhole(true)}>
          {formatCount(more)} more series miss
        </Button>
      ) : null}
    </section>
  );
}

/** Where points miss and no series does. */
function LonePoints({ stated: { assessment } }: { stated: PlotData }) {
  const { offCurve, conventions } = assessment.summary;
  // An assessment that an older engine recorded did not look for reasons.
  if (offCurve === 0 || !conventions) return null;
  return (
    <section aria-labelledby="why-it-misses" className="mt-5 border-ink border-t pt-3">
      <h2 id="why-it-misses" className="font-semibold">
        Why it misses
      </h2>
      <p className="mt-1 text-pretty text-sm">
        {offCurve === 1 ? 'One point misses' : `${formatCount(offCurve)} points miss`}; no series does as a
        whole, and no one reading or shape explains it. Single readings may have gone wrong, or their
        uncertainties may be stated too small.
      </p>
    </section>
  );
}

function SeriesHead({ series: { label, colour, rmsZ } }: { series: MissingSeries }) {
  return (
    <div className="flex items-baseline gap-2 text-sm">
      <h3 className="flex min-w-0 items-baseline gap-2 font-semibold">
        <SeriesDot colour={colour} />
        <span className="truncate">{label}</span>
      </h3>
      <span className="figures ml-auto shrink-0 text-soft">
        RMS <MathSymbol>z</MathSymbol> {formatScore(rmsZ)}
      </span>
    </div>
  );
}

interface ReasonsProps extends Pick<WhyItMissesProps, 'trials' | 'onState'> {
  reasons: readonly Reason[];
  label: string | null;
  index: number | null;
  disabled: boolean;
}

function Reasons({ reasons, ...rest }: ReasonsProps) {
  return (
    <ul className="mt-1 space-y-2">
      {reasons.map((reason) => (
        <li key={reason.key} className="text-pretty text-sm">
          <p>
            <Sentence reason={reason} />
          </p>
          <Actions reason={reason} {...rest} />
        </li>
      ))}
    </ul>
  );
}

function Sentence({ reason: { text, strong } }: { reason: Reason }) {
  const at = strong === null ? -1 : text.indexOf(strong);
  if (strong === null || at < 0) return text;
  return (
    <>
      {text.slice(0, at)}
      <span className="font-semibold">{strong}</span>
      {text.slice(at + strong.length)}
    </>
  );
}

function Actions({
  reason,
  trials,
  label,
  index,
  disabled,
  onState,
}: Omit<ReasonsProps, 'reasons'> & { reason: Reason }) {
  if (reason.trial === null) return null;
  const { key, trial } = reason;
  const { reading, noun } = trial;
  const whose = label ?? 'all series';
  const isTried = trials.trial?.subject.key === key;
  const isPending = trials.pending === key;
  return (
    <>
      <p className="mt-0.5 flex flex-wrap gap-x-4">
        {isTried || isPending ? (
          <Button
            aria-label={isPending ? undefined : `Back to what was stated of ${whose}`}
            onClick={trials.stop}
          >
            {isPending ? 'Trying it …' : 'Back'}
          </Button>
        ) : (
          <Button
            disabled={disabled}
            aria-label={`Try it: ${noun}, ${whose}`}
            onClick={() => trials.start({ key, noun, label, index, reading })}
          >
            Try it
          </Button>
        )}
        {onState && reading.kind === 'convention' ? (
          <Button
            aria-label={`State it so: ${noun}, ${whose}`}
            onClick={() => onState({ series: reading.series, misreading: reading.misreading, noun, label })}
          >
            State it so
          </Button>
        ) : null}
      </p>
      {trials.failure?.key === key ? (
        <p role="alert" className="mt-0.5 text-off">
          It could not be tried: {trials.failure.detail} What was stated is shown as before.
        </p>
      ) : null}
    </>
  );
}
