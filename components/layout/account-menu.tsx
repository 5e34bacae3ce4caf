'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { actionStyle } from '@/components/ui/action-style';
import { Button } from '@/components/ui/button';

interface AccountMenuProps {
  /** name of who signed in, and whether they have a laboratory's page to go to; null for a visitor */
  person: { name: string; hasLab: boolean } | null;
  signOut: () => Promise<void>;
}

/** Sign in, or who is signed in and the way out. */
export function AccountMenu({ person, signOut }: AccountMenuProps) {
  const pathname = usePathname();
  if (!person) {
    const back = pathname === '/' || pathname === '/sign-in' ? '' : `?next=${encodeURIComponent(pathname)}`;
    return (
      <Link
        href={`/sign-in${back}` as Route}
        prefetch={false}
        className={actionStyle('text', 'whitespace-nowrap')}
      >
        Sign in
      </Link>
    );
  }
  return (
    <div className="flex min-w-0 items-center gap-x-4">
      {person.hasLab ? (
        <Link
          href="/lab"
          prefetch={false}
          title="Your laboratory"
          aria-current={pathname === '/lab' ? 'page' : undefined}
          className="inline-block min-h-6 truncate text-soft hover:text-ink hover:underline aria-[current=page]:font-semibold aria-[current=page]:text-ink"
        >
          {person.name}
          <span className="sr-only">: your laboratory</span>
        </Link>
      ) : (
        <span className="truncate text-soft">{person.name}</span>
      )}
      <form action={signOut}>
        <Button type="submit" className="whitespace-nowrap">
          Sign out
        </Button>
      </form>
    </div>
  );
}
