import type { Route } from 'next';
import { useRouter } from 'next/navigation';
import type { ReactNode, Ref } from 'react';
import type { EnergyWindow } from '@/components/plots/energy-window';
import { OverlayPanel } from '@/components/plots/overlay-panel';
import { pointHref } from './point-address';
import { ReadFailure } from './read-failure';
import type { useOverlay } from './use-collection';
import type { Lighting } from './use-lighting';

interface OverlayColumnProps {
  /** the column, whose width the strips below share */
  column: Ref<HTMLDivElement>;
  overlay: ReturnType<typeof useOverlay>;
  window: EnergyWindow;
  lighting: Lighting;
  /** what the plot shows, in words */
  sentence: string;
  /** the axis, under the plot where the columns stand one below the other */
  ruler: ReactNode;
}

/** The axis column of a collection: its overlay, or why there is none. A click on a point opens its dataset. */
export function OverlayColumn({ column, overlay, window, lighting, sentence, ruler }: OverlayColumnProps) {
  const router = useRouter();
  return (
    <div ref={column} className="flex h-full flex-col">
      {overlay.error && overlay.shown === null ? (
        <div className="p-4">
          <ReadFailure what="The points" error={overlay.error} onRetry={() => void overlay.retry()} />
        </div>
      ) : null}
      <OverlayPanel
        overlay={overlay.shown}
        window={window}
        lit={lighting.points}
        sentence={sentence}
        onPoint={lighting.point}
        onChoose={(accession, place) => router.push(pointHref(accession, place) as Route)}
      />
      <div className="min-h-8.5 border-ink border-y lg:hidden">{ruler}</div>
    </div>
  );
}
