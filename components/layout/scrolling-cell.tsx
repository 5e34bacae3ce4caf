import type { ReactNode } from 'react';

interface ScrollingCellProps {
  /** what is in it, for those who reach it by keyboard */
  label: string;
  children: ReactNode;
}

/**
 * A cell beside the axis that is never taller than the plot: where it holds more it scrolls by itself, so that
 * plot, ruler and first strips stay in one view. On narrow screens it is as tall as what it holds.
 */
export function ScrollingCell({ label, children }: ScrollingCellProps) {
  return (
    <div className="lg:relative lg:h-full">
      <section
        aria-label={label}
        // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard (WCAG 2.1.1)
        tabIndex={0}
        className="thin-scroll lg:-inset-2 lg:absolute lg:overflow-y-auto lg:p-2"
      >
        {children}
      </section>
    </div>
  );
}
