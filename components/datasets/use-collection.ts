/** What browsing reads from API v1, kept in one cache. */
import { keepPreviousData, useInfiniteQuery, useQuery, useQueryClient } from '@tanstack/react-query';
import { type OverlayPoint, pointsFrom } from '@/components/plots/overlay-view';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import type { DatasetAnswer, DatasetList, DatasetPoints } from '@/schemas/dataset-answers';
import type { DatasetFilters } from '@/schemas/dataset-query';
import type { Overlay } from '@/schemas/overlay';
import {
  datasetPath,
  listKey,
  listPath,
  overlayKey,
  overlayPath,
  pointsKey,
  pointsPath,
} from './dataset-keys';
import { fetchAnswer } from './fetch-answer';

/** The list of a selection, page after page; while another selection is on its way the last one stays. */
export function useDatasetList(filters: DatasetFilters) {
  const first = listPath(filters);
  return useInfiniteQuery({
    queryKey: listKey(first),
    queryFn: ({ pageParam, signal }) => fetchAnswer<DatasetList>(pageParam, signal),
    initialPageParam: first,
    getNextPageParam: ({ next }) => next,
    placeholderData: keepPreviousData,
  });
}

function useOverlayAt(filters: DatasetFilters, wanted: boolean) {
  const path = overlayPath(filters);
  return useQuery({
    queryKey: overlayKey(path),
    queryFn: ({ signal }) => fetchAnswer<Overlay>(path, signal),
    placeholderData: keepPreviousData,
    enabled: wanted,
  });
}

/**
 * The overlay of a selection: all energies, and where its points are too many to be sent one by one, the window by
 * itself, in which they may be few enough.
 */
export function useOverlay(filters: DatasetFilters) {
  const whole = useOverlayAt({ ...filters, from: null, to: null }, true);
  const isWindow = filters.from !== null || filters.to !== null;
  const closer = useOverlayAt(filters, isWindow && whole.data?.points === null);
  const isCloser = isWindow && whole.data?.points === null && closer.data !== undefined;
  return {
    whole: whole.data ?? null,
    shown: (isCloser ? closer.data : whole.data) ?? null,
    error: whole.error,
    retry: whole.refetch,
  };
}

/** The points of the dataset that is lit: from the overlay where it holds them, else asked for by themselves. */
export function useLitPoints(accession: string | null, overlay: Overlay | null): OverlayPoint[] | null {
  const isThere = overlay?.points !== null;
  const asked = useDatasetPoints(accession ?? '', accession !== null && overlay !== null && !isThere);
  if (accession === null || overlay === null) return null;
  if (overlay.points) {
    const place = overlay.datasets.findIndex((dataset) => dataset.accession === accession);
    return pointsFrom(overlay.points).filter(({ dataset }) => dataset === place);
  }
  if (!asked.data) return null;
  return asked.data.points.map((point) => ({ ...point, dataset: -1, series: -1, point: point.index }));
}

/** The computed points of a dataset. */
export function useDatasetPoints(accession: string, wanted: boolean) {
  return useQuery({
    queryKey: pointsKey(accession),
    queryFn: ({ signal }) => fetchAnswer<DatasetPoints>(pointsPath(accession), signal),
    enabled: wanted,
    staleTime: Number.POSITIVE_INFINITY,
  });
}

/** Fetches the document of a dataset, points with their uncertainties and all; asked for once. */
export function useWholeDocument(accession: string): () => Promise<DatasetDocument> {
  const client = useQueryClient();
  const path = datasetPath(accession);
  return async () => {
    const answer = await client.fetchQuery({
      queryKey: ['dataset', accession],
      queryFn: ({ signal }) => fetchAnswer<DatasetAnswer>(path, signal),
      staleTime: Number.POSITIVE_INFINITY,
    });
    return answer.document as unknown as DatasetDocument;
  };
}
