'use client';

import { type ClipboardEvent, useState } from 'react';
import { FLAG_WORDS } from '@/components/plots/plot-data';
import { Button } from '@/components/ui/button';
import { type DataColumn, DataTable } from '@/components/ui/data-table';
import { formatFixed, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import { Pager, pagesOf } from '@/components/ui/pager';
import { pointerTo } from '@/lib/documents/json-pointer';
import type { AssessedPoint } from '@/lib/engine/assessment';
import type { DraftAccess } from './draft-access';
import { listOf, objectOf, textOf } from './draft-value';
import { OddShape } from './odd-shape';
import { isBlock, type PointColumn, pastePoints } from './paste-points';
import { MeasuredCell, PointCell } from './point-cell';

export const POINTS_A_PAGE = 50;

interface PointsEditorProps {
  draft: DraftAccess;
  /** which series */
  series: number;
  page: number;
  onPage: (page: number) => void;
  /** what was computed for a point of this series as it stands; null where nothing was */
  computedAt: (index: number) => AssessedPoint | null;
  /** whether the computed figures are of what was last saved, and not of all that stands here */
  isStale: boolean;
}

/** The points of one series as a table whose cells are typed in, a page at a time. */
export function PointsEditor({ draft, series, page, onPage, computedAt, isStale }: PointsEditorProps) {
  const [pasted, setPasted] = useState('');
  const pointer = `/series/${series}/points`;
  const points = draft.at(pointer);
  const label = textOf(draft.at(`/series/${series}/label`)) || 'this series';
  if (points !== undefined && !Array.isArray(points)) return <OddShape what="The list of points" />;
  const list = listOf(points);
  const shown = Math.min(page, pagesOf(list.length, POINTS_A_PAGE) - 1);
  const from = shown * POINTS_A_PAGE;
  const rows = list.slice(from, from + POINTS_A_PAGE).map((_, i) => ({ index: from + i }));
  const columns = typedColumns(draft);
  const paste = (event: ClipboardEvent<HTMLElement>) => {
    const text = event.clipboardData.getData('text');
    const cell = (event.target as HTMLElement).closest('td');
    // The first column is the number of the point.
    const place = { row: from + rowOf(cell), column: (cell?.cellIndex ?? 0) - 1 };
    if (!isBlock(text) || place.column < 0 || place.column >= columns.length) return;
    event.preventDefault();
    const next = pastePoints(
      list,
      columns.map(({ members }) => members),
      place,
      text,
    );
    draft.set(pointer, next.points);
    setPasted(pastedWords(place.row, next));
  };
  const add = () => {
    draft.set(`${pointer}/${list.length}`, { ligands: {} });
    onPage(Math.floor(list.length / POINTS_A_PAGE));
  };
  // Figures have no columns of their own before there are any.
  const hasFigures = rows.some(({ index }) => computedAt(index) !== null);
  const computed = hasFigures ? computedColumns({ computedAt, isStale }) : [];
  return (
    <section aria-label={`Points of ${label}`} className="px-2 pb-6 max-lg:px-0" onPaste={paste}>
      {list.length === 0 ? (
        <p className="py-4 text-soft">
          No points yet. One row is one measured activity at one set of concentrations. Add one, then type, or
          paste a block of cells from a spreadsheet into its first cell.
        </p>
      ) : (
        <DataTable
          caption={`Points of ${label}, ${from + 1} to ${from + rows.length} of ${list.length}`}
          columns={[...columnsOf(columns, { draft, pointer }), ...computed, removal({ draft, pointer })]}
          rows={rows}
          rowKey={({ index }) => index}
        />
      )}
      <div className="flex flex-wrap items-baseline gap-x-8">
        <Button className="mt-3 text-sm" onClick={add}>
          Add a point
        </Button>
        {list.length > POINTS_A_PAGE ? (
          <Pager page={shown} rows={list.length} rowsAPage={POINTS_A_PAGE} onPage={onPage} />
        ) : null}
      </div>
      <p role="status" className="mt-1 text-sm text-soft empty:hidden">
        {pasted}
      </p>
    </section>
  );
}

interface PointRow {
  index: number;
}

/** How many rows of the page stand above a cell. */
function rowOf(cell: HTMLElement | null): number {
  const row = cell?.closest('tr');
  return row?.parentElement ? [...row.parentElement.children].indexOf(row) : 0;
}

function pastedWords(row: number, { rows, left }: { rows: number; left: number }): string {
  const filled =
    rows === 1 ? `Point ${row + 1} is filled.` : `Points ${row + 1} to ${row + rows} are filled.`;
  const beyond = left === 1 ? 'One column' : `${left} columns`;
  return left === 0 ? filled : `${filled} ${beyond} of the block went beyond the table and was left out.`;
}

interface TypedColumn {
  head: string;
  unit: string;
  members: PointColumn;
}

/** The columns that are typed in: concentrations, values of modulators, activity, u. */
function typedColumns(draft: DraftAccess): TypedColumn[] {
  const named = (member: 'ligands' | 'modulators') =>
    listOf(draft.at(`/${member}`))
      .map(objectOf)
      .map(({ id, name, unit }) => ({
        head: textOf(name) || textOf(id),
        unit: textOf(unit).replace('uM', 'µM'),
        members: [member, textOf(id)],
      }));
  return [
    ...named('ligands'),
    ...named('modulators'),
    { head: 'activity', unit: 'or replicates', members: ['activity'] },
    { head: 'u', unit: 'standard', members: ['u'] },
  ];
}

interface PlacedDraft {
  draft: DraftAccess;
  /** of the list of points */
  pointer: string;
}

function columnsOf(columns: readonly TypedColumn[], { draft, pointer }: PlacedDraft): DataColumn<PointRow>[] {
  return [
    {
      key: 'point',
      head: 'point',
      cell: ({ index }) => <span className="figures text-soft">{index + 1}</span>,
    },
    ...columns.map(({ head, unit, members }): DataColumn<PointRow> => {
      const isMeasured = members[0] === 'activity';
      const Cell = isMeasured ? MeasuredCell : PointCell;
      return {
        key: members.join(' '),
        head,
        unit,
        numeric: true,
        className: 'min-w-16',
        cell: ({ index }) => (
          <Cell
            draft={draft}
            pointer={pointerTo(pointer, index, ...(isMeasured ? [] : members))}
            name={`${head} of point ${index + 1}`}
          />
        ),
      };
    }),
  ];
}

function removal({ draft, pointer }: PlacedDraft): DataColumn<PointRow> {
  return {
    key: 'remove',
    head: <span className="sr-only">take away</span>,
    cell: ({ index }) => (
      <Button
        aria-label={`Take point ${index + 1} away`}
        className="-my-0.5 min-w-6 justify-center"
        onClick={() => draft.set(pointerTo(pointer, index), undefined)}
      >
        ×
      </Button>
    ),
  };
}

type ComputedProps = Pick<PointsEditorProps, 'computedAt' | 'isStale'>;

function computedColumns({ computedAt, isStale }: ComputedProps): DataColumn<PointRow>[] {
  const column = (
    key: string,
    head: DataColumn<PointRow>['head'],
    unit: string,
    cell: (point: AssessedPoint) => React.ReactNode,
  ): DataColumn<PointRow> => ({
    key,
    head,
    unit,
    numeric: true,
    className: `px-2 bg-wash ${isStale ? 'text-soft' : ''}`,
    cell: ({ index }) => {
      const point = computedAt(index);
      return point === null ? null : cell(point);
    },
  });
  return [
    column('energy', 'energy', 'kT', ({ energy }) => formatFixed(energy, 2)),
    column('expected', 'expected', isStale ? 'as saved' : '0 to 1', ({ expected }) =>
      formatFixed(expected, 3),
    ),
    column('z', <MathSymbol>z</MathSymbol>, isStale ? 'as saved' : '', ({ z, flag }) => (
      <span className={flag === 'off-curve' ? 'font-semibold text-off' : ''} title={FLAG_WORDS[flag]}>
        {formatScore(z)}
        {flag === 'on-curve' ? null : <span className="sr-only">, {FLAG_WORDS[flag]}</span>}
      </span>
    )),
  ];
}
