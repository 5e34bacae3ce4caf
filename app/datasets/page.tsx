import { dehydrate, HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { readBrowseAddress } from '@/components/datasets/browse-address';
import { BrowseAll } from '@/components/datasets/browse-all';
import { actorOfPage } from '@/lib/auth/current-actor';
import { firstList } from './first-list';
import { parametersOf, type SearchParams } from './search-params';

export const metadata: Metadata = {
  title: 'Browse',
  description:
    'Every published dataset on one master curve: which points fall off it, in whose hands, and by how much.',
};

/** Everything that is published, under the filters of the address. */
export default async function DatasetsPage({ searchParams }: { searchParams: SearchParams }) {
  const filters = readBrowseAddress(parametersOf(await searchParams));
  const client = await firstList(await actorOfPage(), filters);
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <BrowseAll />
    </HydrationBoundary>
  );
}
