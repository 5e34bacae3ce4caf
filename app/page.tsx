import { NO_FILTERS } from '@/components/datasets/browse-address';
import { HomeCollection } from '@/components/datasets/home-collection';
import { actorOfPage } from '@/lib/auth/current-actor';
import { listDatasets } from '@/lib/datasets/list-datasets';
import { ExampleHome } from './example-home';
import { HomePurpose } from './home-purpose';
import { HomeRows } from './home-rows';

/** Datasets that came in lately, so many of them. */
const LATELY = 6;

/** What the place is for, everything published on one curve, what came in lately, and the ways to check and deposit. */
export default async function HomePage() {
  const outcome = await listDatasets(await actorOfPage(), { ...NO_FILTERS, limit: LATELY, cursor: null });
  if (!outcome.ok || outcome.list.datasets.length === 0) return <ExampleHome />;
  return (
    <HomeCollection list={outcome.list} who={<HomePurpose />}>
      <HomeRows />
    </HomeCollection>
  );
}
