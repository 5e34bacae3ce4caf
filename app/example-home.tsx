import { FlagCounts } from '@/components/assessed/flag-counts';
import { ExampleCollapse } from '@/components/check/example-collapse';
import { AxisFrame } from '@/components/layout/axis-frame';
import { EnergyRuler } from '@/components/layout/energy-ruler';
import { RowFrame } from '@/components/layout/row-frame';
import { InlineEquation } from '@/components/methods/equation';
import { openingWindow } from '@/components/plots/energy-window';
import { ActionLink } from '@/components/ui/action-link';
import { formatCount } from '@/components/ui/format-quantity';
import { assessedExample } from '@/lib/assessments/assessed-example';
import { HomePurpose } from './home-purpose';
import { HomeRows } from './home-rows';

/** The start page while nothing is published yet: an example on the curve, and the way to check data against it. */
export function ExampleHome() {
  const { document, assessment } = assessedExample();
  const { summary, series } = assessment;
  const window = openingWindow(series.flatMap(({ points }) => points));
  return (
    <AxisFrame
      who={<HomePurpose />}
      axis={
        <div className="flex h-full flex-col">
          <ExampleCollapse document={document} assessment={assessment} />
          <div className="border-ink border-y lg:hidden">
            <EnergyRuler {...window} />
          </div>
        </div>
      }
      verdict={
        <>
          <p className="font-serif">
            <span className="font-semibold text-4xl">{formatCount(summary.onCurve)}</span>{' '}
            <span className="text-soft text-xl">/ {formatCount(summary.points)}</span>
          </p>
          <p className="text-sm text-soft">points on the master curve</p>
          <FlagCounts counts={summary} />
          <p className="mt-4 border-hairline border-t pt-3 text-sm text-soft">
            An invented example: one receptor and three variants, whose energies were stated in three units
            and two orientations. By concentration they are four curves, by energy one.
          </p>
          <p className="mt-3 text-sm">
            <ActionLink href="/check?example=collapse" prefetch={false}>
              Look at it closely
            </ActionLink>
          </p>
          <p className="mt-5 border-hairline border-t pt-4 font-serif text-lg">
            <InlineEquation tex="p = \frac{1}{1 + e^{-f}}" />
          </p>
          <p className="mt-2 text-sm text-soft">
            The activity that a two-state protein is expected to have at a free-energy coordinate f.
          </p>
        </>
      }
    >
      <RowFrame
        tone="ruler"
        className="max-lg:hidden"
        who={<p className="py-1.5 text-sm text-soft">What goes in, what comes out</p>}
        axis={<EnergyRuler {...window} />}
        verdict={<p className="py-1.5 text-sm text-soft">Where to look</p>}
      />
      <HomeRows />
    </AxisFrame>
  );
}
