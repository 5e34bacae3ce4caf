import Link from 'next/link';
import { RowFrame } from '@/components/layout/row-frame';
import type { EnergyWindow } from '@/components/plots/energy-window';
import { RowFigures } from '@/components/plots/row-figures';
import { SeriesStrip } from '@/components/plots/series-strip';
import type { DatasetItem } from '@/schemas/dataset-answers';
import { pointsOfStrip } from './browse-window';

interface DatasetRowProps {
  dataset: DatasetItem;
  window: EnergyWindow;
  /** width of the axis column, pixels; 0 until it is known */
  width: number;
  lit: boolean;
  /** whether the address names a window, in which points are counted */
  isWindow: boolean;
  onLight: (on: boolean) => void;
}

/** A dataset as a row on the page's columns: whose, its strip, its figures. Pointing at it or focusing it lights its points. */
export function DatasetRow({ dataset, window, width, lit, isWindow, onLight }: DatasetRowProps) {
  const { accession, title, lab, counts, rmsZ, pValue, fittedHere } = dataset;
  return (
    <li
      data-accession={accession}
      onPointerEnter={() => onLight(true)}
      onPointerLeave={() => onLight(false)}
      onFocus={() => onLight(true)}
      onBlur={() => onLight(false)}
    >
      <RowFrame
        lit={lit}
        who={
          <div className="py-2 lg:min-h-14">
            <Link
              href={`/datasets/${accession}`}
              prefetch={false}
              title={title}
              className="block min-h-6 truncate font-semibold underline-offset-4 hover:underline"
            >
              {title}
            </Link>
            <p className="flex min-w-0 gap-x-1 text-sm text-soft">
              <span className="figures whitespace-nowrap">{accession} ·</span>
              <Link
                href={`/labs/${lab.slug}`}
                prefetch={false}
                className="min-h-6 min-w-6 truncate hover:text-ink hover:underline"
              >
                {lab.name}
              </Link>
            </p>
          </div>
        }
        axis={
          <div className="relative min-h-14">
            <SeriesStrip points={pointsOfStrip(dataset)} window={window} width={width} lit={lit} />
            {fittedHere ? (
              <p className="absolute right-2 bottom-0 text-soft text-xs">some parameters fitted here</p>
            ) : null}
          </div>
        }
        verdict={
          <RowFigures
            onCurve={counts.onCurve}
            points={counts.points}
            rmsZ={rmsZ}
            pValue={pValue}
            isWindow={isWindow}
          />
        }
      />
    </li>
  );
}
