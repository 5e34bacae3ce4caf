import { dehydrate, HydrationBoundary, QueryClient } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { pointsKey } from '@/components/datasets/dataset-keys';
import { DatasetPage } from '@/components/datasets/dataset-page';
import { documentHead } from '@/components/datasets/published-plot-data';
import { TombstonePage } from '@/components/datasets/tombstone-page';
import { openingWindow } from '@/components/plots/energy-window';
import { actorOfPage } from '@/lib/auth/current-actor';
import { loadDataset } from '@/lib/datasets/load-dataset';
import { loadPoints } from '@/lib/datasets/load-points';
import { answerWithStatus } from '@/lib/serving/late-answer';

/** Up to so many points come with the page; more are asked for by the page once it stands. */
const MOST_POINTS_WITH_PAGE = 400;

interface PageProps {
  params: Promise<{ accession: string }>;
}

const datasetOf = cache(async (accession: string) => loadDataset(await actorOfPage(), accession));

export async function generateMetadata({ params }: PageProps): Promise<Metadata> {
  const outcome = await datasetOf((await params).accession);
  // Of one that is not there, the title is in not-found.tsx.
  if (!outcome.ok) return { title: 'Withdrawn dataset', robots: { index: false } };
  const { accession, title, lab, links, newest } = outcome.dataset;
  return {
    title: `${accession} ${title}`,
    description: `${title}, deposited by ${lab.name}: activity on the master curve, statements, points and files.`,
    // An older revision is read where it is cited, and not found instead of the newest.
    robots: newest ? undefined : { index: false },
    alternates: { types: { 'application/json': links.self } },
  };
}

/** One published dataset, or what stays of a withdrawn one. */
export default async function PublishedDatasetPage({ params }: PageProps) {
  const { accession } = await params;
  const outcome = await datasetOf(accession);
  if (!outcome.ok && outcome.tombstone) {
    answerWithStatus(410);
    return <TombstonePage tombstone={outcome.tombstone} />;
  }
  if (!outcome.ok) notFound();
  const { document, ...dataset } = outcome.dataset;
  const loaded = await loadPoints(await actorOfPage(), accession);
  if (!loaded.ok) notFound();
  const { answer } = loaded.loaded;
  const client = new QueryClient();
  if (answer.points.length <= MOST_POINTS_WITH_PAGE) client.setQueryData(pointsKey(answer.accession), answer);
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <DatasetPage
        dataset={{ ...dataset, document: documentHead(document) }}
        opening={openingWindow(answer.points)}
      />
    </HydrationBoundary>
  );
}
