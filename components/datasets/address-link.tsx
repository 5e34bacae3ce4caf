import type { ComponentProps } from 'react';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { isPlainClick } from './plain-click';
import { browseHref } from './use-browse-address';

interface AddressLinkProps extends Omit<ComponentProps<'a'>, 'href' | 'onClick'> {
  /** the selection that it leads to, on the same page */
  filters: DatasetFilters;
  onGo: (filters: DatasetFilters) => void;
}

/** A link to another selection: works before any script has run, and in a tab of its own. */
export function AddressLink({ filters, onGo, ...rest }: AddressLinkProps) {
  return (
    <a
      {...rest}
      href={browseHref(filters)}
      onClick={(event) => {
        if (!isPlainClick(event)) return;
        event.preventDefault();
        onGo(filters);
      }}
    />
  );
}
