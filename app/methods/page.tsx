import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { AxisFrame } from '@/components/layout/axis-frame';
import { CollapseSection } from '@/components/methods/collapse-section';
import { MethodsContents } from '@/components/methods/contents';
import { ConventionsSection } from '@/components/methods/conventions-section';
import { DerivedSection } from '@/components/methods/derived-section';
import { FlagsSection } from '@/components/methods/flags-section';
import { MeasuredSection } from '@/components/methods/measured-section';
import { ModelSection } from '@/components/methods/model-section';
import { MonteCarloSection } from '@/components/methods/monte-carlo-section';
import { NormalisationSection } from '@/components/methods/normalisation-section';
import { NotJudgedSection } from '@/components/methods/not-judged-section';
import { QuickFacts } from '@/components/methods/quick-facts';
import { RangesSection } from '@/components/methods/ranges-section';
import { RefitMethodsSection } from '@/components/methods/refit-section';
import { ShapeSection } from '@/components/methods/shape-section';
import { SourcesSection } from '@/components/methods/sources-section';
import { StatementsSection } from '@/components/methods/statements-section';
import { SymbolsSection } from '@/components/methods/symbols-section';
import { UncertaintySection } from '@/components/methods/uncertainty-section';
import { VISITOR } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';

export const metadata: Metadata = {
  title: 'Methods',
  description:
    'The two-state model, the conversion of statements, uncertainties, and the policy by which points are flagged.',
};

/** The equations and the policy. */
export default function MethodsPage() {
  if (!may(VISITOR, 'read-methods')) notFound();
  return (
    <AxisFrame
      who={
        <div className="stuck-contents lg:-mt-7 lg:pt-7">
          <h1 className="head text-3xl">Methods</h1>
          <p className="mt-2 max-w-[26rem] text-lg text-soft leading-snug">
            What is computed from a laboratory’s statements, and when a point is said to miss the curve.
          </p>
          <MethodsContents />
        </div>
      }
      axis={
        <div className="border-hairline py-7 max-lg:border-y lg:px-8 lg:pb-16 xl:px-12">
          <ModelSection />
          <SymbolsSection />
          <StatementsSection />
          <RangesSection />
          <UncertaintySection />
          <MeasuredSection />
          <FlagsSection />
          <CollapseSection />
          <DerivedSection />
          <ShapeSection />
          <ConventionsSection />
          <NormalisationSection />
          <RefitMethodsSection />
          <MonteCarloSection />
          <NotJudgedSection />
          <SourcesSection />
        </div>
      }
      verdict={
        <div className="stuck-contents lg:-mt-7 lg:pt-7">
          <QuickFacts />
        </div>
      }
    />
  );
}
