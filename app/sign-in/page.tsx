import type { Metadata, Route } from 'next';
import { redirect } from 'next/navigation';
import { actorOfPage } from '@/lib/auth/current-actor';
import { safeNext } from '@/lib/auth/safe-next';
import { homeOf } from './home-of';
import { SignInView } from './sign-in-view';

export const metadata: Metadata = { title: 'Sign in', robots: { index: false } };

interface SignInPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** The sign-in page. */
export default async function SignInPage({ searchParams }: SignInPageProps) {
  const { next: wanted, as } = await searchParams;
  const next = safeNext(wanted);
  const actor = await actorOfPage();
  if (actor.kind === 'person') redirect(next === '/' ? homeOf(actor) : (next as Route));
  return (
    <SignInView
      next={next}
      as={typeof as === 'string' ? as : undefined}
      sentence="To deposit for your laboratory or to curate. Reading and checking need no account."
    />
  );
}
