'use client';

import { DeadEnd } from '@/components/layout/dead-end';
import { actionStyle } from '@/components/ui/action-style';
import { Button } from '@/components/ui/button';
import { fontClasses } from './fonts';
import './globals.css';

interface GlobalErrorProps {
  error: Error & { digest?: string };
  retry: () => void;
}

/** The last resort, where the layout itself failed: it stands alone, without header and footer. */
export default function GlobalError({ error, retry }: GlobalErrorProps) {
  return (
    <html lang="en-GB" className={fontClasses}>
      <head>
        <title>This page could not be shown · Curvekeep</title>
      </head>
      <body className="flex flex-col">
        <main className="flex grow flex-col">
          <DeadEnd
            title="Curvekeep could not be shown"
            ways={
              <>
                <Button onClick={retry}>Try again</Button>
                <a href="/" className={actionStyle()}>
                  Start page
                </a>
              </>
            }
          >
            <p>Something failed on our side. Wait a moment and try again.</p>
            {error.digest ? (
              <p className="figures text-sm">If you report it, quote the reference {error.digest}.</p>
            ) : null}
          </DeadEnd>
        </main>
      </body>
    </html>
  );
}
