import { formatCount, formatPValue, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';

const COLUMNS = 'grid h-full grid-cols-[auto_1fr_1fr] items-center gap-2';

/** What the figures at the right of each strip are, above all of them. */
export function RowHeads() {
  return (
    <div className={`${COLUMNS} text-sm text-soft`}>
      <span className="min-w-14 whitespace-nowrap">on curve</span>
      <span className="text-right">
        RMS <MathSymbol>z</MathSymbol>
      </span>
      <span className="text-right">
        <MathSymbol>p</MathSymbol>
      </span>
    </div>
  );
}

interface RowFiguresProps {
  onCurve: number;
  points: number;
  rmsZ: number;
  /** null where there is none */
  pValue: number | null;
}

/** Whether what a row says as a whole is beyond chance: by p, or by RMS z where there is no p. */
function missesAsWhole({ rmsZ, pValue }: RowFiguresProps): boolean {
  return pValue === null ? rmsZ > 3 : pValue < 0.001;
}

/** The figures of a strip: points on the curve, RMS z, p. */
export function RowFigures(props: RowFiguresProps) {
  const { onCurve, points, rmsZ, pValue } = props;
  return (
    <div className={`${COLUMNS} figures py-1`}>
      <span className="min-w-14 whitespace-nowrap">
        {formatCount(onCurve)} / {formatCount(points)}
      </span>
      <span className={`text-right ${missesAsWhole(props) ? 'font-semibold text-off' : ''}`}>
        <span className="lg:sr-only">RMS z </span>
        {formatScore(rmsZ)}
      </span>
      <span className="text-right">
        <span className="lg:sr-only">p </span>
        {formatPValue(pValue)}
      </span>
    </div>
  );
}
