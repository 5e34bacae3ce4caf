import type { EnergyWindow } from '@/components/plots/energy-window';
import { type DataColumn, DataTable } from '@/components/ui/data-table';
import { Disclosure } from '@/components/ui/disclosure';
import { formatCount, formatFixed, formatNumber } from '@/components/ui/format-quantity';
import type { Overlay } from '@/schemas/overlay';
import { type EnergyBin, energyBins } from './energy-bins';

interface EnergyTableProps {
  overlay: Overlay;
  window: EnergyWindow;
}

const count = (key: 'points' | 'onCurve' | 'warning' | 'offCurve', head: string): DataColumn<EnergyBin> => ({
  key,
  head,
  numeric: true,
  cell: (bin) => formatCount(bin[key]),
});

const COLUMNS: DataColumn<EnergyBin>[] = [
  {
    key: 'energy',
    head: 'energy',
    unit: 'kT',
    cell: ({ from, to }) => (
      <span className="figures whitespace-nowrap">
        {formatNumber(from)} to {formatNumber(to)}
      </span>
    ),
  },
  count('points', 'points'),
  count('onCurve', 'on curve'),
  count('warning', 'warning'),
  count('offCurve', 'off curve'),
  {
    key: 'mean',
    head: 'mean activity',
    numeric: true,
    cell: ({ meanActivity }) => formatFixed(meanActivity, 3),
  },
  {
    key: 'expected',
    head: 'master curve',
    unit: 'in the middle',
    numeric: true,
    cell: ({ expected }) => formatFixed(expected, 3),
  },
];

/** The plot as a table. */
export function EnergyTable({ overlay, window }: EnergyTableProps) {
  return (
    <Disclosure summary="The plot as a table" className="pb-8">
      <DataTable
        caption="Points by energy: how many of which flag, and how high beside the master curve"
        columns={COLUMNS}
        rows={energyBins(overlay, window)}
        rowKey={({ from }) => from}
      />
    </Disclosure>
  );
}
