'use client';

import { useState } from 'react';
import { type EnergyWindow, isInside } from '@/components/plots/energy-window';
import { FlagMark } from '@/components/plots/flag-mark';
import { concentrationAt, FLAG_WORDS, type PlotData, pointsOf } from '@/components/plots/plot-data';
import { type DataColumn, DataTable } from '@/components/ui/data-table';
import { formatNumber, formatPValue, formatScore } from '@/components/ui/format-quantity';
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
  /** begin with the warnings and off-curve points, the furthest first */
  flaggedFirst?: boolean;
}

const ORDERS: { value: PointOrder; label: string }[] = [
  { value: 'measured', label: 'as measured' },
  { value: 'miss', label: 'furthest off first' },
  { value: 'energy', label: 'lowest energy first' },
];

/** The points of all charts on the page as a table, a page at a time. */
export function PointTable({ data, window, flaggedFirst = false }: PointTableProps) {
  const [series, setSeries] = useState('all');
  const [flag, setFlag] = useState(flaggedFirst ? 'flagged' : 'all');
  const [order, setOrder] = useState<string>(flaggedFirst ? 'miss' : 'measured');
  const [page, setPage] = useState(0);
  const rows = pointRows(data, {
    series: series === 'all' ? null : Number(series),
    flag: flag === 'all' ? null : (flag as FlagChoice),
    window,
    order: order as PointOrder,
  });
  const isWhole = pointsOf(data).every(({ energy }) => isInside(energy, window));
  const shown = Math.min(page, pagesOf(rows.length, ROWS_A_PAGE) - 1);
  const choose = (set: (value: string) => void) => (event: { target: { value: string } }) => {
    set(event.target.value);
    setPage(0);
  };
  return (
    <section aria-label="Points as a table" id="points" className="py-8">
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <h2 className="head text-xl">{isWhole ? 'Points' : 'Points within the window of energies'}</h2>
        <div className="flex flex-wrap items-end gap-4">
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
          />
          <Pager page={shown} rows={rows.length} rowsAPage={ROWS_A_PAGE} onPage={setPage} />
        </>
      )}
    </section>
  );
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
