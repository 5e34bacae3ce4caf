import { FlagMark } from '@/components/plots/flag-mark';
import { FLAG_WORDS } from '@/components/plots/plot-data';
import { formatCount } from '@/components/ui/format-quantity';
import type { AssessmentSummary, Flag } from '@/lib/engine/assessment';

interface FlagCountsProps {
  counts: Pick<AssessmentSummary, 'onCurve' | 'warning' | 'offCurve'>;
}

/** How many points have which flag, each with the mark that the plots draw. */
export function FlagCounts({ counts }: FlagCountsProps) {
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
          <span>{FLAG_WORDS[flag]}</span>
          <span className="figures ml-auto">{formatCount(count)}</span>
        </li>
      ))}
    </ul>
  );
}
