import { ActionLink } from '@/components/ui/action-link';

/** What the place is for, in a sentence, and the two ways into it. */
export function HomePurpose() {
  return (
    <>
      <h1 className="head text-3xl">Do your points fall on the master curve?</h1>
      <p className="mt-3 max-w-[30rem] text-lg text-soft leading-snug">
        Curvekeep recomputes every point’s free-energy coordinate from the parameters that a laboratory itself
        states, puts all its curves on one, and shows which points miss it.
      </p>
      <p className="mt-6 flex flex-wrap items-center gap-x-6 gap-y-3">
        <ActionLink href="/check" prefetch={false} variant="primary">
          Check your data
        </ActionLink>
        <ActionLink href="/deposits" prefetch={false}>
          Deposit a dataset
        </ActionLink>
      </p>
    </>
  );
}
