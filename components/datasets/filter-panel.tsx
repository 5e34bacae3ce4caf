'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import type { Facets } from '@/schemas/dataset-answers';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { AddressLink } from './address-link';
import { isFiltered, type ListFilter, NO_FILTERS, toggled } from './browse-address';
import { FilterGroup } from './filter-group';
import { SearchForm } from './search-form';

interface FilterPanelProps {
  filters: DatasetFilters;
  facets: Facets;
  /** a filter that the page itself sets: it is not offered */
  fixed?: ListFilter;
  onGo: (filters: DatasetFilters) => void;
}

const POINT_WORDS = { 'off-curve': 'with off-curve points', warning: 'with warnings' } as const;
const ACTION = 'inline-flex min-h-6 items-center text-act text-sm underline-offset-4 hover:underline';

/** The search and the filters, each choice with how many datasets it would show. */
export function FilterPanel({ filters, facets, fixed, onGo }: FilterPanelProps) {
  const flags = facets.flag.flatMap(({ value, datasets }) =>
    value === 'off-curve' || value === 'warning' ? [{ value, name: POINT_WORDS[value], datasets }] : [],
  );
  const sumOf = (choices: Facets['system']) => choices.reduce((sum, { datasets }) => sum + datasets, 0);
  const own = fixed ? { ...filters, [fixed]: [] } : filters;
  const everything = fixed ? { ...NO_FILTERS, [fixed]: filters[fixed] } : NO_FILTERS;
  const shared = { filters, onGo };
  const isWindow = filters.from !== null || filters.to !== null;
  // On narrow screens the plot comes before a long list of choices.
  const [open, setOpen] = useState(false);
  return (
    <>
      <SearchForm {...shared} />
      {isFiltered(own) || isWindow ? (
        <p className="mt-2 flex flex-wrap gap-x-4">
          <AddressLink filters={everything} onGo={onGo} className={ACTION}>
            Show everything
          </AddressLink>
          {isWindow && isFiltered(own) ? (
            <AddressLink filters={{ ...filters, from: null, to: null }} onGo={onGo} className={ACTION}>
              All energies
            </AddressLink>
          ) : null}
          {filters.variant.map((variant) => (
            <AddressLink
              key={variant}
              filters={toggled(filters, 'variant', variant)}
              onGo={onGo}
              className={ACTION}
            >
              Not only variant {variant}
            </AddressLink>
          ))}
        </p>
      ) : null}
      <p className="mt-3 lg:hidden">
        <Button aria-expanded={open} onClick={() => setOpen(!open)}>
          {open ? 'Hide filters' : 'Filters'}
        </Button>
      </p>
      <nav aria-label="Filters" className={open ? '' : 'max-lg:hidden'}>
        <FilterGroup
          {...shared}
          title="System"
          name="system"
          choices={facets.system}
          all={sumOf(facets.system)}
        />
        {fixed === 'lab' ? null : (
          <FilterGroup
            {...shared}
            title="Laboratory"
            name="lab"
            choices={facets.lab}
            all={sumOf(facets.lab)}
          />
        )}
        <FilterGroup {...shared} title="Points" name="flag" choices={flags} />
        <FilterGroup {...shared} title="Ligand" name="ligand" choices={facets.ligand} />
      </nav>
    </>
  );
}
