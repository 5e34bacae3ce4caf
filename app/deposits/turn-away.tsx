import type { Route } from 'next';
import { notFound, redirect } from 'next/navigation';
import type { ReactNode } from 'react';
import { ForbiddenPage } from '@/components/deposits/forbidden-page';
import type { Failure } from '@/lib/errors';

/**
 * What a page shows in place of what could not be loaded: a visitor signs in first and comes back, what may not be
 * known of is not found, what one may not do is said so.
 *
 * @param path of the page, to come back to
 * @throws what Next makes a redirect, a not-found page or an error page of
 */
export function turnAway({ code, detail }: Failure, path: string): ReactNode {
  if (code === 'unauthenticated') redirect(`/sign-in?next=${encodeURIComponent(path)}` as Route);
  if (code === 'not-found') notFound();
  if (code === 'forbidden') return <ForbiddenPage />;
  throw new Error(`A page could not be loaded: ${code}. ${detail ?? ''}`);
}
