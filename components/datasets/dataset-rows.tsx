import type { EnergyWindow } from '@/components/plots/energy-window';
import type { DatasetItem } from '@/schemas/dataset-answers';
import { DatasetRow } from './dataset-row';
import type { Lighting } from './use-lighting';

interface DatasetRowsProps {
  datasets: readonly DatasetItem[];
  window: EnergyWindow;
  /** of the axis column, px */
  width: number;
  lighting: Lighting;
  /** whether the address names a window, in which points are counted */
  isWindow?: boolean;
  /** others are on their way */
  isPast?: boolean;
}

/** A strip a dataset, on the axis of the plot above. */
export function DatasetRows({
  datasets,
  window,
  width,
  lighting,
  isWindow = false,
  isPast = false,
}: DatasetRowsProps) {
  return (
    <ul
      id="datasets"
      tabIndex={-1}
      aria-label="Datasets, newest first"
      aria-busy={isPast}
      className={`scroll-mt-24 outline-none ${isPast ? 'opacity-60' : ''}`}
    >
      {datasets.map((dataset) => (
        <DatasetRow
          key={dataset.accession}
          dataset={dataset}
          window={window}
          width={width}
          isWindow={isWindow}
          lit={lighting.isLit(dataset.accession)}
          onLight={(on) => lighting.light(dataset.accession, on)}
        />
      ))}
    </ul>
  );
}
