import { FlagCounts } from '@/components/assessed/flag-counts';
import { WindowFields } from '@/components/assessed/window-fields';
import type { EnergyWindow } from '@/components/plots/energy-window';
import { formatCount } from '@/components/ui/format-quantity';
import { expectedByChance } from '@/lib/engine/flags';
import type { DatasetList } from '@/schemas/dataset-answers';
import { counted } from './collection-sentence';

interface PointsOnCurveProps {
  total: DatasetList['total'];
}

/** How many points of how many lie on the curve, their flags, and what chance would give. */
export function PointsOnCurve({ total }: PointsOnCurveProps) {
  return (
    <>
      <p className="font-serif">
        <span className="font-semibold text-4xl">{formatCount(total.onCurve)}</span>{' '}
        <span className="whitespace-nowrap text-soft text-xl">/ {formatCount(total.points)}</span>
      </p>
      <p className="text-sm text-soft">points on the master curve</p>
      <FlagCounts counts={total} />
      <p className="mt-4 border-hairline border-t pt-3 text-sm text-soft">
        A point is off the curve beyond three standard uncertainties of the measurement and the stated
        parameters together.
        {total.points === 0
          ? null
          : ` Chance alone would put about ${chance(expectedByChance(total.points).offCurve)} there.`}
      </p>
    </>
  );
}

interface CollectionVerdictProps extends PointsOnCurveProps {
  window: EnergyWindow;
  full: EnergyWindow;
  /** whether the address names a window */
  isWindow: boolean;
  /** points that lie beyond what is shown */
  outside: number;
  onWindow: (window: EnergyWindow) => void;
}

/** What follows from a selection: points on the curve, flags, chance, and the window of energies. */
export function CollectionVerdict(props: CollectionVerdictProps) {
  const { total, window, full, isWindow, outside, onWindow } = props;
  return (
    <>
      <PointsOnCurve total={total} />
      <section aria-label="Window of energies" className="mt-4 border-hairline border-t pt-3">
        <h2 className="font-semibold">Window of energies</h2>
        <p className="mt-1 text-sm text-soft">{sentenceOnWindow(isWindow, outside)}</p>
        <WindowFields window={window} full={full} onWindow={onWindow} />
      </section>
    </>
  );
}

function sentenceOnWindow(isWindow: boolean, outside: number): string {
  if (isWindow)
    return `Counts are of the points in the window; ${counted(outside, 'more point')} outside. RMS z and p of a row are of its whole dataset.`;
  const beyond =
    outside === 0 ? '' : ` ${counted(outside, 'more point')} beyond the axis, where the curve is flat.`;
  return `All energies are counted.${beyond} Drag along the axis to narrow them.`;
}

function chance(expected: number): string {
  return expected < 0.95 ? expected.toPrecision(1) : formatCount(Math.round(expected));
}
