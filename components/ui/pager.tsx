import { Button } from './button';
import { formatCount } from './format-quantity';

interface PagerProps {
  /** from 0 */
  page: number;
  rows: number;
  rowsAPage: number;
  onPage: (page: number) => void;
}

/** How many pages so many rows make; at least one. */
export function pagesOf(rows: number, rowsAPage: number): number {
  return Math.max(1, Math.ceil(rows / rowsAPage));
}

/** Which rows of a long table are shown, and the way to the others. */
export function Pager({ page, rows, rowsAPage, onPage }: PagerProps) {
  const pages = pagesOf(rows, rowsAPage);
  return (
    <p className="mt-3 flex items-baseline gap-4 text-sm text-soft">
      <span className="figures">
        {formatCount(page * rowsAPage + 1)}–{formatCount(Math.min(rows, (page + 1) * rowsAPage))} of{' '}
        {formatCount(rows)}
      </span>
      {pages > 1 ? (
        <>
          <Button disabled={page === 0} onClick={() => onPage(page - 1)}>
            Previous
          </Button>
          <Button disabled={page === pages - 1} onClick={() => onPage(page + 1)}>
            Next
          </Button>
        </>
      ) : null}
    </p>
  );
}
