'use client';

import Link from 'next/link';
import { type ReactNode, useRef } from 'react';
import { AxisFrame } from '@/components/layout/axis-frame';
import { RowFrame } from '@/components/layout/row-frame';
import { AxisRuler } from '@/components/plots/axis-ruler';
import type { EnergyWindow } from '@/components/plots/energy-window';
import { RowHeads } from '@/components/plots/row-figures';
import { useSize } from '@/components/plots/use-size';
import { actionStyle } from '@/components/ui/action-style';
import type { DatasetList } from '@/schemas/dataset-answers';
import { NO_FILTERS } from './browse-address';
import { browseWindows } from './browse-window';
import { collectionSentence, counted } from './collection-sentence';
import { PointsOnCurve } from './collection-verdict';
import { DatasetRows } from './dataset-rows';
import { OverlayColumn } from './overlay-column';
import { useOverlay } from './use-collection';
import { useLighting } from './use-lighting';

interface HomeCollectionProps {
  /** what came in lately, with the totals of everything */
  list: DatasetList;
  /** the window that everything is seen in, until the points are there to tell */
  opening: EnergyWindow;
  /** at the left: what the place is for */
  who: ReactNode;
  /** rows below those of the datasets */
  children: ReactNode;
}

/** Everything published on one curve, and what came in lately. */
export function HomeCollection({ list, opening, who, children }: HomeCollectionProps) {
  const overlay = useOverlay(NO_FILTERS);
  const column = useRef<HTMLDivElement>(null);
  const { width } = useSize(column);
  const lighting = useLighting(overlay.shown);
  const { total, datasets } = list;
  const window = overlay.whole ? browseWindows(NO_FILTERS, overlay.whole, datasets).window : opening;
  const ruler = <AxisRuler window={window} width={width} />;
  return (
    <AxisFrame
      who={who}
      axis={
        <OverlayColumn
          column={column}
          overlay={overlay}
          window={window}
          lighting={lighting}
          sentence={collectionSentence(total, window)}
          ruler={ruler}
        />
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
        axis={ruler}
        verdict={<RowHeads />}
      />
      <h2 className="border-ink border-b pt-4 pb-1 font-semibold lg:hidden">What came in lately</h2>
      <DatasetRows datasets={datasets} window={window} width={width} lighting={lighting} />
      {children}
    </AxisFrame>
  );
}
