'use client';

import { useState } from 'react';
import { SeriesDot } from '@/components/assessed/series-dot';
import type { PlotData, PlotSeries } from '@/components/plots/plot-data';
import { type DataColumn, DataTable } from '@/components/ui/data-table';
import { Pager, pagesOf } from '@/components/ui/pager';
import { Quantity } from '@/components/ui/quantity';
import { unitLabel } from '@/components/ui/unit-label';
import type { DerivedQuantities, Estimate } from '@/lib/engine/assessment';

const ROWS_A_PAGE = 25;

interface DerivedRow {
  key: string;
  series: PlotSeries;
  ligand: string;
  derived: DerivedQuantities;
}

/** What the statements of every series predict for each ligand alone, with uncertainties; why some of it does not exist. */
export function DerivedTable({ data, isTrial = false }: { data: PlotData; isTrial?: boolean }) {
  const [page, setPage] = useState(0);
  const rows = rowsOf(data);
  const reasons = reasonsOf(data);
  if (rows.length === 0 && reasons.length === 0) return null;
  const shown = Math.min(page, pagesOf(rows.length, ROWS_A_PAGE) - 1);
  return (
    <section aria-labelledby="derived" className="border-hairline border-t py-8">
      <h2 id="derived" className="head text-xl">
        What the {isTrial ? 'tried reading predicts' : 'statements predict'}
      </h2>
      <p className="mt-1 text-sm text-soft">
        Each ligand alone, modulators at their references; with standard uncertainties from those stated.
      </p>
      {rows.length === 0 ? null : (
        <>
          <DataTable
            className="mt-4"
            caption="Derived quantities of each series and ligand"
            columns={columnsOf(data, rows)}
            rows={rows.slice(shown * ROWS_A_PAGE, (shown + 1) * ROWS_A_PAGE)}
            rowKey={({ key }) => key}
          />
          {rows.length > ROWS_A_PAGE ? (
            <Pager page={shown} rows={rows.length} rowsAPage={ROWS_A_PAGE} onPage={setPage} />
          ) : null}
        </>
      )}
      {reasons.length === 0 ? null : (
        <ul className="mt-3 max-w-[46rem] space-y-1 text-sm text-soft">
          {reasons.map(({ detail, labels }) => (
            <li key={detail}>
              <span className="font-semibold">
                {labels.length === data.series.length && labels.length > 1 ? 'All series' : labels.join(', ')}
                :
              </span>{' '}
              {detail}
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}

function rowsOf({ document, series }: PlotData): DerivedRow[] {
  const nameOf = (id: string) => document.ligands.find((ligand) => ligand.id === id)?.name ?? id;
  return series.flatMap((one) =>
    one.assessed.derived.map((derived) => ({
      key: `${one.stated.id} ${derived.ligand}`,
      series: one,
      ligand: nameOf(derived.ligand),
      derived,
    })),
  );
}

/** Why quantities do not exist, each reason once with the series that it holds for. */
function reasonsOf({ series }: PlotData): { detail: string; labels: string[] }[] {
  const found = new Map<string, string[]>();
  for (const { assessed, label } of series) {
    for (const { code, detail } of assessed.notes) {
      if (code === 'derived-not-defined') found.set(detail, [...(found.get(detail) ?? []), label]);
    }
  }
  return [...found].map(([detail, labels]) => ({ detail, labels }));
}

function columnsOf(data: PlotData, rows: readonly DerivedRow[]): DataColumn<DerivedRow>[] {
  const units = new Set(rows.map(({ derived }) => derived.unit));
  const [unit] = units.size === 1 ? units : [null];
  const column = (
    key: string,
    head: string,
    of: (derived: DerivedQuantities) => Estimate | null,
    concentration = false,
  ): DataColumn<DerivedRow> => ({
    key,
    head,
    unit: concentration ? (unit === null ? '± u' : `${unitLabel(unit)}, ± u`) : '± u',
    numeric: true,
    cell: ({ derived }) => (
      <EstimateCell
        estimate={of(derived)}
        unit={concentration && unit === null ? unitLabel(derived.unit) : undefined}
      />
    ),
  });
  return [
    {
      key: 'series',
      head: 'series',
      // The name stays in view where the table scrolls.
      className: 'sticky left-0 bg-ground',
      cell: ({ series }) => (
        <span className="flex items-baseline gap-2">
          <SeriesDot colour={series.colour} />
          <span className="max-w-[14rem] truncate max-sm:max-w-[7rem]">{series.label}</span>
        </span>
      ),
    },
    ...(data.document.ligands.length > 1
      ? [{ key: 'ligand', head: 'ligand', unit: 'alone', cell: ({ ligand }: DerivedRow) => ligand }]
      : []),
    column('leakiness', 'without ligand', ({ leakiness }) => leakiness),
    column('saturation', 'at saturation', ({ saturation }) => saturation),
    column('range', 'range', ({ dynamicRange }) => dynamicRange),
    column('ec50', 'EC50', ({ ec50 }) => ec50, true),
    column('half', 'half activity', ({ halfActivity }) => halfActivity, true),
    column('hill', 'effective Hill', ({ effectiveHill }) => effectiveHill),
  ];
}

function EstimateCell({ estimate, unit }: { estimate: Estimate | null; unit?: string }) {
  if (estimate === null) return <span className="whitespace-nowrap text-soft">does not exist</span>;
  return <Quantity value={estimate.value} u={estimate.u} unit={unit} />;
}
