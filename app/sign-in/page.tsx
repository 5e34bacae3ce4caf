import type { Metadata, Route } from 'next';
import { redirect } from 'next/navigation';
import { AxisFrame } from '@/components/layout/axis-frame';
import { CURVE_FIGURE_WINDOW, CurveFigure } from '@/components/layout/curve-figure';
import { EnergyRuler } from '@/components/layout/energy-ruler';
import { DemoAccountList } from '@/components/people/demo-account-list';
import { SignInForm } from '@/components/people/sign-in-form';
import { actorOfPage } from '@/lib/auth/current-actor';
import { safeNext } from '@/lib/auth/safe-next';
import { env } from '@/lib/env';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from '@/lib/people/demo-accounts';
import { signInAction } from './sign-in-action';

export const metadata: Metadata = { title: 'Sign in', robots: { index: false } };

interface SignInPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** Who are you? On the left, where every page says who; in the demonstration its accounts stand on the right. */
export default async function SignInPage({ searchParams }: SignInPageProps) {
  const { next: wanted, as } = await searchParams;
  const next = safeNext(wanted);
  if ((await actorOfPage()).kind === 'person') redirect(next as Route);
  const { demo } = env();
  const chosen = demo ? DEMO_ACCOUNTS.find(({ email }) => email === as) : undefined;
  return (
    <AxisFrame
      who={
        <>
          <h1 className="head text-3xl">Sign in</h1>
          <p className="mt-3 mb-6 max-w-[30rem] text-lg text-soft leading-snug">
            To deposit for your laboratory or to curate. Reading and checking need no account.
          </p>
          <SignInForm
            key={chosen?.email}
            action={signInAction}
            next={next}
            email={chosen?.email}
            password={chosen && DEMO_PASSWORD}
          />
        </>
      }
      axis={
        <div className="max-lg:hidden">
          <CurveFigure />
          <div className="border-ink border-y">
            <EnergyRuler {...CURVE_FIGURE_WINDOW} />
          </div>
        </div>
      }
      verdict={
        demo ? <DemoAccountList accounts={DEMO_ACCOUNTS} password={DEMO_PASSWORD} next={next} /> : null
      }
    />
  );
}
