'use client';

import Link from 'next/link';
import { useState } from 'react';
import { type EnergyWindow, isInside } from '@/components/plots/energy-window';
import { FlagMark } from '@/components/plots/flag-mark';
import {
  concentrationAt,
  FLAG_WORDS,
  type PlotData,
  type PointPlace,
  pointsOf,
} from '@/components/plots/plot-data';
import { Button } from '@/components/ui/button';
import { type DataColumn, DataTable } from '@/components/ui/data-table';
import {
  formatCount,
  formatFixed,
  formatNumber,
  formatPValue,
  formatScore,
} from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import { Pager, pagesOf } from '@/components/ui/pager';
import { Quantity } from '@/components/ui/quantity';
import { SelectField } from '@/components/ui/select-field';
import { unitLabel } from '@/components/ui/unit-label';
import { type FlagChoice, type PointOrder, type PointTableRow, pointRows } from './point-rows';

const ROWS_A_PAGE = 25;

interface PointTableProps {
  data: PlotData;
  window: EnergyWindow;
  /** widens the window to all energies */
  onAll: () => void;
  /** begin with the warnings and off-curve points, the furthest first */
  flaggedFirst?: boolean;
  /** the point that the page was opened at: the table opens where it stands */
  marked?: PointPlace | null;
}

const ORDERS: { value: PointOrder; label: string }[] = [
  { value: 'measured', label: 'as measured' },
  { value: 'miss', label: 'furthest off first' },
  { value: 'energy', label: 'lowest energy first' },
];

/** The points of all charts on the page as a table, a page at a time. */
export function PointTable({ data, window, onAll, flaggedFirst = false, marked = null }: PointTableProps) {
  const opening = openingChoices(data, window, { flaggedFirst, marked });
  const [series, setSeries] = useState('all');
  const [flag, setFlag] = useState<string>(opening.flag);
  const [order, setOrder] = useState<string>(opening.order);
  const [page, setPage] = useState(opening.page);
  const rows = pointRows(data, {
    series: series === 'all' ? null : Number(series),
    flag: flag === 'all' ? null : (flag as FlagChoice),
    window,
    order: order as PointOrder,
  });
  const outside = pointsOf(data).filter(({ energy }) => !isInside(energy, window));
  const isWhole = outside.length === 0;
  const markedKey = marked === null ? null : keyOf(marked);
  const shown = Math.min(page, pagesOf(rows.length, ROWS_A_PAGE) - 1);
  const choose = (set: (value: string) => void) => (event: { target: { value: string } }) => {
    set(event.target.value);
    setPage(0);
  };
  return (
    <section aria-label="Points as a table" id="points" className="py-8">
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <h2 className="head text-xl">{isWhole ? 'Points' : 'Points within the window of energies'}</h2>
        <div className="no-print flex flex-wrap items-end gap-4">
          <SelectField
            label="series"
            className="w-44"
            value={series}
            onChange={choose(setSeries)}
            options={[
              { value: 'all', label: 'all series' },
              ...data.series.map(({ label }, i) => ({ value: String(i), label })),
            ]}
          />
          <SelectField
            label="flag"
            className="w-32"
            value={flag}
            onChange={choose(setFlag)}
            options={[
              { value: 'all', label: 'all flags' },
              { value: 'flagged', label: 'flagged' },
              ...Object.entries(FLAG_WORDS).map(([value, label]) => ({ value, label })),
            ]}
          />
          <SelectField
            label="order"
            className="w-40"
            value={order}
            onChange={choose(setOrder)}
            options={ORDERS}
          />
        </div>
      </div>
      {isWhole ? null : (
        <p className="mt-1.5 text-sm text-soft">
          {outsideWords(outside.map(({ energy }) => energy))}{' '}
          <Button className="no-print" onClick={onAll}>
            Show all
          </Button>
        </p>
      )}
      <p className="mt-1.5 max-w-[46rem] text-sm text-soft">
        <MathSymbol>z</MathSymbol> is the residual in standard uncertainties, <MathSymbol>p</MathSymbol> its
        two-sided probability, <MathSymbol>q</MathSymbol> that probability corrected for the number of points;{' '}
        <Link href="/methods#flags" prefetch={false} className="text-act underline underline-offset-4">
          how flags follow
        </Link>
        .
      </p>
      {rows.length === 0 ? (
        <p className="mt-4 text-soft">No point of this series and flag lies in the window of energies.</p>
      ) : (
        <>
          <DataTable
            className="mt-4"
            caption={`Points ${shown * ROWS_A_PAGE + 1} to ${Math.min(rows.length, (shown + 1) * ROWS_A_PAGE)} of ${rows.length}`}
            columns={columnsOf(data)}
            rows={rows.slice(shown * ROWS_A_PAGE, (shown + 1) * ROWS_A_PAGE)}
            rowKey={({ key }) => key}
            isMarked={({ key }) => key === markedKey}
          />
          <Pager page={shown} rows={rows.length} rowsAPage={ROWS_A_PAGE} onPage={setPage} />
        </>
      )}
    </section>
  );
}

