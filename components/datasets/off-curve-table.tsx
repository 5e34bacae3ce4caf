'use client';

import Link from 'next/link';
import { useState } from 'react';
import { type EnergyWindow, isInside } from '@/components/plots/energy-window';
import { type OverlayPoint, pointsFrom } from '@/components/plots/overlay-view';
import { type DataColumn, DataTable } from '@/components/ui/data-table';
import { formatCount, formatFixed, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import { Pager, pagesOf } from '@/components/ui/pager';
import type { Overlay } from '@/schemas/overlay';
import { counted } from './collection-sentence';

const ROWS_A_PAGE = 15;

interface OffCurveTableProps {
  overlay: Overlay;
  window: EnergyWindow;
}

/** The points off the curve that are shown, the furthest first, a page at a time. */
export function OffCurveTable({ overlay, window }: OffCurveTableProps) {
  const [page, setPage] = useState(0);
  const rows = pointsFrom(overlay.offCurve.points)
    .filter(({ energy }) => isInside(energy, window))
    .sort((a, b) => Math.abs(b.z) - Math.abs(a.z));
  const shown = Math.min(page, pagesOf(rows.length, ROWS_A_PAGE) - 1);
  const { total, shown: listed } = overlay.offCurve;
  return (
    <section aria-label="Points off the curve" className="py-8">
      <h2 className="head text-xl">Points off the curve</h2>
      <p className="mt-1 text-soft text-sm">
        {rows.length === 0
          ? 'None lies in what is shown.'
          : `${counted(rows.length, 'point')} in what is shown, the furthest first.`}
        {total > listed ? ` Of ${formatCount(total)} the furthest ${formatCount(listed)} are listed.` : ''}
      </p>
      {rows.length === 0 ? null : (
        <>
          <DataTable
            className="mt-4"
            caption="Points off the curve, the furthest first"
            columns={columnsOf(overlay)}
            rows={rows.slice(shown * ROWS_A_PAGE, (shown + 1) * ROWS_A_PAGE)}
            rowKey={({ dataset, series, point }) => `${dataset} ${series} ${point}`}
          />
          <Pager page={shown} rows={rows.length} rowsAPage={ROWS_A_PAGE} onPage={setPage} />
        </>
      )}
    </section>
  );
}

function columnsOf({ datasets }: Overlay): DataColumn<OverlayPoint>[] {
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
      cell: ({ dataset }) => (
        <Link
          href={`/datasets/${datasets[dataset].accession}`}
          prefetch={false}
          className="inline-block min-h-6 text-act underline-offset-4 hover:underline"
        >
          <span className="figures">{datasets[dataset].accession}</span> {datasets[dataset].title}
        </Link>
      ),
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
