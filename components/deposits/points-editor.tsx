'use client';

import { FLAG_WORDS } from '@/components/plots/plot-data';
import { Button } from '@/components/ui/button';
import { type DataColumn, DataTable } from '@/components/ui/data-table';
import { formatFixed, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';
import { Pager, pagesOf } from '@/components/ui/pager';
import { pointerTo } from '@/lib/documents/json-pointer';
import type { AssessedPoint } from '@/lib/engine/assessment';
import type { DraftAccess } from './draft-access';
import { isObject, listOf, objectOf, textOf } from './draft-value';
import { OddShape } from './odd-shape';
import { PointCell } from './point-cell';

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
  const pointer = `/series/${series}/points`;
  const points = draft.at(pointer);
  const label = textOf(draft.at(`/series/${series}/label`)) || 'this series';
  if (points !== undefined && !Array.isArray(points)) return <OddShape what="The list of points" />;
  const list = listOf(points);
  const shown = Math.min(page, pagesOf(list.length, POINTS_A_PAGE) - 1);
  const from = shown * POINTS_A_PAGE;
  const rows = list.slice(from, from + POINTS_A_PAGE).map((point, i) => ({ index: from + i, point }));
  const add = () => {
    draft.set(`${pointer}/${list.length}`, { ligands: {} });
    onPage(Math.floor(list.length / POINTS_A_PAGE));
  };
  return (
    <section aria-label={`Points of ${label}`} className="px-2 pb-6 max-lg:px-0">
      {list.length === 0 ? (
        <p className="py-4 text-soft">
          No points yet. One row is one measured activity at one set of concentrations.
        </p>
      ) : (
        <DataTable
          caption={`Points of ${label}, ${from + 1} to ${from + rows.length} of ${list.length}`}
          columns={columnsOf({ draft, pointer, series, computedAt, isStale })}
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
    </section>
  );
}

interface PointRow {
  index: number;
  point: unknown;
}

type ColumnsProps = Pick<PointsEditorProps, 'draft' | 'series' | 'computedAt' | 'isStale'> & {
  pointer: string;
};

function columnsOf(props: ColumnsProps): DataColumn<PointRow>[] {
  const { draft, pointer } = props;
  const typed = (key: string, head: string, unit: string, members: string[]): DataColumn<PointRow> => ({
    key,
    head,
    unit,
    numeric: true,
    className: 'min-w-16',
    cell: ({ index, point }) => (
      <PointCell
        draft={draft}
        pointer={pointerTo(pointer, index, ...membersFor(members, point))}
        name={`${head} of point ${index + 1}`}
      />
    ),
  });
  const named = (list: unknown, member: 'ligands' | 'modulators') =>
    listOf(list)
      .map(objectOf)
      .map(({ id, name, unit }) =>
        typed(`${member} ${textOf(id)}`, textOf(name) || textOf(id), textOf(unit).replace('uM', 'µM'), [
          member,
          textOf(id),
        ]),
      );
  return [
    {
      key: 'point',
      head: 'point',
      cell: ({ index }) => <span className="figures text-soft">{index + 1}</span>,
    },
    ...named(draft.at('/ligands'), 'ligands'),
    ...named(draft.at('/modulators'), 'modulators'),
    typed('activity', 'activity', 'or replicates', ['activity']),
    typed('u', 'u', 'standard', ['u']),
    ...computedColumns(props),
    {
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
    },
  ];
}

/** Where a point has replicates, they stand in the place of its activity. */
function membersFor(members: string[], point: unknown): string[] {
  return members[0] === 'activity' && isObject(point) && point.replicates !== undefined
    ? ['replicates']
    : members;
}

function computedColumns({ computedAt, isStale }: ColumnsProps): DataColumn<PointRow>[] {
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
