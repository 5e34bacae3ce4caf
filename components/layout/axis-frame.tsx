import type { ReactNode } from 'react';
import { AxisColumns } from './axis-columns';

interface AxisFrameProps {
  /** left: whose data, what about them */
  who: ReactNode;
  /** middle: the plot, or what is read; as wide as the energy axis */
  axis: ReactNode;
  /** right: what follows from it */
  verdict: ReactNode;
  /** rows on the same three columns (`RowFrame`), below */
  children?: ReactNode;
}

/** The skeleton of a page: who, axis, verdict; on narrow screens one below the other in this order. */
export function AxisFrame({ who, axis, verdict, children }: AxisFrameProps) {
  return (
    <div className="page-width flex grow flex-col">
      <AxisColumns className={children ? '' : 'grow'} who={who} axis={axis} verdict={verdict} roomy />
      {children}
      {children ? <AxisColumns className="min-h-8 grow" who={null} axis={null} verdict={null} /> : null}
    </div>
  );
}
