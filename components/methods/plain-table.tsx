import type { ReactNode } from 'react';

interface PlainTableProps {
  caption: string;
  heads: readonly string[];
  /** each row as its cells; the first heads it */
  rows: readonly { key: string; cells: readonly ReactNode[] }[];
  /** the first column stands on one line */
  tightFirst?: boolean;
}

const CELL = 'border-hairline border-b py-2 text-left align-top font-normal not-last:pr-6';

/** A small table in the text: hairlines, interface type. */
export function PlainTable({ caption, heads, rows, tightFirst = false }: PlainTableProps) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard (WCAG 2.1.1)
    <section aria-label={caption} tabIndex={0} className="mt-5 overflow-x-auto">
      <table className="w-full max-w-[46rem] sm:min-w-[30rem] border-collapse font-sans text-base">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr>
            {heads.map((head) => (
              <th
                key={head}
                scope="col"
                className="border-ink border-b py-2 text-left font-semibold text-sm not-last:pr-6"
              >
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ key, cells: [first, ...others] }) => (
            <tr key={key}>
              <th scope="row" className={`${CELL} ${tightFirst ? 'whitespace-nowrap' : ''}`}>
                {first}
              </th>
              {others.map((cell, i) => (
                // biome-ignore lint/suspicious/noArrayIndexKey: cells of a constant row are known by their column alone
                <td key={i} className={CELL}>
                  {cell}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
