import { FlagMark } from '@/components/plots/flag-mark';
import { FLAG_WORDS } from '@/components/plots/plot-data';
import { Button } from '@/components/ui/button';
import { formatCount } from '@/components/ui/format-quantity';
import type { AssessmentSummary, Flag } from '@/lib/engine/assessment';

interface FlagCountsProps {
  counts: Pick<AssessmentSummary, 'onCurve' | 'warning' | 'offCurve'>;
  /** leads to the points off the curve; left out where they stand on the page anyway */
  onOffCurve?: () => void;
}

/** How many points have which flag, each with the mark that the plots draw. */
export function FlagCounts({ counts, onOffCurve }: FlagCountsProps) {
  const rows: [Flag, number][] = [
    ['on-curve', counts.onCurve],
    ['warning', counts.warning],
    ['off-curve', counts.offCurve],
  ];
  return (
    <ul className="mt-4 space-y-1.5">
      {rows.map(([flag, count]) => (
        <li key={flag} className="flex items-center gap-2.5">
          <FlagMark flag={flag} />
          {flag === 'off-curve' && onOffCurve && count > 0 ? (
            <Button onClick={onOffCurve}>{FLAG_WORDS[flag]}: show</Button>
          ) : (
            <span>{FLAG_WORDS[flag]}</span>
          )}
          <span className="figures ml-auto">{formatCount(count)}</span>
        </li>
      ))}
    </ul>
  );
}
