'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { usePathname } from 'next/navigation';

export interface NavEntry {
  href: Route;
  label: string;
}

/** Where one can go, with the current page marked. Not prefetched: a plot's code is loaded where it is wanted. */
export function SiteNav({ entries, className = '' }: { entries: readonly NavEntry[]; className?: string }) {
  const pathname = usePathname();
  return (
    <nav aria-label="Main" className={className}>
      <ul className="flex flex-wrap gap-x-5 lg:gap-x-7">
        {entries.map(({ href, label }) => {
          const current = pathname === href || pathname.startsWith(`${href}/`);
          return (
            <li key={href}>
              <Link
                href={href}
                prefetch={false}
                aria-current={current ? 'page' : undefined}
                className="inline-flex min-h-8 items-center whitespace-nowrap text-soft hover:text-ink aria-[current=page]:font-semibold aria-[current=page]:text-ink sm:text-[1rem]"
              >
                {label}
              </Link>
            </li>
          );
        })}
      </ul>
    </nav>
  );
}
