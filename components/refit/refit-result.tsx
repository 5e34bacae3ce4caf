'use client';

import type { TrialSubject, Trials } from '@/components/reasons/use-trial';
import { Button } from '@/components/ui/button';
import { type DataColumn, DataTable } from '@/components/ui/data-table';
import { Disclosure } from '@/components/ui/disclosure';
import { formatCount, formatFixed, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import { Quantity } from '@/components/ui/quantity';
import { unitLabel } from '@/components/ui/unit-label';
import type { RefitEstimate, RefitResult } from '@/lib/engine/refit';
import { type EstimateRow, estimateRows } from './estimate-rows';
import { ParameterName } from './parameter-name';
import type { Refitted } from './use-refit';

/** Beyond so many values a matrix is no longer read. */
const MOST_IN_MATRIX = 40;

interface RefitResultProps {
  refitted: Refitted;
  trials: Trials;
}

/** What the points themselves would give, beside what was stated; what they leave open, in words. */
export function RefitOutcome({ refitted: { document, result }, trials }: RefitResultProps) {
  const rows = estimateRows(document, result);
  const open = rows.filter(({ estimate }) => !estimate.determined);
  const subject: TrialSubject = {
    key: TRIAL_KEY,
    noun: 'the refitted values',
    label: null,
    index: null,
    reading: { kind: 'refit', result },
  };
  const isTried =
    trials.trial?.subject.reading === subject.reading || trials.trial?.subject.key === TRIAL_KEY;
  return (
    <div className="mt-6">
      <p role="status">
        <span className="font-semibold">{headline(result)}</span> <QualitySentence result={result} />
      </p>
      {open.length > 0 ? (
        <p className="mt-1 text-warn">
          {open.length === rows.length ? 'None of these values is' : `${counted(open.length)} not`} determined
          by these data: other values would fit the points as well.
        </p>
      ) : null}
      <DataTable
        className="mt-4 max-w-[60rem]"
        caption="Refitted values beside those stated"
        columns={columnsOf(rows)}
        rows={rows}
        rowKey={({ key }) => key}
      />
      <p className="mt-4 flex flex-wrap items-baseline gap-x-5 gap-y-1">
        {isTried ? (
          <Button onClick={trials.stop}>Back to what was stated</Button>
        ) : (
          <Button
            aria-label="Try it: the refitted values"
            disabled={trials.pending === TRIAL_KEY}
            onClick={() => trials.start(subject)}
          >
            {trials.pending === TRIAL_KEY ? 'Trying it …' : 'Try it'}
          </Button>
        )}
        <span className="text-sm text-soft">
          A refit is a suggestion. Published parameters are those that a laboratory states.
        </span>
      </p>
      {trials.failure?.key === TRIAL_KEY ? (
        <p role="alert" className="mt-1 text-off text-sm">
          It could not be tried: {trials.failure.detail}
        </p>
      ) : null}
      {rows.length > 1 && rows.length <= MOST_IN_MATRIX ? (
        <Disclosure className="mt-4" summary="Correlations of the refitted values">
          <DataTable
            caption="Correlations of the refitted values"
            columns={correlationColumns(rows, result)}
            rows={rows}
            rowKey={({ key }) => key}
          />
          <p className="mt-2 text-sm text-soft">
            Constants and numbers of sites by their logarithms, as they were fitted. Near 1 or {'\u2212'}1 the
            points tell only a combination of two values.
          </p>
        </Disclosure>
      ) : null}
    </div>
  );
}

const TRIAL_KEY = 'refit';

function counted(count: number): string {
  return count === 1 ? 'One value is' : `${formatCount(count)} values are`;
}

function headline({ converged, iterations, estimates }: RefitResult): string {
  if (!converged && iterations <= 1 && estimates.every(({ determined }) => !determined))
    return 'The points do not respond to these values where they start: state values nearer to the truth first.';
  return converged
    ? `Converged after ${formatCount(iterations)} ${iterations === 1 ? 'iteration' : 'iterations'}.`
    : `Did not converge within ${formatCount(iterations)} iterations; the values are where it stood.`;
}

function QualitySentence({ result }: { result: RefitResult }) {
  const { chiSquared, degreesOfFreedom, reducedChiSquared } = result;
  if (reducedChiSquared === null)
    return <>No degrees of freedom are left: there are as many values as points, or more.</>;
  return (
    <span className="figures">
      Weighted squares sum to {formatScore(chiSquared)} for {formatCount(degreesOfFreedom)} degrees of
      freedom: reduced <MathSymbol>χ</MathSymbol>
      <sup>2</sup> is {formatScore(reducedChiSquared)}.
    </span>
  );
}

function unitOf({ unit, parameter }: RefitEstimate): string {
  if (unit === null) return '';
  return parameter === 'slope' ? `${unit} per unit` : unit === 'kT' ? unit : unitLabel(unit);
}

function columnsOf(rows: readonly EstimateRow[]): DataColumn<EstimateRow>[] {
  const isMixed = rows.some(({ series }) => series !== null);
  return [
    {
      key: 'parameter',
      head: 'parameter',
      cell: ({ parameter, series }) => (
        <>
          <ParameterName name={parameter} />
          {isMixed ? <span className="text-soft max-sm:block"> {series ?? 'shared'}</span> : null}
        </>
      ),
    },
    {
      key: 'stated',
      head: 'stated',
      unit: '± u',
      numeric: true,
      cell: ({ estimate, statedU }) => (
        <Quantity value={estimate.stated} u={statedU ?? 0} unit={unitOf(estimate)} />
      ),
    },
    {
      key: 'refitted',
      head: 'refitted',
      unit: '± standard error',
      numeric: true,
      cell: ({ estimate }) =>
        estimate.determined ? (
          <Quantity value={estimate.value} u={estimate.u ?? 0} unit={unitOf(estimate)} />
        ) : (
          <span className="inline-block max-w-[14rem] text-warn max-sm:max-w-[8rem]">
            <Quantity value={Number(estimate.value.toPrecision(2))} unit={unitOf(estimate)} />, not determined
            by these data
          </span>
        ),
    },
    {
      key: 'difference',
      head: 'difference',
      unit: 'combined u',
      numeric: true,
      cell: ({ difference, estimate }) =>
        difference === null || !estimate.determined ? (
          <span className="text-soft">–</span>
        ) : (
          <span className={Math.abs(difference) > 3 ? 'font-semibold text-off' : ''}>
            {formatScore(difference)}
          </span>
        ),
    },
  ];
}

function correlationColumns(
  rows: readonly EstimateRow[],
  { correlations }: RefitResult,
): DataColumn<EstimateRow>[] {
  return [
    {
      key: 'name',
      head: 'value',
      cell: ({ number, parameter, series }) => (
        <span className="whitespace-nowrap">
          <span className="figures text-soft">{number}</span> {parameter}
          {series ? `, ${series}` : ''}
        </span>
      ),
    },
    ...rows.map(
      (column): DataColumn<EstimateRow> => ({
        key: column.key,
        head: (
          <>
            <span aria-hidden="true">{column.number}</span>
            <span className="sr-only">
              {column.parameter}
              {column.series ? `, ${column.series}` : ''}
            </span>
          </>
        ),
        numeric: true,
        cell: (row) => {
          const r = correlations[row.number - 1][column.number - 1];
          if (r === null) return <span className="text-soft">–</span>;
          const isSelf = row.number === column.number;
          const strong = !isSelf && Math.abs(r) > 0.95;
          return (
            <span className={strong ? 'font-semibold text-warn' : isSelf ? 'text-soft' : ''}>
              {formatFixed(r, 2)}
            </span>
          );
        },
      }),
    ),
  ];
}
