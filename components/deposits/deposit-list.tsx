import type { Route } from 'next';
import Link from 'next/link';
import type { ReactNode } from 'react';
import { AxisFrame } from '@/components/layout/axis-frame';
import { ActionLink } from '@/components/ui/action-link';
import { formatCount } from '@/components/ui/format-quantity';
import { type DepositState, stateWords } from '@/lib/deposits/states';
import type { AssessmentSummary } from '@/lib/engine/assessment';
import type { PublicationDay } from '@/schemas/deposit';
import { Moment } from './moment';
import { nextStep } from './state-sentence';

export interface ListedDeposit {
  id: string;
  title: string;
  state: DepositState;
  system: string;
  labName: string;
  errorCount: number;
  updatedAt: number;
  accession: string | null;
  /** the day for which an accepted one waits */
  publication: PublicationDay | null;
  /** of the newest revision; null where nothing was submitted yet */
  summary: Pick<AssessmentSummary, 'points' | 'offCurve'> | null;
}

interface DepositListProps {
  deposits: readonly ListedDeposit[];
  state: DepositState | null;
  /** the states that can be asked for */
  states: readonly DepositState[];
  /** whether the person belongs to several laboratories */
  severalLabs: boolean;
  /** address of the next page; null on the last */
  next: string | null;
  /** the way to a new draft */
  begin: ReactNode;
}

/** The deposits of the person’s laboratories, the last changed first. */
export function DepositList({ deposits, state, states, severalLabs, next, begin }: DepositListProps) {
  return (
    <AxisFrame
      who={
        <>
          <h1 className="head text-3xl">Deposits</h1>
          <p className="mt-3 text-soft">
            What your laboratory has brought in, on its way to the master curve.
          </p>
          <StateFilter states={states} chosen={state} />
        </>
      }
      axis={
        deposits.length === 0 ? (
          <p className="px-4 py-8 text-lg text-soft max-lg:px-0">
            {state === null
              ? 'Nothing deposited yet. Check your data first, and keep them as a draft from there; or begin with an empty one.'
              : `No deposit of your laboratory is ${stateWords(state)}.`}
          </p>
        ) : (
          <>
            <ul aria-label="Deposits">
              {deposits.map((deposit) => (
                <DepositRow key={deposit.id} deposit={deposit} severalLabs={severalLabs} />
              ))}
            </ul>
            {next ? (
              <p className="px-4 py-4 max-lg:px-0">
                <ActionLink href={next as Route}>Older ones</ActionLink>
              </p>
            ) : null}
          </>
        )
      }
      verdict={
        <>
          {begin}
          <p className="mt-4 flex flex-col items-start gap-1.5">
            <ActionLink href="/check" prefetch={false}>
              Check data first
            </ActionLink>
            <span className="text-sm text-soft">
              Paste a document or a table, see what misses the curve, and keep it as a draft.
            </span>
          </p>
        </>
      }
    />
  );
}

function StateFilter({ states, chosen }: { states: readonly DepositState[]; chosen: DepositState | null }) {
  const options = [null, ...states];
  return (
    <nav aria-label="Filter by state" className="mt-6 border-ink border-t pt-3">
      <ul className="flex flex-wrap gap-x-5 lg:block">
        {options.map((state) => (
          <li key={state ?? ''}>
            <Link
              href={(state === null ? '/deposits' : `/deposits?state=${state}`) as Route}
              aria-current={state === chosen ? 'true' : undefined}
              className="inline-flex min-h-7 items-center text-soft hover:text-ink aria-[current=true]:font-semibold aria-[current=true]:text-ink"
            >
              {state === null ? 'all states' : stateWords(state)}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}

function DepositRow({ deposit, severalLabs }: { deposit: ListedDeposit; severalLabs: boolean }) {
  const { id, title, state, system, labName, errorCount, updatedAt, accession, publication, summary } =
    deposit;
  const about = [severalLabs ? labName : '', system, accession ?? ''].filter(Boolean).join(' · ');
  return (
    <li className="grid gap-x-6 gap-y-1 border-hairline border-b px-4 py-3.5 hover:bg-wash max-lg:px-0 sm:grid-cols-[minmax(0,1fr)_13rem]">
      <div className="min-w-0">
        <Link
          href={`/deposits/${id}` as Route}
          prefetch={false}
          className="break-words font-semibold underline-offset-4 hover:underline"
        >
          {title || 'Untitled draft'}
        </Link>
        <p className="text-sm text-soft">{about}</p>
        <p className="text-sm text-soft">
          Changed <Moment at={updatedAt} />
        </p>
      </div>
      <div>
        <p className="font-semibold">{stateWords(state)}</p>
        <p className="text-sm text-soft">{nextStep(state, errorCount, publication)}</p>
        {summary ? (
          <p className="figures text-sm">
            <span className={summary.offCurve > 0 ? 'text-off' : ''}>
              {formatCount(summary.offCurve)} off curve
            </span>{' '}
            of {formatCount(summary.points)} points
          </p>
        ) : null}
      </div>
    </li>
  );
}
