import type { ReactNode } from 'react';

interface PanelCaptionsProps {
  by: 'energy' | 'concentration';
  /** said after the residual panel's name, in soft type */
  residualNote?: string;
  /** what else stands over the plot */
  children?: ReactNode;
}

/** The words that stand in the two panels: above and below their dividing line, which is where this stands. */
export function PanelCaptions({ by, residualNote, children }: PanelCaptionsProps) {
  return (
    <>
      <p className="absolute top-1 left-2 font-semibold text-xs">Activity</p>
      {children}
      <div className="absolute inset-x-0 bottom-[29%] border-hairline border-b">
        {by === 'energy' ? (
          <p className="flex justify-between px-2 pb-0.5 text-soft text-xs">
            <span>favours inactive</span>
            <span>favours active</span>
          </p>
        ) : null}
        <p className="absolute top-full left-2 pt-1 font-semibold text-xs">
          Residual{by === 'energy' ? '' : ' by energy'}, standard uncertainties
          {residualNote ? <span className="font-normal text-soft"> · {residualNote}</span> : null}
        </p>
      </div>
    </>
  );
}
