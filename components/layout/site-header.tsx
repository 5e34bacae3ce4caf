import type { Route } from 'next';
import Link from 'next/link';
import type { Actor } from '@/lib/auth/actor';
import { may } from '@/lib/auth/permissions';
import { AccountMenu } from './account-menu';
import { Mark } from './mark';
import { type NavEntry, SiteNav } from './site-nav';

interface SiteHeaderProps {
  actor: Actor;
  signOut: () => Promise<void>;
}

/**
 * The page's header, on the columns of the page below it: the navigation begins where the axis begins, the account
 * stands over the verdict. On narrow screens the navigation is a row of its own, which scrolls away.
 */
export function SiteHeader({ actor, signOut }: SiteHeaderProps) {
  const entries = entriesFor(actor);
  const person = actor.kind === 'person' ? { name: actor.name, hasLab: may(actor, 'see-lab') } : null;
  return (
    <>
      <header className="no-print stuck-header z-30 border-ink border-b bg-ground">
        <div className="page-width flex h-[calc(var(--header-height)-1px)] items-center justify-between gap-x-5 lg:axis-grid lg:gap-x-0">
          <Link href="/" className="inline-flex min-h-8 shrink-0 items-center gap-2 justify-self-start">
            <Mark className="size-6" />
            <span className="head text-[1.3125rem] sm:text-xl">Curvekeep</span>
          </Link>
          <SiteNav entries={entries} className="max-md:hidden" />
          <div className="flex min-w-0 lg:justify-self-stretch lg:pl-7">
            <AccountMenu person={person} signOut={signOut} />
          </div>
        </div>
      </header>
      <div className="no-print page-width border-hairline border-b py-1 md:hidden">
        <SiteNav entries={entries} />
      </div>
    </>
  );
}

function entriesFor(actor: Actor): NavEntry[] {
  const entries: [boolean, Route, string][] = [
    [true, '/datasets' as Route, 'Browse'],
    [true, '/check', 'Check data'],
    [true, '/methods', 'Methods'],
    [may(actor, 'see-own-deposits'), '/deposits' as Route, 'Deposits'],
    [may(actor, 'see-queue'), '/curation' as Route, 'Curation'],
  ];
  return entries.filter(([shown]) => shown).map(([, href, label]) => ({ href, label }));
}
