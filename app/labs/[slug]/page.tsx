import { dehydrate, HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { firstList } from '@/app/datasets/first-list';
import { parametersOf, type SearchParams } from '@/app/datasets/search-params';
import { readBrowseAddress } from '@/components/datasets/browse-address';
import { BrowseLab } from '@/components/datasets/browse-lab';
import { actorOfPage } from '@/lib/auth/current-actor';
import { loadLab } from '@/lib/labs/load-lab';

interface LabPageProps {
  params: Promise<{ slug: string }>;
  searchParams: SearchParams;
}

const labOf = cache(async (slug: string) => {
  const outcome = await loadLab(await actorOfPage(), slug);
  return outcome.ok ? outcome.lab : null;
});

export async function generateMetadata({ params }: LabPageProps): Promise<Metadata> {
  const lab = await labOf((await params).slug);
  return lab ? { title: lab.name, description: `Published datasets of ${lab.name}.` } : {};
}

/** What a laboratory published, on one curve. */
export default async function LabPage({ params, searchParams }: LabPageProps) {
  const lab = await labOf((await params).slug);
  if (!lab) notFound();
  const filters = { ...readBrowseAddress(parametersOf(await searchParams)), lab: [lab.slug] };
  const client = await firstList(await actorOfPage(), filters);
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <BrowseLab slug={lab.slug} name={lab.name} institution={lab.institution} />
    </HydrationBoundary>
  );
}