const keyOf = ({ series, point }: PointPlace) => `${series}/${point}`;

/** What the table opens with: the flagged points, unless the point that is meant is none; and the page it stands on. */
function openingChoices(
  data: PlotData,
  window: EnergyWindow,
  { flaggedFirst, marked }: { flaggedFirst: boolean; marked: PointPlace | null },
) {
  const placeIn = (flag: 'flagged' | null, order: PointOrder) =>
    marked === null
      ? -1
      : pointRows(data, { series: null, flag, window, order }).findIndex(({ key }) => key === keyOf(marked));
  const flagged = placeIn('flagged', 'miss');
  if (flaggedFirst && (marked === null || flagged >= 0))
    return { flag: 'flagged', order: 'miss', page: pageOf(flagged) };
  return { flag: 'all', order: 'measured', page: pageOf(placeIn(null, 'measured')) };
}

const pageOf = (place: number) => Math.max(0, Math.floor(place / ROWS_A_PAGE));

/** How many points the window leaves out, and where one or two of them are. */
function outsideWords(energies: readonly number[]): string {
  const where =
    energies.length <= 2 ? ` (at ${energies.map((one) => `${formatFixed(one, 1)} kT`).join(' and ')})` : '';
  return energies.length === 1
    ? `1 point lies outside the window${where}.`
    : `${formatCount(energies.length)} points lie outside the window${where}.`;
}

function columnsOf(data: PlotData): DataColumn<PointTableRow>[] {
  return [
    {
      key: 'series',
      head: 'series',
      unit: 'point',
      cell: ({ series, point }) => (
        <>
          {series.label} <span className="figures text-soft">{point.index + 1}</span>
        </>
      ),
    },
    ...data.document.ligands.map(({ id, name, unit }) => ({
      key: `ligand ${id}`,
      head: name,
      unit: unitLabel(unit),
      numeric: true,
      cell: ({ series, point }: PointTableRow) => (
        <Quantity value={concentrationAt(series, point.index, id)} />
      ),
    })),
    ...(data.document.modulators ?? []).map(({ id, name, unit }) => ({
      key: `modulator ${id}`,
      head: name,
      unit,
      numeric: true,
      cell: ({ series, point }: PointTableRow) => {
        const value = series.stated.points[point.index].modulators?.[id];
        return value === undefined ? 'reference' : formatNumber(value);
      },
    })),
    {
      key: 'activity',
      head: 'activity',
      unit: '± u',
      numeric: true,
      cell: ({ point }) => (
        <>
          <Quantity value={point.activity} u={point.activityU} />
          {point.uncertainty === 'assumed' ? ' assumed' : ''}
        </>
      ),
    },
    {
      key: 'energy',
      head: 'energy',
      unit: 'kT',
      numeric: true,
      cell: ({ point }) => <Quantity value={point.energy} u={point.energyU} />,
    },
    {
      key: 'expected',
      head: 'expected',
      unit: '± u',
      numeric: true,
      cell: ({ point }) => <Quantity value={point.expected} u={point.expectedU} />,
    },
    {
      key: 'residual',
      head: 'residual',
      unit: '± u',
      numeric: true,
      cell: ({ point }) => <Quantity value={point.residual} u={point.residualU} />,
    },
    {
      key: 'z',
      head: <MathSymbol>z</MathSymbol>,
      numeric: true,
      cell: ({ point }) => (
        <span className={point.flag === 'off-curve' ? 'font-semibold text-off' : ''}>
          {formatScore(point.z)}
        </span>
      ),
    },
    {
      key: 'p',
      head: <MathSymbol>p</MathSymbol>,
      numeric: true,
      cell: ({ point }) => formatPValue(point.pValue),
    },
    { key: 'q', head: <MathSymbol>q</MathSymbol>, numeric: true, cell: ({ point }) => formatPValue(point.q) },
    {
      key: 'flag',
      head: 'flag',
      cell: ({ point }) => (
        <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
          <FlagMark flag={point.flag} />
          {FLAG_WORDS[point.flag]}
        </span>
      ),
    },
  ];
}
