'use client';

import { BrowseWorkspace } from './browse-workspace';
import { counted } from './collection-sentence';

interface BrowseLabProps {
  slug: string;
  name: string;
  institution: string;
}

/** What one laboratory published. */
export function BrowseLab({ slug, name, institution }: BrowseLabProps) {
  return (
    <BrowseWorkspace
      lab={slug}
      head={(datasets) => (
        <>
          <h1 className="head text-3xl">{name}</h1>
          <p className="mt-2 text-lg text-soft leading-snug">{institution}</p>
          {datasets === null ? null : (
            <p className="mt-1 text-sm text-soft">{counted(datasets, 'dataset')} shown on this page</p>
          )}
        </>
      )}
    />
  );
}
