'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { useState } from 'react';
import { type EnergyWindow, isInside } from '@/components/plots/energy-window';
import { type OverlayPoint, pointsFrom } from '@/components/plots/overlay-view';
import { type DataColumn, DataTable } from '@/components/ui/data-table';
import { formatCount, formatFixed, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import { Pager, pagesOf } from '@/components/ui/pager';
import { SelectField } from '@/components/ui/select-field';
import type { Overlay } from '@/schemas/overlay';
import { counted } from './collection-sentence';
import { countByLab, type LabCount, type MissOrder, missRows } from './miss-rows';
import { pointHref } from './point-address';

const ROWS_A_PAGE = 15;

interface OffCurveTableProps {
  overlay: Overlay;
  window: EnergyWindow;
}

const ORDERS: { value: MissOrder; label: string }[] = [
  { value: 'miss', label: 'furthest off first' },
  { value: 'energy', label: 'lowest energy first' },
];

/** The points off the curve that are shown: in whose hands, then each, a page at a time. */
export function OffCurveTable({ overlay, window }: OffCurveTableProps) {
  const [page, setPage] = useState(0);
  const [order, setOrder] = useState<MissOrder>('miss');
  const [chosen, setLab] = useState<string | null>(null);
  const points = pointsFrom(overlay.offCurve.points).filter(({ energy }) => isInside(energy, window));
  const labs = countByLab(points, overlay);
  // A laboratory that has none in what is shown now cannot be chosen any more.
  const lab = labs.some(({ slug }) => slug === chosen) ? chosen : null;
  const rows = missRows(points, overlay, { lab, order });
  const shown = Math.min(page, pagesOf(rows.length, ROWS_A_PAGE) - 1);
  const listed = rows.slice(shown * ROWS_A_PAGE, (shown + 1) * ROWS_A_PAGE);
  return (
    <section aria-label="Points off the curve" className="py-8">
      <h2 className="head text-xl">Points off the curve</h2>
      <p className="mt-1 text-soft text-sm">{sentenceOn(points.length, overlay)}</p>
      {points.length === 0 ? null : (
        <>
          <div className="mt-4 flex flex-wrap items-end justify-between gap-x-8 gap-y-3">
            <LabCounts
              labs={labs}
              all={points.length}
              chosen={lab}
              onChoose={(slug) => {
                setLab(slug);
                setPage(0);
              }}
            />
            <SelectField
              label="order"
              className="w-44"
              value={order}
              onChange={({ target }) => setOrder(target.value === 'energy' ? 'energy' : 'miss')}
              options={ORDERS}
            />
          </div>
          <ul aria-label="Points off the curve" className="mt-4 md:hidden">
            {listed.map((point) => (
              <MissEntry key={keyOf(point)} point={point} overlay={overlay} />
            ))}
          </ul>
          <DataTable
            className="mt-4 max-md:hidden"
            caption="Points off the curve"
            columns={columnsOf(overlay)}
            rows={listed}
            rowKey={keyOf}
          />
          <Pager page={shown} rows={rows.length} rowsAPage={ROWS_A_PAGE} onPage={setPage} />
        </>
      )}
    </section>
  );
}

const keyOf = ({ dataset, series, point }: OverlayPoint) => `${dataset} ${series} ${point}`;

function sentenceOn(points: number, { offCurve: { total, shown } }: Overlay): string {
  if (points === 0) return 'None lies in what is shown.';
  const rest =
    total > shown
      ? ` Of ${formatCount(total)} the furthest ${formatCount(shown)} are counted and listed.`
      : '';
  return `${counted(points, 'point')} in what is shown.${rest}`;
}

interface LabCountsProps {
  labs: readonly LabCount[];
  all: number;
  /** slug; null: all */
  chosen: string | null;
  onChoose: (slug: string | null) => void;
}

/** In whose hands the points are: each laboratory with its count, to be listed alone. */
function LabCounts({ labs, all, chosen, onChoose }: LabCountsProps) {
  const choices = [{ slug: null, name: 'All', points: all }, ...labs];
  return (
    <fieldset className="min-w-0">
      <legend className="text-sm text-soft">laboratory</legend>
      <div className="flex flex-wrap gap-x-6">
        {choices.map(({ slug, name, points }) => (
          <button
            key={slug ?? ''}
            type="button"
            aria-pressed={slug === chosen}
            onClick={() => onChoose(slug)}
            className="min-h-8 border-transparent border-b-2 text-left text-soft hover:text-ink aria-pressed:border-ink aria-pressed:font-semibold aria-pressed:text-ink"
          >
            {name} <span className="figures">{formatCount(points)}</span>
            <span className="sr-only"> {points === 1 ? 'point' : 'points'} off the curve</span>
          </button>
        ))}
      </div>
    </fieldset>
  );
}

interface MissProps {
  point: OverlayPoint;
  overlay: Overlay;
}

/** A line of the list on a narrow screen, where a table would hide its figures. */
function MissEntry({ point, overlay }: MissProps) {
  const { lab, series } = overlay.datasets[point.dataset];
  return (
    <li className="border-hairline border-b py-2.5 text-sm first:border-t">
      <MissLink point={point} overlay={overlay} />
      <p className="text-soft">
        {lab.name} · {series[point.series]}, point {point.point + 1}
      </p>
      <p className="figures">
        {formatFixed(point.activity, 3)} where {formatFixed(point.expected, 3)} is expected, at{' '}
        {formatFixed(point.energy, 2)} kT: <MathSymbol>z</MathSymbol>{' '}
        <span className="font-semibold text-off">{formatScore(point.z)}</span>
      </p>
    </li>
  );
}

function MissLink({ point, overlay }: MissProps) {
  const { accession, title } = overlay.datasets[point.dataset];
  return (
    <Link
      href={pointHref(accession, point) as Route}
      prefetch={false}
      className="inline-block min-h-6 text-act underline-offset-4 hover:underline"
    >
      <span className="figures whitespace-nowrap">{accession}</span> {title}
      <span className="sr-only">, point {point.point + 1}</span>
    </Link>
  );
}

function columnsOf(overlay: Overlay): DataColumn<OverlayPoint>[] {
  const { datasets } = overlay;
  const number = (key: 'energy' | 'activity' | 'expected', decimals: number, unit?: string) => ({
    key,
    head: key,
    unit,
    numeric: true,
    cell: (point: OverlayPoint) => formatFixed(point[key], decimals),
  });
  return [
    {
      key: 'dataset',
      head: 'dataset',
      className: 'min-w-56',
      cell: (point) => <MissLink point={point} overlay={overlay} />,
    },
    {
      key: 'lab',
      head: 'laboratory',
      cell: ({ dataset }) => <span className="whitespace-nowrap">{datasets[dataset].lab.name}</span>,
    },
    {
      key: 'series',
      head: 'series',
      unit: 'point',
      cell: ({ dataset, series, point }) => (
        <>
          {datasets[dataset].series[series]} <span className="figures text-soft">{point + 1}</span>
        </>
      ),
    },
    number('energy', 2, 'kT'),
    number('activity', 3),
    number('expected', 3),
    {
      key: 'z',
      head: <MathSymbol>z</MathSymbol>,
      numeric: true,
      cell: ({ z }) => <span className="font-semibold text-off">{formatScore(z)}</span>,
    },
  ];
}
