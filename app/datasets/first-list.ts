/** The first page of a list, loaded on the server and put where the browser's cache would keep it. */
import { QueryClient } from '@tanstack/react-query';
import { DATASETS_A_PAGE, listKey, listPath } from '@/components/datasets/dataset-keys';
import type { Actor } from '@/lib/auth/actor';
import { listDatasets } from '@/lib/datasets/list-datasets';
import type { DatasetFilters } from '@/schemas/dataset-query';

/** A cache that holds the list under the key and in the form that the page's own reading has. */
export async function firstList(actor: Actor, filters: DatasetFilters): Promise<QueryClient> {
  const client = new QueryClient();
  const outcome = await listDatasets(actor, { ...filters, limit: DATASETS_A_PAGE, cursor: null });
  if (!outcome.ok) throw new Error(`The list was refused: ${outcome.failure.code}`);
  const path = listPath(filters);
  client.setQueryData(listKey(path), { pages: [outcome.list], pageParams: [path] });
  return client;
}
