import { formatCount } from '@/components/ui/format-quantity';
import type { Facets } from '@/schemas/dataset-answers';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { AddressLink } from './address-link';
import { type ListFilter, NO_FILTERS } from './browse-address';
import { looserWays } from './looser-ways';

interface NothingFitsProps {
  filters: DatasetFilters;
  facets: Facets;
  fixed?: ListFilter;
  onGo: (filters: DatasetFilters) => void;
}

const LINK = 'inline-flex min-h-6 items-center font-semibold text-act underline-offset-4 hover:underline';

/** In place of the rows, where no dataset fits: what to loosen. */
export function NothingFits({ filters, facets, fixed, onGo }: NothingFitsProps) {
  const ways = looserWays(filters, facets, fixed);
  const everything = fixed ? { ...NO_FILTERS, [fixed]: filters[fixed] } : NO_FILTERS;
  return (
    <div className="border-hairline border-b py-8">
      <h2 className="head text-xl">No dataset fits all of that</h2>
      <p className="mt-1 text-soft">
        {ways.length > 0
          ? 'Take one of these away, and some may fit:'
          : 'No single choice is in the way: several are. Begin again from everything.'}
      </p>
      <ul className="mt-2">
        {ways.map((way) => (
          <li key={way.words}>
            <AddressLink filters={way.filters} onGo={onGo} className={LINK}>
              {way.words}
              {way.datasets === null ? null : (
                <span className="figures ml-2 font-normal text-soft">
                  {formatCount(way.datasets)} {way.datasets === 1 ? 'dataset' : 'datasets'}
                </span>
              )}
            </AddressLink>
          </li>
        ))}
        <li>
          <AddressLink filters={everything} onGo={onGo} className={LINK}>
            Show everything
          </AddressLink>
        </li>
      </ul>
    </div>
  );
}
