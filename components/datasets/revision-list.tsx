import Link from 'next/link';
import { CalendarDate } from '@/components/ui/calendar-date';
import type { DatasetAnswer } from '@/schemas/dataset-answers';

interface RevisionListProps {
  revisions: DatasetAnswer['revisions'];
  /** number of the one that is shown */
  shown: number;
}

/** The published revisions, the newest first. */
export function RevisionList({ revisions, shown }: RevisionListProps) {
  return (
    <ul className="space-y-2">
      {revisions.map(({ accession, revision, publishedAt, sha256, engine, policy }) => (
        <li key={revision}>
          <Link
            href={`/datasets/${accession}`}
            prefetch={false}
            aria-current={revision === shown ? 'page' : undefined}
            className="figures inline-block min-h-6 font-semibold text-act underline-offset-4 hover:underline aria-[current=page]:text-ink"
          >
            {accession}
          </Link>{' '}
          <CalendarDate at={Date.parse(publishedAt)} />
          {revision === shown ? <span className="text-soft"> · shown here</span> : null}
          <span className="figures block text-sm text-soft">
            assessed by engine {engine} under policy {policy}
          </span>
          <span className="block break-all text-soft text-xs">SHA-256 of the document {sha256}</span>
        </li>
      ))}
    </ul>
  );
}
