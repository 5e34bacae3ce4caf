import { NO_FILTERS } from '@/components/datasets/browse-address';
import { HomeCollection } from '@/components/datasets/home-collection';
import { openingWindow } from '@/components/plots/energy-window';
import { actorOfPage } from '@/lib/auth/current-actor';
import { listDatasets } from '@/lib/datasets/list-datasets';
import { loadEnergies } from '@/lib/datasets/load-energies';
import { ExampleHome } from './example-home';
import { HomePurpose } from './home-purpose';
import { HomeRows } from './home-rows';

/** Datasets that came in lately, so many of them. */
const LATELY = 6;

/** What the place is for, everything published on one curve, what came in lately, and the ways to check and deposit. */
export default async function HomePage() {
  const actor = await actorOfPage();
  const [outcome, found] = await Promise.all([
    listDatasets(actor, { ...NO_FILTERS, limit: LATELY, cursor: null }),
    loadEnergies(actor, NO_FILTERS),
  ]);
  if (!outcome.ok || outcome.list.datasets.length === 0) return <ExampleHome />;
  return (
    <HomeCollection
      list={outcome.list}
      opening={openingWindow(found.ok ? found.energies : [])}
      who={<HomePurpose />}
    >
      <HomeRows />
    </HomeCollection>
  );
}
