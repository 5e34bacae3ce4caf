'use client';

import { DeadEnd } from '@/components/layout/dead-end';
import { ActionLink } from '@/components/ui/action-link';
import { Button } from '@/components/ui/button';

interface ErrorPageProps {
  error: Error & { digest?: string };
  retry: () => void;
}

/** A page that failed. The message stays on the server; only its reference is shown, to be quoted in a report. */
export default function ErrorPage({ error, retry }: ErrorPageProps) {
  return (
    <DeadEnd
      title="This page could not be shown"
      ways={
        <>
          <p className="text-sm text-soft">Often a second try succeeds.</p>
          <Button onClick={retry}>Try again</Button>
          <ActionLink href="/" prefetch={false}>
            Start page
          </ActionLink>
        </>
      }
    >
      <p>
        Something failed on our side while it was made. A checked dataset is never stored, so keep your own
        copy of it.
      </p>
      {error.digest ? (
        <p className="figures text-sm">If you report it, quote the reference {error.digest}.</p>
      ) : null}
    </DeadEnd>
  );
}
