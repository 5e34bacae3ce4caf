import Link from 'next/link';
import { DeadEnd } from '@/components/layout/dead-end';
import { ActionLink } from '@/components/ui/action-link';
import { CalendarDate } from '@/components/ui/calendar-date';
import type { Tombstone } from '@/schemas/dataset-answers';

/** What stays of a dataset that was withdrawn. */
export function TombstonePage({ tombstone }: { tombstone: Tombstone }) {
  const { accession, title, lab, system, publishedAt, withdrawnAt, reason } = tombstone;
  return (
    <DeadEnd
      title="This dataset was withdrawn"
      ways={
        <>
          <ActionLink href={`/datasets?system=${system.slug}`} prefetch={false}>
            Other datasets on {system.name}
          </ActionLink>
          <ActionLink href="/datasets" prefetch={false}>
            Browse all datasets
          </ActionLink>
        </>
      }
    >
      <p className="text-ink">
        <span className="figures">{accession}</span> {title}
      </p>
      <p>
        <Link href={`/labs/${lab.slug}`} prefetch={false} className="underline underline-offset-4">
          {lab.name}
        </Link>
        , {system.name}. Published <CalendarDate at={Date.parse(publishedAt)} />, withdrawn{' '}
        <CalendarDate at={Date.parse(withdrawnAt)} />.
      </p>
      {reason ? <p className="whitespace-pre-wrap break-words font-serif text-ink">{reason}</p> : null}
      <p>Its data are no longer given out. The accession stays, so that citations still lead somewhere.</p>
    </DeadEnd>
  );
}
