'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { CONTROL_STYLE } from '@/components/ui/field';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { wordsOf, writeBrowseAddress } from './browse-address';

interface SearchFormProps {
  filters: DatasetFilters;
  onGo: (filters: DatasetFilters) => void;
}

/** A search in titles, accessions, systems, laboratories and variants. A plain form, which works without script. */
export function SearchForm({ filters, onGo }: SearchFormProps) {
  const asked = filters.q.join(' ');
  // What is typed counts until the address says something else.
  const [typed, setTyped] = useState<{ asked: string; text: string } | null>(null);
  const text = typed?.asked === asked ? typed.text : asked;
  const others = [...writeBrowseAddress({ ...filters, q: [] })];
  return (
    <search>
      <form
        method="get"
        className="mt-4 flex items-end gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          onGo({ ...filters, q: wordsOf(text) });
        }}
      >
        {others.map(([name, value]) => (
          <input key={`${name} ${value}`} type="hidden" name={name} value={value} />
        ))}
        <input
          type="search"
          name="q"
          aria-label="Search title, variant, laboratory"
          placeholder="Search title, variant, lab"
          maxLength={200}
          value={text}
          onChange={({ target }) => setTyped({ asked, text: target.value })}
          className={CONTROL_STYLE}
        />
        <Button type="submit" className="min-h-8">
          Search
        </Button>
      </form>
    </search>
  );
}
