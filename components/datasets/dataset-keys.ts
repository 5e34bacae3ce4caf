/** The addresses of what browsing reads, which are the keys of the cache as well, on the server and in the browser. */
import type { DatasetFilters } from '@/schemas/dataset-query';
import { writeBrowseAddress } from './browse-address';

/** Rows a page of the list. */
export const DATASETS_A_PAGE = 20;

/** The address of the first page of a selection. */
export function listPath(filters: DatasetFilters, limit = DATASETS_A_PAGE): string {
  const parameters = writeBrowseAddress(filters);
  parameters.set('limit', String(limit));
  return `/api/v1/datasets?${parameters}`;
}

export function overlayPath(filters: DatasetFilters): string {
  const parameters = String(writeBrowseAddress(filters));
  return parameters === '' ? '/api/v1/overlay' : `/api/v1/overlay?${parameters}`;
}

export function datasetPath(accession: string): string {
  return `/api/v1/datasets/${encodeURIComponent(accession)}`;
}

export function pointsPath(accession: string): string {
  return `${datasetPath(accession)}/points?format=json`;
}

export const listKey = (path: string) => ['datasets', path] as const;
export const overlayKey = (path: string) => ['overlay', path] as const;
export const pointsKey = (accession: string) => ['points', accession] as const;
