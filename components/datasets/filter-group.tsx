'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { formatCount } from '@/components/ui/format-quantity';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { AddressLink } from './address-link';
import { type ListFilter, toggled } from './browse-address';

export interface FilterChoice {
  value: string;
  name: string;
  datasets: number;
}

interface FilterGroupProps {
  title: string;
  name: ListFilter;
  choices: readonly FilterChoice[];
  filters: DatasetFilters;
  onGo: (filters: DatasetFilters) => void;
  /** datasets without this filter, for the choice *All*; left out: there is no such choice */
  all?: number;
}

/** Longer lists are folded to so many. */
const FOLDED = 5;

/** The choices of one filter with how many datasets each would show. Several may be chosen: any of them then. */
export function FilterGroup({ title, name, choices, filters, onGo, all }: FilterGroupProps) {
  const [open, setOpen] = useState(false);
  const chosen: readonly string[] = filters[name];
  const listed = withChosen(choices, chosen);
  const shown = open ? listed : listed.filter(({ value }, i) => i < FOLDED || chosen.includes(value));
  const hidden = listed.length - shown.length;
  if (listed.length === 0) return null;
  return (
    <section aria-label={title} className="mt-5">
      <h2 className="font-semibold text-sm">{title}</h2>
      <ul className="mt-0.5 text-base">
        {all === undefined ? null : (
          <li>
            <Choice
              filters={{ ...filters, [name]: [] }}
              onGo={onGo}
              isChosen={chosen.length === 0}
              words="All"
              datasets={all}
            />
          </li>
        )}
        {shown.map((choice) => (
          <li key={choice.value}>
            <Choice
              filters={toggled(filters, name, choice.value)}
              onGo={onGo}
              isChosen={chosen.includes(choice.value)}
              words={choice.name}
              datasets={choice.datasets}
            />
          </li>
        ))}
      </ul>
      {hidden > 0 || (open && listed.length > FOLDED) ? (
        <Button aria-expanded={open} onClick={() => setOpen(!open)} className="text-sm">
          {open ? 'Fewer' : `${hidden} more`}
        </Button>
      ) : null}
    </section>
  );
}

interface ChoiceProps {
  filters: DatasetFilters;
  onGo: (filters: DatasetFilters) => void;
  isChosen: boolean;
  words: string;
  datasets: number;
}

function Choice({ filters, onGo, isChosen, words, datasets }: ChoiceProps) {
  return (
    <AddressLink
      filters={filters}
      onGo={onGo}
      aria-current={isChosen ? 'true' : undefined}
      className="flex min-h-6.5 items-center gap-3 text-soft hover:text-ink aria-[current=true]:font-semibold aria-[current=true]:text-ink"
    >
      <span className="min-w-0 truncate" title={words}>
        {words}
      </span>
      <span className="figures ml-auto">
        {formatCount(datasets)}
        <span className="sr-only"> {datasets === 1 ? 'dataset' : 'datasets'}</span>
      </span>
    </AddressLink>
  );
}

/** What is chosen stays in the list even where it fits nothing any more. */
function withChosen(choices: readonly FilterChoice[], chosen: readonly string[]): FilterChoice[] {
  const missing = chosen.filter((value) => !choices.some((choice) => choice.value === value));
  const some = choices.filter(({ value, datasets }) => datasets > 0 || chosen.includes(value));
  return [...some, ...missing.map((value) => ({ value, name: value, datasets: 0 }))];
}
