import type { Route } from 'next';
import Link from 'next/link';
import { actionStyle } from '@/components/ui/action-style';
import { CalendarDate } from '@/components/ui/calendar-date';
import type { PublishedRecord } from './dataset-page';

const LINK = 'inline-block min-h-6 hover:text-ink hover:underline';

/** The dataset's title, whose it is, and what can be taken away. */
export function PublishedHead({ dataset }: { dataset: PublishedRecord }) {
  const { accession, revision, newest, title, note, lab, system, publishedAt, links } = dataset;
  return (
    <header>
      <p className="figures text-sm text-soft">
        {accession}
        {revision > 1 || !newest ? `, revision ${revision}` : ''}
      </p>
      <h1 className="head mt-0.5 break-words text-2xl">{title}</h1>
      <p className="mt-2 text-sm text-soft">
        <Link href={`/labs/${lab.slug}`} prefetch={false} className={LINK}>
          {lab.name}
        </Link>
        <br />
        <Link href={`/datasets?system=${system.slug}` as Route} prefetch={false} className={LINK}>
          {system.name}
        </Link>
        , <CalendarDate at={Date.parse(publishedAt)} />
      </p>
      {newest ? null : (
        <p className="mt-2 text-sm text-warn">
          There is a newer revision:{' '}
          <Link href={`/datasets/${accession}`} prefetch={false} className="underline underline-offset-4">
            {accession}
          </Link>
          .
        </p>
      )}
      {note ? <p className="mt-2 text-sm text-warn">{note}</p> : null}
      <p className="no-print mt-2 flex flex-wrap gap-x-5">
        <a href={links.document} download className={actionStyle()}>
          Document, JSON
        </a>
        <a href={links.pointsCsv} download className={actionStyle()}>
          Points, CSV
        </a>
        <a href={links.pointsJson} download className={actionStyle()}>
          Points, JSON
        </a>
        <a href="#cite" className={actionStyle()}>
          Cite
        </a>
      </p>
    </header>
  );
}
