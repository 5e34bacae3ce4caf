import type { ReactNode } from 'react';
import { POLICY } from '@/lib/engine/flags';
import { ENGINE_VERSION } from '@/lib/engine/version';

function Fact({ name, children }: { name: ReactNode; children: ReactNode }) {
  return (
    <div className="flex items-baseline justify-between gap-4 border-hairline border-b py-1.5">
      <dt className="text-soft">{name}</dt>
      <dd className="figures text-right">{children}</dd>
    </div>
  );
}

/** What an assessment is computed with, at a glance. */
export function QuickFacts() {
  return (
    <>
      <p className="head figures text-4xl">{ENGINE_VERSION}</p>
      <p className="mt-1 text-sm text-soft">version of the engine</p>
      <dl className="mt-5 border-hairline border-t text-sm">
        <Fact name="Policy">{POLICY.number}</Fact>
        <Fact name="Warning below p">{POLICY.warningBelow.toFixed(5)}</Fact>
        <Fact name="Off curve below p">{POLICY.offCurveBelow.toFixed(5)}</Fact>
        <Fact name="Model floor">{POLICY.modelFloor}</Fact>
        <Fact name="Assumed uncertainty">{POLICY.assumedActivityU}</Fact>
      </dl>
      <p className="mt-4 text-sm text-soft">
        Every assessment records the version and the policy that made it, and never changes afterwards.
      </p>
    </>
  );
}
