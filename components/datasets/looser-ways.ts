/** Where nothing fits: which one filter to loosen, and how many datasets that would show. Pure. */
import type { Facets } from '@/schemas/dataset-answers';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { LIST_FILTERS, type ListFilter } from './browse-address';

export interface LooserWay {
  words: string;
  filters: DatasetFilters;
  /** null where it is not known before it is tried */
  datasets: number | null;
}

const WORDS: Record<ListFilter, string> = {
  system: 'any system',
  lab: 'any laboratory',
  ligand: 'any ligand',
  variant: 'any variant',
  flag: 'points of any flag',
};

/**
 * The ways, the surest first. Facets are counted under the other filters, so one without datasets tells that
 * leaving out its filter alone would not help.
 *
 * @param fixed a filter that the page itself sets and that stays
 */
export function looserWays(filters: DatasetFilters, facets: Facets, fixed?: ListFilter): LooserWay[] {
  const ways: LooserWay[] = [];
  for (const name of LIST_FILTERS) {
    if (filters[name].length === 0 || name === fixed) continue;
    const datasets = datasetsWithout(name, facets);
    if (datasets === 0) continue;
    ways.push({ words: WORDS[name], filters: { ...filters, [name]: [] }, datasets });
  }
  if (filters.from !== null || filters.to !== null)
    ways.push({ words: 'all energies', filters: { ...filters, from: null, to: null }, datasets: null });
  if (filters.q.length > 0)
    ways.push({ words: 'without the search', filters: { ...filters, q: [] }, datasets: null });
  return ways.sort((a, b) => (b.datasets ?? 0) - (a.datasets ?? 0));
}

/** A dataset has one system and one laboratory, so those counts add up; of ligands and flags it may have several. */
function datasetsWithout(name: ListFilter, facets: Facets): number | null {
  if (name === 'variant') return null;
  const counts = facets[name].map(({ datasets }) => datasets);
  if (name === 'system' || name === 'lab') return counts.reduce((sum, count) => sum + count, 0);
  return counts.some((count) => count > 0) ? null : 0;
}
