import { notFound } from 'next/navigation';
import { ExampleCollapse } from '@/components/check/example-collapse';
import { FlagCounts } from '@/components/check/flag-counts';
import { AxisFrame } from '@/components/layout/axis-frame';
import { EnergyRuler } from '@/components/layout/energy-ruler';
import { RowFrame } from '@/components/layout/row-frame';
import { InlineEquation } from '@/components/methods/equation';
import { openingWindow } from '@/components/plots/energy-window';
import { ActionLink } from '@/components/ui/action-link';
import { actionStyle } from '@/components/ui/action-style';
import { formatCount } from '@/components/ui/format-quantity';
import { assessedExample } from '@/lib/assessments/assessed-example';
import { VISITOR } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import { HomeRow } from './home-row';

/** What the place is for, the curve itself, and the way to check data against it. */
export default function HomePage() {
  if (!may(VISITOR, 'check-document')) notFound();
  const { document, assessment } = assessedExample();
  const { summary, series } = assessment;
  const window = openingWindow(series.flatMap(({ points }) => points));
  return (
    <AxisFrame
      who={
        <>
          <h1 className="head text-3xl">Do your points fall on the master curve?</h1>
          <p className="mt-3 max-w-[30rem] text-lg text-soft leading-snug">
            Curvekeep recomputes every point’s free-energy coordinate from the parameters that a laboratory
            itself states, puts all its curves on one, and shows which points miss it.
          </p>
          <p className="mt-6">
            <ActionLink href="/check" prefetch={false} variant="primary">
              Check your data
            </ActionLink>
          </p>
        </>
      }
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
      <HomeRow
        title="What you bring"
        where={
          <ActionLink href="/check" prefetch={false}>
            Check data
          </ActionLink>
        }
      >
        Activities against ligand concentration, for any number of variants and conditions, and the parameters
        you claim for them: energy gaps, sites, dissociation constants, modulators. Each in your own unit and
        orientation, as a JSON document or as a CSV table with a short form beside it.
      </HomeRow>
      <HomeRow
        title="What comes out"
        where={
          <ActionLink href="/methods#flags" prefetch={false}>
            Residual and flags
          </ActionLink>
        }
      >
        For every point its coordinate in kT, the activity that your statements predict, the residual in
        standard uncertainties of measurement and parameters together, and a flag: on curve, warning, off
        curve. For every series and for the whole a test of the collapse, and how many flags chance alone
        would give.
      </HomeRow>
      <HomeRow
        title="From a script"
        where={
          <a href="/api/v1/openapi.json" className={actionStyle()}>
            API description
          </a>
        }
      >
        The same call answers programs: send the document to <code>POST /api/v1/assessments</code>. Nobody
        signs in, and nothing is stored.
      </HomeRow>
      <HomeRow
        title="What it is not"
        where={
          <ActionLink href="/methods#not-judged" prefetch={false}>
            What is not yet judged
          </ActionLink>
        }
      >
        Not a fit: your parameters are taken as stated. Not a verdict on a protein: a missed curve can lie in
        the data, in a statement or in the model. And never a basis for diagnosis, dosing or safety decisions.
      </HomeRow>
    </AxisFrame>
  );
}
