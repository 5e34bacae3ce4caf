import type { Route } from 'next';
import Link from 'next/link';
import { type DataColumn, DataTable } from '@/components/ui/data-table';
import { formatCount, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import { type DepositState, stateWords } from '@/lib/deposits/states';
import type { AssessmentSummary } from '@/lib/engine/assessment';
import { ageWords } from './age-words';

export interface WaitingDeposit {
  id: string;
  title: string;
  state: DepositState;
  system: string;
  labName: string;
  revision: number;
  ageMs: number;
  summary: Pick<AssessmentSummary, 'points' | 'onCurve' | 'offCurve' | 'rmsZ'>;
  /** it is of the curator’s own laboratory */
  blocked: boolean;
}

/** What waits for a decision, the longest waiting first. */
export function QueueTable({ queue }: { queue: readonly WaitingDeposit[] }) {
  return (
    <section aria-label="Queue" className="page-width grow py-7">
      <h1 className="head text-3xl">Curation</h1>
      <p className="mt-3 max-w-[40rem] text-soft">
        {queue.length === 0
          ? 'Nothing waits for a decision. What laboratories submit appears here.'
          : `${queue.length} ${queue.length === 1 ? 'deposit waits' : 'deposits wait'} for a decision, the longest waiting first.`}
      </p>
      <ul aria-label="Queue" className="mt-5 md:hidden">
        {queue.map((deposit) => (
          <QueueEntry key={deposit.id} deposit={deposit} />
        ))}
      </ul>
      {queue.length === 0 ? null : (
        <DataTable
          className="mt-5 max-md:hidden"
          caption="Deposits that wait for a decision"
          columns={COLUMNS}
          rows={queue}
          rowKey={({ id }) => id}
        />
      )}
    </section>
  );
}

/** A line of the queue on a narrow screen, where a table would hide its figures. */
function QueueEntry({ deposit }: { deposit: WaitingDeposit }) {
  const { labName, system, state, ageMs, summary } = deposit;
  return (
    <li className="border-hairline border-b py-3 text-sm first:border-t">
      <Title {...deposit} />
      <p className="text-soft">
        {labName} · {system}
      </p>
      <p>
        {stateWords(state)}, waiting {ageWords(ageMs)}
      </p>
      <p className="figures">
        {formatCount(summary.onCurve)} / {formatCount(summary.points)} on curve,{' '}
        <span className={summary.offCurve > 0 ? 'text-off' : ''}>{formatCount(summary.offCurve)} off</span>,
        RMS <MathSymbol>z</MathSymbol> {formatScore(summary.rmsZ)}
      </p>
    </li>
  );
}

function Title({ id, title, revision, blocked }: WaitingDeposit) {
  return (
    <>
      <Link
        href={`/curation/${id}` as Route}
        prefetch={false}
        className="inline-block min-h-6 break-words font-semibold text-base underline-offset-4 hover:underline"
      >
        {title}
      </Link>
      <span className="block text-soft">revision {revision}</span>
      {blocked ? (
        <span className="block text-warn">Of your own laboratory: another curator decides.</span>
      ) : null}
    </>
  );
}

const COLUMNS: DataColumn<WaitingDeposit>[] = [
  {
    key: 'title',
    head: 'deposit',
    className: 'min-w-56',
    cell: (deposit) => <Title {...deposit} />,
  },
  { key: 'lab', head: 'laboratory', className: 'min-w-36', cell: ({ labName }) => labName },
  { key: 'system', head: 'system', cell: ({ system }) => system },
  { key: 'state', head: 'state', className: 'whitespace-nowrap', cell: ({ state }) => stateWords(state) },
  { key: 'age', head: 'waiting', className: 'whitespace-nowrap', cell: ({ ageMs }) => ageWords(ageMs) },
  {
    key: 'on',
    head: 'on curve',
    unit: 'points',
    numeric: true,
    className: 'whitespace-nowrap',
    cell: ({ summary }) => `${formatCount(summary.onCurve)} / ${formatCount(summary.points)}`,
  },
  {
    key: 'off',
    head: 'off curve',
    unit: 'points',
    numeric: true,
    cell: ({ summary: { offCurve } }) => (
      <span className={offCurve > 0 ? 'font-semibold text-off' : ''}>{formatCount(offCurve)}</span>
    ),
  },
  {
    key: 'rms',
    head: (
      <>
        RMS <MathSymbol>z</MathSymbol>
      </>
    ),
    numeric: true,
    cell: ({ summary: { rmsZ } }) => (
      <span className={rmsZ > 2 ? 'font-semibold text-off' : ''}>{formatScore(rmsZ)}</span>
    ),
  },
];
