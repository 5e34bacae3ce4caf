import { AxisFrame } from '@/components/layout/axis-frame';
import { CURVE_FIGURE_WINDOW, CurveFigure } from '@/components/layout/curve-figure';
import { EnergyRuler } from '@/components/layout/energy-ruler';
import { DemoAccountList } from '@/components/people/demo-account-list';
import { SignInForm } from '@/components/people/sign-in-form';
import { ActionLink } from '@/components/ui/action-link';
import { env } from '@/lib/env';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from '@/lib/people/demo-accounts';
import { signInAction } from './sign-in-action';

interface SignInViewProps {
  /** path of the page to go to afterwards */
  next: string;
  /** e-mail address of a demonstration account to fill in */
  as?: string;
  /** why one is asked */
  sentence: string;
}

/** Who are you? On the left, where every page says who; in the demonstration its accounts stand on the right. */
export function SignInView({ next, as, sentence }: SignInViewProps) {
  const { demo } = env();
  const chosen = demo ? DEMO_ACCOUNTS.find(({ email }) => email === as) : undefined;
  return (
    <AxisFrame
      who={
        <>
          <h1 className="head text-3xl">Sign in</h1>
          <p className="mt-3 mb-6 max-w-[30rem] text-lg text-soft leading-snug">{sentence}</p>
          <SignInForm
            key={chosen?.email}
            action={signInAction}
            next={next}
            email={chosen?.email}
            password={chosen && DEMO_PASSWORD}
          />
          <section aria-labelledby="no-account" className="mt-8 max-w-[30rem] border-hairline border-t pt-4">
            <h2 id="no-account" className="font-semibold">
              No account?
            </h2>
            <p className="mt-1 text-sm text-soft">
              Accounts are made by whoever runs this installation, for the members of a laboratory and for
              curators. Ask there, and say which laboratory you belong to. Nobody needs one to read and to
              check.
            </p>
            <p className="mt-2 flex flex-wrap gap-x-6 gap-y-1">
              <ActionLink href="/check" prefetch={false}>
                Check your data
              </ActionLink>
              <ActionLink href="/datasets" prefetch={false}>
                Browse datasets
              </ActionLink>
            </p>
          </section>
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
