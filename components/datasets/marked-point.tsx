import { FlagMark } from '@/components/plots/flag-mark';
import { FLAG_WORDS, type PlotData, type PointPlace } from '@/components/plots/plot-data';
import { actionStyle } from '@/components/ui/action-style';
import { formatQuantity, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';

/** The point that the page was opened at, in words, and the way to its row. */
export function MarkedPoint({ data, place }: { data: PlotData; place: PointPlace }) {
  const { label, assessed } = data.series[place.series];
  const { flag, energy, energyU, z } = assessed.points[place.point];
  return (
    <section aria-label="The point that was opened" className="mb-5 border-ink border-b pb-4 text-sm">
      <p className="flex items-center gap-2 font-semibold">
        <FlagMark flag={flag} />
        {label}, point {place.point + 1}
      </p>
      <p className="figures mt-0.5 text-soft">
        {FLAG_WORDS[flag]} at {formatQuantity(energy, energyU, 'kT')}, <MathSymbol>z</MathSymbol>
        {`\u00a0${formatScore(z)}`}; ringed in the plot
      </p>
      <a href="#points" className={actionStyle()}>
        Its row in the table
      </a>
    </section>
  );
}
