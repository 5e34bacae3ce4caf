import { notFound } from 'next/navigation';
import type { ReactNode } from 'react';
import { ForbiddenPage } from '@/components/deposits/forbidden-page';
import type { Failure } from '@/lib/errors';
import { answerWithStatus } from '@/lib/serving/late-answer';
import { SignInView } from './sign-in/sign-in-view';

/**
 * What a page shows in place of what could not be loaded, and with which status: a visitor signs in and is back (401),
 * what may not be known of is not found (404), what one may not do is said so (403).
 *
 * @param path of the page, to come back to
 * @throws what Next makes a not-found page or an error page of
 */
export function turnAway({ code, detail }: Failure, path: string): ReactNode {
  if (code === 'not-found') notFound();
  if (code === 'unauthenticated') {
    answerWithStatus(401);
    return <SignInView next={path} sentence="What stands here is for those who are signed in." />;
  }
  if (code === 'forbidden') {
    answerWithStatus(403);
    return <ForbiddenPage />;
  }
  throw new Error(`A page could not be loaded: ${code}. ${detail ?? ''}`);
}
