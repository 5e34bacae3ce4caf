/**
 * What the address of a browsing page says: the filters and the window of energies. Read leniently, since people
 * shorten and mistype addresses: what cannot be read is left out. Pure, the same on the server and in the browser.
 */
import { FLAG_WORDS } from '@/components/plots/plot-data';
import type { Flag } from '@/lib/engine/assessment';
import type { DatasetFilters } from '@/schemas/dataset-query';

/** What the API takes at most. */
const MOST_CHOICES = 20;
const MOST_WORDS = 10;
const LONGEST_TEXT = 200;
const FURTHEST_KT = 1e6;

/** The filters whose values are chosen from lists. */
export type ListFilter = 'system' | 'lab' | 'ligand' | 'variant' | 'flag';

export const LIST_FILTERS: readonly ListFilter[] = ['system', 'lab', 'ligand', 'variant', 'flag'];

export const NO_FILTERS: DatasetFilters = {
  ...{ system: [], lab: [], ligand: [], variant: [], flag: [] },
  ...{ from: null, to: null, q: [] },
};

/** The filters of an address. */
export function readBrowseAddress(parameters: Pick<URLSearchParams, 'get' | 'getAll'>): DatasetFilters {
  const [from, to] = [energyIn(parameters, 'from'), energyIn(parameters, 'to')];
  const isOpen = from === null || to === null || from < to;
  return {
    system: namesIn(parameters, 'system'),
    lab: namesIn(parameters, 'lab'),
    ligand: namesIn(parameters, 'ligand'),
    variant: namesIn(parameters, 'variant'),
    flag: namesIn(parameters, 'flag').filter((name): name is Flag => name in FLAG_WORDS),
    from: isOpen ? from : null,
    to: isOpen ? to : null,
    q: wordsOf(parameters.get('q') ?? ''),
  };
}

/** What is wrong with the window that an address asks for, as a sentence; null where nothing is. */
export function windowSlip(parameters: Pick<URLSearchParams, 'get'>): string | null {
  const bad = (['from', 'to'] as const).find(
    (name) => (parameters.get(name)?.trim() ?? '') !== '' && energyIn(parameters, name) === null,
  );
  if (bad !== undefined)
    return `“${bad}=${shortened(parameters.get(bad) ?? '')}” in the address is no energy in kT and was left out.`;
  const [from, to] = [energyIn(parameters, 'from'), energyIn(parameters, 'to')];
  return from === null || to === null || from < to
    ? null
    : 'The window in the address ends before it begins, so all energies are shown. Its “from” must be the lower one.';
}

function shortened(text: string): string {
  return text.length <= 20 ? text : `${text.slice(0, 20)}…`;
}

/** The parameters that say so, in one order: equal selections have equal addresses. */
export function writeBrowseAddress(filters: DatasetFilters): URLSearchParams {
  const parameters = new URLSearchParams();
  for (const name of LIST_FILTERS) for (const value of filters[name]) parameters.append(name, value);
  if (filters.from !== null) parameters.set('from', String(filters.from));
  if (filters.to !== null) parameters.set('to', String(filters.to));
  if (filters.q.length > 0) parameters.set('q', filters.q.join(' '));
  return parameters;
}

/** The words of a search. */
export function wordsOf(text: string): string[] {
  const words = text.slice(0, LONGEST_TEXT).split(/\s+/);
  return words.filter((word) => word !== '').slice(0, MOST_WORDS);
}

/** The filters with one value of a list chosen, or no longer chosen where it was. */
export function toggled(filters: DatasetFilters, name: ListFilter, value: string): DatasetFilters {
  const values: readonly string[] = filters[name];
  const next = values.includes(value) ? values.filter((one) => one !== value) : [...values, value];
  return { ...filters, [name]: next };
}

/** Whether anything is filtered, the window aside. */
export function isFiltered(filters: DatasetFilters): boolean {
  return filters.q.length > 0 || LIST_FILTERS.some((name) => filters[name].length > 0);
}

function namesIn(parameters: Pick<URLSearchParams, 'getAll'>, name: string): string[] {
  const given = parameters.getAll(name).map((value) => value.trim());
  const names = given.filter((value) => value !== '' && value.length <= LONGEST_TEXT);
  return [...new Set(names)].slice(0, MOST_CHOICES);
}

function energyIn(parameters: Pick<URLSearchParams, 'get'>, name: string): number | null {
  const text = parameters.get(name)?.trim() ?? '';
  const energy = text === '' ? Number.NaN : Number(text.replace('\u2212', '-'));
  return Number.isFinite(energy) && Math.abs(energy) <= FURTHEST_KT ? energy : null;
}
