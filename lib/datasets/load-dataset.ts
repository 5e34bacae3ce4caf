/** One published dataset, all but its points. */
import { readDatabase } from '@/db/client';
import { selectFiles } from '@/db/queries/files';
import { selectRevisions } from '@/db/queries/revisions';
import type { Actor } from '@/lib/auth/actor';
import type { Assessment, SeriesAssessment } from '@/lib/engine/assessment';
import { env } from '@/lib/env';
import type { Failed } from '@/lib/errors';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { DatasetAnswer, PointCounts, PublishedAssessment, Tombstone } from '@/schemas/dataset-answers';
import { formatAccession } from './accession';
import { cite } from './cite';
import { countsOf } from './dataset-filter';
import { demonstrationNote } from './demonstration-note';
import { loadRevision, type PublishedRevision } from './load-revision';

/** The answer, its document typed as what it is. */
export type PublishedDataset = Omit<DatasetAnswer, 'document'> & { document: DatasetDocument };

export type DatasetOutcome = { ok: true; dataset: PublishedDataset } | (Failed & { tombstone?: Tombstone });

/** The dataset of an accession, with or without a revision; failures as those of `loadRevision`. */
export async function loadDataset(actor: Actor, accessionText: string): Promise<DatasetOutcome> {
  const outcome = await loadRevision(actor, accessionText);
  if (!outcome.ok) return outcome;
  return { ok: true, dataset: await answerOf(outcome.published) };
}

async function answerOf(published: PublishedRevision): Promise<PublishedDataset> {
  const { head, revision, document, assessment } = published;
  const [files, revisions] = await Promise.all([listFiles(published), listRevisions(published)]);
  return {
    accession: formatAccession(head.accession),
    revision,
    newest: revision === head.revision,
    title: document.title,
    note: demonstrationNote(document.abstract),
    lab: { slug: head.labSlug, name: head.labName, institution: head.institution },
    system: { slug: head.system, name: head.systemName },
    publishedAt: iso(published.publishedAt),
    firstPublishedAt: iso(head.publishedAt),
    document,
    assessment: withoutPoints(assessment),
    series: document.series.map(({ id, label, variant }, i) => ({
      ...{ id, label, variant },
      counts: countSeries(assessment.series[i]),
    })),
    citation: cite({
      accession: published.accession,
      title: document.title,
      authors: document.contributors.map(({ name }) => name),
      day: iso(published.publishedAt).slice(0, 10),
      url: `${env().appUrl}/datasets/${published.accession}`,
    }),
    files,
    revisions,
    links: linksOf(published),
  };
}

/** Files came with the submission of a revision or before it; later ones belong to a later revision. */
async function listFiles({ head, submittedAt }: PublishedRevision): Promise<DatasetAnswer['files']> {
  const rows = await selectFiles(await readDatabase(), head.depositId);
  return rows
    .filter(({ uploadedAt }) => uploadedAt <= submittedAt)
    .map(({ id, name, size, sha256, mediaType, uploadedAt }) => ({
      ...{ id, name, size, sha256, mediaType },
      uploadedAt: iso(uploadedAt),
      href: `/api/v1/deposits/${head.depositId}/files/${id}`,
    }));
}

async function listRevisions({ head }: PublishedRevision): Promise<DatasetAnswer['revisions']> {
  const rows = await selectRevisions(await readDatabase(), head.depositId);
  return rows.flatMap(({ number, publishedAt, sha256, engine, policy }) =>
    publishedAt === null
      ? []
      : [
          {
            accession: formatAccession(head.accession, number),
            revision: number,
            publishedAt: iso(publishedAt),
            ...{ sha256, engine, policy },
          },
        ],
  );
}

function withoutPoints({ series, ...rest }: Assessment): PublishedAssessment {
  return { ...rest, series: series.map(({ points: _, ...one }) => one) };
}

function countSeries(series: SeriesAssessment | undefined): PointCounts {
  return countsOf((series?.points ?? []).map(({ flag }) => ({ flag, points: 1 })));
}

function linksOf({ head, accession }: PublishedRevision): DatasetAnswer['links'] {
  const self = `/api/v1/datasets/${accession}`;
  return {
    page: `/datasets/${accession}`,
    self,
    newest: `/api/v1/datasets/${formatAccession(head.accession)}`,
    document: `${self}/document`,
    pointsJson: `${self}/points?format=json`,
    pointsCsv: `${self}/points?format=csv`,
    pointsNdjson: `${self}/points?format=ndjson`,
    system: `/api/v1/systems/${head.system}`,
  };
}

function iso(time: number): string {
  return new Date(time).toISOString();
}
