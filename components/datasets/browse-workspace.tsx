'use client';

import { type ReactNode, useRef } from 'react';
import { AxisFrame } from '@/components/layout/axis-frame';
import { RowFrame } from '@/components/layout/row-frame';
import { ScrollingCell } from '@/components/layout/scrolling-cell';
import type { EnergyWindow } from '@/components/plots/energy-window';
import { RowHeads } from '@/components/plots/row-figures';
import { useSize } from '@/components/plots/use-size';
import { WindowRuler } from '@/components/plots/window-ruler';
import { Button } from '@/components/ui/button';
import type { DatasetFilters } from '@/schemas/dataset-query';
import { browseWindows, pointsOutside, windowForAddress } from './browse-window';
import { collectionSentence, counted } from './collection-sentence';
import { CollectionVerdict } from './collection-verdict';
import { DatasetRows } from './dataset-rows';
import { EnergyTable } from './energy-table';
import { FilterPanel } from './filter-panel';
import { NothingFits } from './nothing-fits';
import { OffCurveTable } from './off-curve-table';
import { OverlayColumn } from './overlay-column';
import { ReadFailure } from './read-failure';
import { useBrowseAddress } from './use-browse-address';
import { useDatasetList, useOverlay } from './use-collection';
import { useLighting } from './use-lighting';

interface BrowseWorkspaceProps {
  /** slug of the laboratory whose datasets alone are shown */
  lab?: string;
  /** above the filters: whose datasets these are */
  head: (datasets: number | null, window: EnergyWindow | null) => ReactNode;
}

/** Published datasets on one curve: filters, overlay on the axis, verdict; a strip a dataset below, newest first. */
export function BrowseWorkspace({ lab, head }: BrowseWorkspaceProps) {
  const { filters: asked, slip, go: goTo } = useBrowseAddress();
  const filters: DatasetFilters = lab === undefined ? asked : { ...asked, lab: [lab] };
  const go = (next: DatasetFilters) => goTo(lab === undefined ? next : { ...next, lab: [] });
  const list = useDatasetList(filters);
  const overlay = useOverlay(filters);
  const column = useRef<HTMLDivElement>(null);
  const { width } = useSize(column);
  const lighting = useLighting(overlay.shown);

  const pages = list.data?.pages ?? [];
  const first = pages.at(0);
  const datasets = pages.flatMap((page) => page.datasets);
  const fixed = lab === undefined ? undefined : 'lab';
  const { window, opening, full } = browseWindows(filters, overlay.whole, datasets);
  const setWindow = (next: EnergyWindow) => go({ ...filters, ...windowForAddress(next, opening) });
  const ruler = <WindowRuler window={window} full={full} onChange={setWindow} />;
  const total = first?.total;
  const isWindow = filters.from !== null || filters.to !== null;
  return (
    <>
      <AxisFrame
        who={
          <ScrollingCell label="Datasets and filters">
            {head(total?.datasets ?? null, isWindow ? window : null)}
            {slip === null ? null : (
              <p role="status" className="mt-2 text-sm text-warn">
                {slip}
              </p>
            )}
            <a
              href="#datasets"
              className="sr-only focus:not-sr-only focus:mt-2 focus:inline-block focus:font-semibold focus:text-act"
            >
              Skip search and filters, to the datasets
            </a>
            {first ? <FilterPanel filters={filters} facets={first.facets} fixed={fixed} onGo={go} /> : null}
          </ScrollingCell>
        }
        axis={
          <OverlayColumn
            column={column}
            overlay={overlay}
            window={window}
            lighting={lighting}
            sentence={total ? collectionSentence(total, window) : 'The master curve'}
            ruler={ruler}
          />
        }
        verdict={
          total ? (
            <ScrollingCell label="Verdict">
              <CollectionVerdict
                total={total}
                window={window}
                full={full}
                isWindow={isWindow}
                outside={overlay.whole ? pointsOutside(overlay.whole, window) : 0}
                onWindow={setWindow}
              />
            </ScrollingCell>
          ) : null
        }
      >
        <RowFrame
          tone="ruler"
          className="max-lg:[&>:first-child]:hidden max-lg:[&>:last-child]:hidden"
          who={<p className="py-1.5 text-sm text-soft">Newest first</p>}
          axis={ruler}
          verdict={<RowHeads isWindow={isWindow} />}
        />
        {list.error ? (
          <div className="py-6">
            <ReadFailure what="The list" error={list.error} onRetry={() => void list.refetch()} />
          </div>
        ) : null}
        {first && datasets.length === 0 ? (
          <NothingFits filters={filters} facets={first.facets} fixed={fixed} onGo={go} />
        ) : null}
        <DatasetRows
          datasets={datasets}
          window={window}
          width={width}
          lighting={lighting}
          isWindow={isWindow}
          isPast={list.isPlaceholderData}
        />
        {list.hasNextPage ? (
          <p className="py-3">
            <Button disabled={list.isFetchingNextPage} onClick={() => void list.fetchNextPage()}>
              {list.isFetchingNextPage ? 'Loading…' : `More: ${moreWords(total?.datasets, datasets.length)}`}
            </Button>
          </p>
        ) : null}
      </AxisFrame>
      {overlay.shown && datasets.length > 0 ? (
        <div className="page-width">
          <OffCurveTable overlay={overlay.shown} window={window} />
          <EnergyTable overlay={overlay.shown} window={window} />
        </div>
      ) : null}
      <p role="status" className="sr-only">
        {list.isPlaceholderData || !total ? '' : `${counted(total.datasets, 'dataset')} shown`}
      </p>
    </>
  );
}

function moreWords(all: number | undefined, shown: number): string {
  return all === undefined ? 'older datasets' : counted(all - shown, 'older dataset');
}
