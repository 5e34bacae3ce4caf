import { AxisColumns, type AxisColumnsProps } from './axis-columns';

interface RowFrameProps extends Omit<AxisColumnsProps, 'roomy'> {
  /** `ruler`: between two lines of ink, and stays under the page's header while its page scrolls */
  tone?: 'strip' | 'ruler';
  /** a row that is pointed at or chosen */
  lit?: boolean;
}

const TONES = {
  strip: 'border-b border-hairline',
  ruler: 'stuck-under-header z-20 border-y border-ink bg-ground',
};

/** One row on the page's three columns; stands inside an `AxisFrame`. */
export function RowFrame({ tone = 'strip', lit = false, className = '', ...rest }: RowFrameProps) {
  return <AxisColumns {...rest} className={`${TONES[tone]} ${lit ? 'bg-wash' : ''} ${className}`} />;
}
