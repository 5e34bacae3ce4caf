'use client';

import { type ReactNode, useEffect, useRef, useState } from 'react';

interface ScrollingCellProps {
  /** what is in it, for those who reach it by keyboard */
  label: string;
  /** beside a column that is taller than the window: as tall as the window, and in view while the page scrolls */
  stuck?: boolean;
  children: ReactNode;
}

/** Less than this is no more than air, pixels. */
const WORTH_SAYING = 12;
/** How much of what is seen stays in view at a step. */
const STEP = 0.8;

const FILLING = 'lg:-inset-2 lg:absolute lg:overflow-y-auto';
const STUCK = 'lg:-m-2 stuck-column';

/**
 * A cell beside the axis that is never taller than the plot (or the window): where it holds more it scrolls by itself,
 * and says so at its lower edge, so that plot, ruler and first strips stay in one view. On narrow screens it is as tall
 * as what it holds.
 */
export function ScrollingCell({ label, stuck = false, children }: ScrollingCellProps) {
  const scroller = useRef<HTMLElement>(null);
  const content = useRef<HTMLDivElement>(null);
  const [isMore, setMore] = useState(false);
  useEffect(() => {
    const [outer, inner] = [scroller.current, content.current];
    if (outer === null || inner === null) return;
    const look = () => setMore(outer.scrollHeight - outer.scrollTop - outer.clientHeight > WORTH_SAYING);
    const observer = new ResizeObserver(look);
    observer.observe(outer);
    observer.observe(inner);
    outer.addEventListener('scroll', look, { passive: true });
    return () => {
      observer.disconnect();
      outer.removeEventListener('scroll', look);
    };
  }, []);
  const step = () => {
    const outer = scroller.current;
    outer?.scrollBy({ top: outer.clientHeight * STEP });
  };
  return (
    <div className={stuck ? '' : 'lg:relative lg:h-full'}>
      <section
        ref={scroller}
        aria-label={label}
        // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard (WCAG 2.1.1)
        tabIndex={0}
        className={`thin-scroll lg:p-2 ${stuck ? STUCK : FILLING}`}
      >
        <div ref={content}>{children}</div>
        {isMore ? <MoreBelow onStep={step} /> : null}
      </section>
    </div>
  );
}

/** At the lower edge while more follows. For those who point: by keyboard the cell itself scrolls. */
function MoreBelow({ onStep }: { onStep: () => void }) {
  return (
    <div
      aria-hidden="true"
      className="no-print sticky -bottom-2 -mx-2 -mb-2 bg-ground px-2 before:pointer-events-none before:absolute before:inset-x-0 before:bottom-full before:h-7 before:bg-linear-to-t before:from-ground before:to-transparent max-lg:hidden"
    >
      <button
        type="button"
        tabIndex={-1}
        onClick={onStep}
        className="flex min-h-7 w-full items-center justify-between border-field border-t text-soft text-xs hover:text-ink"
      >
        More below
        <svg viewBox="0 0 8 8" aria-hidden="true" className="size-2 rotate-90 fill-current">
          <path d="M1.5 0 6.5 4 1.5 8z" />
        </svg>
      </button>
    </div>
  );
}
