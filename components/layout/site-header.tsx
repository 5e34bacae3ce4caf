import Link from 'next/link';
import type { ReactNode } from 'react';
import { Mark } from './mark';
import { SiteNav } from './site-nav';

/**
 * The page's header, on the columns of the page below it: the navigation begins where the axis begins.
 *
 * @param actions what stands at the far right, over the verdict
 */
export function SiteHeader({ actions }: { actions?: ReactNode }) {
  return (
    <header className="no-print stuck-header z-30 border-ink border-b bg-ground">
      <div className="page-width flex h-[calc(var(--header-height)-1px)] items-center justify-between lg:axis-grid">
        <Link href="/" className="inline-flex min-h-8 items-center gap-2 justify-self-start">
          <Mark className="size-6" />
          <span className="head text-[1.3125rem] sm:text-xl">Curvekeep</span>
        </Link>
        <SiteNav />
        {actions ? <div className="hidden justify-self-end lg:flex">{actions}</div> : null}
      </div>
    </header>
  );
}
