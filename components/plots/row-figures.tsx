import { formatCount, formatPValue, formatScore } from '@/components/ui/format-quantity';
import { MathSymbol } from '@/components/ui/math-symbol';

const COLUMNS = 'grid h-full grid-cols-[auto_1fr_1fr] items-center gap-2';

interface RowHeadsProps {
  /** whether the counts are those of a window, while the other figures are of everything */
  isWindow?: boolean;
}

/** What the figures at the right of each strip are, above all of them. */
export function RowHeads({ isWindow = false }: RowHeadsProps) {
  return (
    <div className={`${COLUMNS} text-sm text-soft leading-tight`}>
      <span className="min-w-14 whitespace-nowrap">
        on curve
        {isWindow ? <span className="block text-2xs">in window</span> : null}
      </span>
      <span className="text-right">
        RMS <MathSymbol>z</MathSymbol>
        {isWindow ? <span className="block text-2xs">of all</span> : null}
      </span>
      <span className="text-right">
        <MathSymbol>p</MathSymbol>
        {isWindow ? <span className="block text-2xs">of all</span> : null}
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
  /** whether the counts are those of a window, while the other figures are of everything */
  isWindow?: boolean;
}

/** Whether what a row says as a whole is beyond chance: by p, or by RMS z where there is no p. */
function missesAsWhole({ rmsZ, pValue }: RowFiguresProps): boolean {
  return pValue === null ? rmsZ > 3 : pValue < 0.001;
}

const NO_P =
  'no p, since some uncertainties are assumed or as many parameters were fitted as there are points';

/** The figures of a strip: points on the curve, RMS z, p. */
export function RowFigures(props: RowFiguresProps) {
  const { onCurve, points, rmsZ, pValue, isWindow = false } = props;
  return (
    <div className={`${COLUMNS} figures py-1`}>
      <span className="min-w-14 whitespace-nowrap">
        {formatCount(onCurve)} / {formatCount(points)}
        {isWindow ? <span className="text-soft lg:sr-only"> in window</span> : null}
      </span>
      <span className={`text-right ${missesAsWhole(props) ? 'font-semibold text-off' : ''}`}>
        <span className="lg:sr-only">RMS z{isWindow ? ' of all' : ''} </span>
        {formatScore(rmsZ)}
      </span>
      <span className="text-right">
        <span className="lg:sr-only">p </span>
        {pValue === null ? (
          <abbr title={NO_P} className="no-underline">
            {formatPValue(null)}
            <span className="sr-only">: {NO_P}</span>
          </abbr>
        ) : (
          formatPValue(pValue)
        )}
      </span>
    </div>
  );
}
