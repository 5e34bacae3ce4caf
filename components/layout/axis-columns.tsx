import type { ComponentProps, ReactNode } from 'react';

export interface AxisColumnsProps extends ComponentProps<'div'> {
  who: ReactNode;
  axis: ReactNode;
  verdict: ReactNode;
  /** space above and below, as at the top of a page; a row sets its own */
  roomy?: boolean;
}

/**
 * Three cells on the page's columns. The middle one has a hairline on either side and no padding, so that
 * everything drawn in it, in whichever row, has the same left and right edge.
 */
export function AxisColumns({
  who,
  axis,
  verdict,
  roomy = false,
  className = '',
  ...rest
}: AxisColumnsProps) {
  const space = roomy ? 'py-6 lg:pt-7 lg:pb-8' : '';
  return (
    <div {...rest} className={`axis-grid ${className}`}>
      <div className={`min-w-0 lg:pr-7 ${space}`}>{who}</div>
      <div className="min-w-0 border-hairline lg:border-x">{axis}</div>
      <div className={`min-w-0 lg:pl-7 ${space}`}>{verdict}</div>
    </div>
  );
}
