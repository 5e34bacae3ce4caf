'use client';

import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { type ReactNode, useRef, useState } from 'react';
import { AxisFrame } from '@/components/layout/axis-frame';
import { RowFrame } from '@/components/layout/row-frame';
import { AxisRuler } from '@/components/plots/axis-ruler';
import { OverlayPanel } from '@/components/plots/overlay-panel';
import { RowHeads } from '@/components/plots/row-figures';
import { useSize } from '@/components/plots/use-size';
import { actionStyle } from '@/components/ui/action-style';
import type { DatasetList } from '@/schemas/dataset-answers';
import { NO_FILTERS } from './browse-address';
import { browseWindows } from './browse-window';
import { collectionSentence, counted } from './collection-sentence';
import { PointsOnCurve } from './collection-verdict';
import { DatasetRow } from './dataset-row';
import { ReadFailure } from './read-failure';
import { useLitPoints, useOverlay } from './use-collection';

interface HomeCollectionProps {
  /** what came in lately, with the totals of everything */
  list: DatasetList;
  /** at the left: what the place is for */
  who: ReactNode;
  /** rows below those of the datasets */
  children: ReactNode;
}

/** Everything published on one curve, and what came in lately. */
export function HomeCollection({ list, who, children }: HomeCollectionProps) {
  const router = useRouter();
  const overlay = useOverlay(NO_FILTERS);
  const column = useRef<HTMLDivElement>(null);
  const { width } = useSize(column);
  const [lit, setLit] = useState<string | null>(null);
  const [pointed, setPointed] = useState<string | null>(null);
  const litPoints = useLitPoints(lit, overlay.shown);
  const { total, datasets } = list;
  const { window } = browseWindows(NO_FILTERS, overlay.whole, datasets);
  return (
    <AxisFrame
      who={who}
      axis={
        <div ref={column} className="flex h-full flex-col">
          {overlay.error && overlay.shown === null ? (
            <div className="p-4">
              <ReadFailure what="The points" error={overlay.error} onRetry={() => void overlay.retry()} />
            </div>
          ) : null}
          <OverlayPanel
            overlay={overlay.shown}
            window={window}
            lit={litPoints}
            sentence={collectionSentence(total, window)}
            onPoint={setPointed}
            onChoose={(accession) => router.push(`/datasets/${accession}`)}
          />
          <div className="min-h-8.5 border-ink border-y lg:hidden">
            <AxisRuler window={window} width={width} />
          </div>
        </div>
      }
      verdict={
        <>
          <PointsOnCurve total={total} />
          <p className="mt-3">
            <Link href="/datasets" prefetch={false} className={actionStyle()}>
              Browse {counted(total.datasets, 'dataset')}
            </Link>
          </p>
        </>
      }
    >
      <RowFrame
        tone="ruler"
        className="max-lg:hidden"
        who={<h2 className="py-1.5 font-normal text-sm text-soft">What came in lately</h2>}
        axis={<AxisRuler window={window} width={width} />}
        verdict={<RowHeads />}
      />
      <h2 className="border-ink border-b pt-4 pb-1 font-semibold lg:hidden">What came in lately</h2>
      <ul>
        {datasets.map((dataset) => (
          <DatasetRow
            key={dataset.accession}
            dataset={dataset}
            window={window}
            width={width}
            lit={lit === dataset.accession || pointed === dataset.accession}
            onLight={(on) => setLit(on ? dataset.accession : null)}
          />
        ))}
      </ul>
      {children}
    </AxisFrame>
  );
}
