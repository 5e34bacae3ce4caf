import type { ReactNode } from 'react';

/** Words for those who listen to a page rather than look at it. */
export function VisuallyHidden({ children }: { children: ReactNode }) {
  return <span className="sr-only">{children}</span>;
}
