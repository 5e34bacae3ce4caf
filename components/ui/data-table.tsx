import type { ReactNode } from 'react';

export interface DataColumn<Row> {
  key: string;
  head: ReactNode;
  /** unit or scale, in small type below the head */
  unit?: ReactNode;
  /** numbers stand right, in tabular figures */
  numeric?: boolean;
  cell: (row: Row) => ReactNode;
  className?: string;
}

interface DataTableProps<Row> {
  /** says what the table shows; hidden where the page has just said so in words */
  caption: string;
  captionHidden?: boolean;
  columns: readonly DataColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string | number;
  /** the row that is meant, if any */
  isMarked?: (row: Row) => boolean;
  /** class of the scrolling region; give it a height and the head stays in view */
  className?: string;
}

/** On paper nothing scrolls. */
const REGION = 'thin-scroll relative overflow-auto print:overflow-visible';

const align = (numeric: boolean | undefined) => (numeric ? 'figures text-right' : 'text-left');

function Head<Row>({ column }: { column: DataColumn<Row> }) {
  return (
    <th
      scope="col"
      className={`sticky top-0 border-ink border-b bg-ground py-2 align-bottom font-semibold not-last:pr-5 print:not-last:pr-2 ${align(column.numeric)}`}
    >
      {column.head}
      {column.unit ? <span className="block font-normal text-soft text-xs">{column.unit}</span> : null}
    </th>
  );
}

/** A semantic table on hairlines; the first column heads its row. Too wide for its place, it scrolls by itself. */
export function DataTable<Row>(props: DataTableProps<Row>) {
  const { caption, captionHidden = true, columns, rows, rowKey, isMarked, className = '' } = props;
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard (WCAG 2.1.1)
    <section aria-label={caption} tabIndex={0} className={`${REGION} ${className}`}>
      <table className="w-full border-separate border-spacing-0 text-sm print:text-xs">
        <caption className={captionHidden ? 'sr-only' : 'pb-2 text-left text-soft'}>{caption}</caption>
        <thead>
          <tr>
            {columns.map((column) => (
              <Head key={column.key} column={column} />
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr
              key={rowKey(row)}
              aria-current={isMarked?.(row) ? 'true' : undefined}
              className="aria-[current=true]:bg-wash"
            >
              {columns.map((column, i) => {
                const Cell = i === 0 ? 'th' : 'td';
                return (
                  <Cell
                    key={column.key}
                    scope={i === 0 ? 'row' : undefined}
                    className={`border-hairline border-b py-1.5 align-top font-normal not-last:pr-5 print:not-last:pr-2 ${align(column.numeric)} ${column.className ?? ''}`}
                  >
                    {column.cell(row)}
                  </Cell>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
